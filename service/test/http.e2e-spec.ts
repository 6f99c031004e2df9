import * as fs from 'node:fs/promises';
import * as path from 'node:path';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
let scientist: SignedInCaller;
beforeAll(async () => {
  service = await testApp({ seeded: true });
  scientist = await signedInAs(service, 'scientist');
});
afterAll(() => service.close());

const SIGN_IN = '/api/v1/auth/sign-in';
const sendRaw = (text: string, type = 'application/json') =>
  service.stranger().post(SIGN_IN).set('Content-Type', type).send(text);

describe('a problem', () => {
  test('is problem+json with the request id that the log line carries, too', async () => {
    const answer = await service.http
      .get('/api/v1/nothing/here?token=secret')
      .set('X-Request-Id', 'a-well-formed-id')
      .expect(404);
    expect(answer.headers['content-type']).toMatch(/^application\/problem\+json/);
    expect(answer.headers['x-request-id']).toBe('a-well-formed-id');
    expect(answer.body).toMatchObject({
      type: 'about:blank',
      status: 404,
      code: 'no-such-route',
      instance: '/api/v1/nothing/here',
      requestId: 'a-well-formed-id',
    });
    const line = service.logged.find((entry) => entry.requestId === 'a-well-formed-id');
    expect(line).toMatchObject({
      event: 'request',
      method: 'GET',
      path: '/api/v1/nothing/here',
      status: 404,
    });
    expect(JSON.stringify(service.logged)).not.toContain('token=secret');
  });

  test('does not take over a request id that is not well-formed', async () => {
    const answer = await service.http
      .get('/api/health/live')
      .set('X-Request-Id', 'no good; drop')
      .expect(200);
    expect(answer.headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/);
  });

  test('names the methods that an address knows', async () => {
    const answer = await service.http.delete(SIGN_IN).expect(405);
    expect(answer.headers.allow).toBe('POST');
    expect(answer.body.code).toBe('method-not-allowed');
    const read = await service.http.put('/api/health/live').expect(405);
    expect(read.headers.allow).toBe('GET, HEAD');
  });

  test('names every wrong field of a body', async () => {
    const answer = await service.stranger().post(SIGN_IN).send({ email: 7 }).expect(422);
    expect(answer.body.code).toBe('invalid-input');
    expect(answer.body.errors.map((error: { pointer: string }) => error.pointer)).toEqual([
      '/email',
      '/password',
    ]);
  });

  test('of a query parameter names the parameter, its value and the limit', async () => {
    const answer = await scientist.get('/api/v1/jobs?limit=1000').expect(422);
    expect(answer.body.errors).toEqual([
      expect.objectContaining({ pointer: '?limit', value: '1000', allowed: { maximum: 200 } }),
    ]);
    await scientist.get('/api/v1/jobs?cursor=%00').expect(422);
  });
});

describe('a body', () => {
  test.each(['{"email":', '{"email": "a", "email": "b"}', '{"__proto__": {}}', '{"email": 1e999}', '\ud800'])(
    'that is not usable JSON (%s) is refused with 400',
    async (text) => {
      expect((await sendRaw(text).expect(400)).body.code).toBe('malformed-json');
    },
  );

  test('that is not JSON, or compressed, is refused with 415', async () => {
    await sendRaw('email=a', 'application/x-www-form-urlencoded').expect(415);
    await sendRaw('<a/>', 'text/xml').expect(415);
    await service
      .stranger()
      .post(SIGN_IN)
      .type('json')
      .set('Content-Encoding', 'gzip')
      .send('{}')
      .expect(415);
  });

  test('over 2 MiB is refused with 413 and the limit', async () => {
    const answer = await sendRaw(JSON.stringify({ email: 'x'.repeat(2 * 1024 * 1024) })).expect(413);
    expect(answer.body.limit).toBe(2 * 1024 * 1024);
  });

  test('is looked at only after the caller is known', async () => {
    const answer = await service.stranger().post('/api/v1/jobs/1/cancel').type('json').send('{').expect(401);
    expect(answer.body.code).toBe('not-signed-in');
  });
});

describe('every answer', () => {
  test('carries the security headers and no trace of the framework', async () => {
    const { headers } = await service.http.get('/api/health/live').expect(200);
    expect(headers['content-security-policy']).toContain("default-src 'self'");
    for (const directive of [
      "object-src 'none'",
      "base-uri 'none'",
      "frame-ancestors 'none'",
      "script-src 'self';",
    ]) {
      expect(headers['content-security-policy']).toContain(directive);
    }
    expect(headers).toMatchObject({
      'x-content-type-options': 'nosniff',
      'referrer-policy': 'same-origin',
      'cross-origin-opener-policy': 'same-origin',
      'cross-origin-resource-policy': 'same-origin',
      'cache-control': 'no-store',
    });
    expect(headers['x-powered-by']).toBeUndefined();
    expect(headers['access-control-allow-origin']).toBeUndefined();
  });
});

describe('the client', () => {
  let client: TestApp;
  let uiDir: string;
  beforeAll(async () => {
    uiDir = await fs.mkdtemp(path.join(service.settings.dataDir, 'ui-'));
    await fs.mkdir(path.join(uiDir, 'assets'));
    await fs.mkdir(path.join(uiDir, '.vite'));
    await fs.writeFile(
      path.join(uiDir, 'index.html'),
      '<!doctype html><html><head></head><body></body></html>',
    );
    await fs.writeFile(path.join(uiDir, 'assets', 'main-abc123.js'), 'void 0;');
    await fs.writeFile(path.join(uiDir, '.vite', 'manifest.json'), '{}');
    client = await testApp({ settings: { uiDir } });
  });
  afterAll(() => client.close());

  test('is served for every address of its own, with a fresh style nonce that its policy names', async () => {
    const [first, second] = [
      await client.http.get('/estimates/new').expect(200),
      await client.http.get('/').expect(200),
    ];
    const nonceOf = (text: string) => /<meta property="csp-nonce" nonce="([^"]+)" \/>/.exec(text)?.[1];
    const nonce = nonceOf(first.text)!;
    expect(first.headers['content-security-policy']).toContain(`style-src 'self' 'nonce-${nonce}'`);
    expect(first.headers['cache-control']).toBe('no-cache');
    expect(nonceOf(second.text)).not.toBe(nonce);
  });

  test('has assets that may be kept for ever', async () => {
    const answer = await client.http.get('/assets/main-abc123.js').expect(200);
    expect(answer.headers['cache-control']).toBe('public, max-age=31536000, immutable');
  });

  test.each([
    '/assets/gone.js',
    '/favicon.gone',
    '/.vite/manifest.json',
    '/assets/../../siltlight.sqlite',
    '/api/gone',
  ])('answers 404, not its page, for %s', async (address) => {
    const answer = await client.http.get(address).expect(404);
    expect(answer.headers['content-type']).toMatch(/^application\/problem\+json/);
  });
});
