import { createHmac } from 'node:crypto';
import { AccountSweep } from '../src/auth/account-sweep';
import { keyFor } from '../src/auth/signing-keys';
import { DEMO_PASSWORD, demoAddress, signedIn, signedInAs } from './support/sign-in';
import { travel } from './support/travel';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
beforeAll(async () => {
  service = await testApp({ seeded: true });
});
afterAll(() => service.close());
afterEach(() => jest.restoreAllMocks());

const signIn = (email: string, password: string) =>
  service.stranger().post('/api/v1/auth/sign-in').send({ email, password });

const MINUTE = 60_000;

describe('signing in', () => {
  test('answers with the person and a CSRF token, and sets a cookie that scripts cannot read', async () => {
    const answer = await signIn('Scientist@Siltlight.example', DEMO_PASSWORD).expect(200);
    expect(answer.body).toMatchObject({
      person: { email: 'scientist@siltlight.example', roles: ['scientist'] },
      demo: true,
    });
    expect(answer.body.csrfToken).toHaveLength(43);
    const [cookie] = answer.get('Set-Cookie')!;
    expect(cookie).toMatch(/^siltlight=/);
    for (const attribute of ['HttpOnly', 'SameSite=Strict', 'Path=/']) expect(cookie).toContain(attribute);
    expect(cookie).not.toContain('Secure');
    expect(answer.headers['cache-control']).toBe('no-store');
  });

  test('gives a new session each time, listed with the right person', async () => {
    const [one, other] = [await signedInAs(service, 'modeller'), await signedInAs(service, 'modeller')];
    expect(one.cookie).not.toBe(other.cookie);
    const session = await one.get('/api/v1/auth/session').expect(200);
    expect(session.body).toEqual({ person: one.person, csrfToken: one.csrfToken, demo: true });
    const list = await one.get('/api/v1/me/sessions').expect(200);
    expect(list.body.items.filter((item: { current: boolean }) => item.current)).toHaveLength(1);
    expect(list.body.items.length).toBeGreaterThanOrEqual(2);
  });

  test('answers an unknown person and a wrong password alike', async () => {
    const unknown = await signIn('nobody@siltlight.example', 'some wrong password').expect(401);
    const wrong = await signIn(demoAddress('steward2'), 'some wrong password').expect(401);
    const { requestId: _a, ...first } = unknown.body;
    const { requestId: _b, ...second } = wrong.body;
    expect(first).toEqual(second);
    expect(first.code).toBe('wrong-credentials');
    expect(unknown.headers['content-type']).toContain('application/problem+json');
  });

  test('never repeats or logs a password', async () => {
    await signIn(demoAddress('scientist2'), 'a password never to be seen').expect(401);
    await signIn('scientist2@siltlight.example', '').expect(422);
    const reset = await service
      .stranger()
      .post('/api/v1/auth/accept-invitation')
      .send({ token: 'x', password: 'short-and-seen' })
      .expect(422);
    expect(JSON.stringify(reset.body)).not.toContain('short-and-seen');
    const written = JSON.stringify(service.logged);
    for (const secret of ['never to be seen', 'short-and-seen', DEMO_PASSWORD])
      expect(written).not.toContain(secret);
  });

  test('tells the demo accounts to the sign-in page, but no password', async () => {
    const options = await service.stranger().get('/api/v1/auth/options').expect(200);
    expect(options.body.demoAccounts).toHaveLength(6);
    expect(JSON.stringify(options.body)).not.toMatch(/password/i);
  });
});

describe('a session', () => {
  test('ends on the server when its owner signs out', async () => {
    const person = await signedInAs(service, 'scientist');
    await person.post('/api/v1/auth/sign-out').expect(204);
    await service.stranger().get('/api/v1/me').set('Cookie', person.cookie).expect(401);
  });

  test('can be ended from another one, but not by somebody else', async () => {
    const [here, there] = [await signedInAs(service, 'scientist2'), await signedInAs(service, 'scientist2')];
    const list = await there.get('/api/v1/me/sessions').expect(200);
    const id = list.body.items.find((item: { current: boolean }) => item.current).id;
    const stranger = await signedInAs(service, 'admin');
    await stranger.delete(`/api/v1/me/sessions/${id}`).expect(404);
    await here.delete(`/api/v1/me/sessions/${id}`).expect(204);
    await there.get('/api/v1/me').expect(401);
    await here.get('/api/v1/me').expect(200);
  });

  test('ends after 30 minutes without a call, and not while it is used', async () => {
    const person = await signedInAs(service, 'modeller');
    travel(20 * MINUTE);
    await person.get('/api/v1/me').expect(200);
    travel(45 * MINUTE);
    await person.get('/api/v1/me').expect(200);
    travel(76 * MINUTE);
    await person.get('/api/v1/me').expect(401);
  });

  test('ends after 12 hours, however busy', async () => {
    const person = await signedInAs(service, 'modeller');
    for (let at = 0; at < 12 * 60; at += 29) {
      jest.restoreAllMocks();
      travel(at * MINUTE);
      await person.get('/api/v1/me').expect(200);
    }
    jest.restoreAllMocks();
    travel(12 * 60 * MINUTE + 1000);
    await person.get('/api/v1/me').expect(401);
  });
});

describe('a forged token', () => {
  const part = (value: object) => Buffer.from(JSON.stringify(value)).toString('base64url');
  const claimsOf = (cookie: string): Record<string, unknown> =>
    JSON.parse(Buffer.from(cookie.split('=')[1]!.split('.')[1]!, 'base64url').toString());
  function token(header: object, claims: object, key: Buffer | string, hash = 'sha256'): string {
    const body = `${part(header)}.${part(claims)}`;
    return `${body}.${createHmac(hash, key).update(body).digest('base64url')}`;
  }
  const HS256 = { alg: 'HS256', typ: 'JWT' };
  const forgeries: [string, (claims: Record<string, unknown>, key: Buffer) => string][] = [
    ['without an algorithm', (claims) => `${part({ alg: 'none' })}.${part(claims)}.`],
    ['with another key', (claims) => token(HS256, claims, 'another key of thirty-two bytes!')],
    ['with the undivided secret', (claims) => token(HS256, claims, service.settings.secret)],
    [
      'with the key of another purpose',
      (claims) => token(HS256, claims, keyFor('csrf', service.settings.secret)),
    ],
    ['with another algorithm', (claims, key) => token({ alg: 'HS512' }, claims, key, 'sha512')],
    ['of another kind', (claims, key) => token(HS256, { ...claims, kind: 'password-reset' }, key)],
    ['without a kind', (claims, key) => token(HS256, { ...claims, kind: undefined }, key)],
    ['for another audience', (claims, key) => token(HS256, { ...claims, aud: 'elsewhere' }, key)],
    ['of another issuer', (claims, key) => token(HS256, { ...claims, iss: 'elsewhere' }, key)],
    ['that never expires', (claims, key) => token(HS256, { ...claims, exp: undefined }, key)],
    [
      'that has expired',
      (claims, key) => token(HS256, { ...claims, exp: Math.floor(Date.now() / 1000) - 1 }, key),
    ],
    [
      'that is not valid yet',
      (claims, key) => token(HS256, { ...claims, nbf: Math.floor(Date.now() / 1000) + 60 }, key),
    ],
    ['for another person', (claims, key) => token(HS256, { ...claims, sub: 'somebody-else' }, key)],
    ['for an unknown session', (claims, key) => token(HS256, { ...claims, sid: 'unknown' }, key)],
    ['of an older token version', (claims, key) => token(HS256, { ...claims, version: 0 }, key)],
  ];

  test('made like the real one is taken, which proves the forgeries fail for their own reason', async () => {
    const { cookie } = await signedInAs(service, 'steward');
    const good = token(HS256, claimsOf(cookie), keyFor('session', service.settings.secret));
    await service.stranger().get('/api/v1/me').set('Cookie', `siltlight=${good}`).expect(200);
  });

  test.each(forgeries)('%s is refused', async (_name, forge) => {
    const { cookie } = await signedInAs(service, 'steward');
    const forged = forge(claimsOf(cookie), keyFor('session', service.settings.secret));
    const answer = await service
      .stranger()
      .get('/api/v1/me')
      .set('Cookie', `siltlight=${forged}`)
      .expect(401);
    expect(answer.body.code).toBe('not-signed-in');
    await service.stranger().get('/api/v1/me').set('Authorization', `Bearer ${forged}`).expect(401);
  });

  test.each(['', 'a.b.c', 'Bearer', 'x'.repeat(5000)])('of nonsense (%#) is refused', async (text) => {
    await service.stranger().get('/api/v1/me').set('Cookie', `siltlight=${text}`).expect(401);
    await service.stranger().get('/api/v1/me').set('Authorization', `Bearer ${text}`).expect(401);
  });
});

describe('a changing call from a foreign page', () => {
  test('is refused without the CSRF token and with that of another session', async () => {
    const person = await signedInAs(service, 'scientist');
    const other = await signedInAs(service, 'scientist');
    const call = () => service.stranger().patch('/api/v1/me').set('Cookie', person.cookie);
    for (const csrf of ['', 'guess', other.csrfToken]) {
      const refused = await call()
        .set('X-CSRF-Token', csrf)
        .send({ name: 'Somebody Else', version: 1 })
        .expect(403);
      expect(refused.body.code).toBe('csrf-token-needed');
    }
    await call().send({ name: 'Somebody Else', version: 1 }).expect(403);
    expect((await person.get('/api/v1/me')).body.name).toBe('Ilka Vossberg');
  });

  test('is refused by its Origin, also at sign-in, and the refusal is logged', async () => {
    const credentials = { email: demoAddress('scientist'), password: DEMO_PASSWORD };
    const foreign = service
      .stranger()
      .post('/api/v1/auth/sign-in')
      .set('Origin', 'https://elsewhere.example');
    expect((await foreign.send(credentials).expect(403)).body.code).toBe('foreign-origin');
    const opaque = service.stranger().post('/api/v1/auth/sign-in').set('Origin', 'null');
    await opaque.send(credentials).expect(403);
    const cross = service.stranger().post('/api/v1/auth/sign-in').set('Origin', 'https://elsewhere.example');
    await cross.set('Sec-Fetch-Site', 'cross-site').send(credentials).expect(403);
    const proxied = service.stranger().post('/api/v1/auth/sign-in').set('Origin', 'http://127.0.0.1:5173');
    await proxied.set('Sec-Fetch-Site', 'same-origin').send(credentials).expect(200);
    const own = service.stranger().post('/api/v1/auth/sign-in').set('Origin', service.settings.publicUrl);
    await own.send(credentials).expect(200);
    const line = service.logged.find(
      (entry) => entry.event === 'refused' && entry['reason'] === 'foreign-origin',
    );
    expect(line).toMatchObject({ method: 'POST', path: '/api/v1/auth/sign-in', status: 403 });
  });

  test('is refused as a form, which is what a page can send without asking', async () => {
    const form = service.stranger().post('/api/v1/auth/sign-in').type('form');
    await form.send(`email=scientist@siltlight.example&password=${DEMO_PASSWORD}`).expect(415);
  });
});

test('many good sign-ins of one person at once all succeed', async () => {
  const callers = await Promise.all(
    Array.from({ length: 12 }, () => signedIn(service, demoAddress('admin'))),
  );
  expect(new Set(callers.map(({ cookie }) => cookie)).size).toBe(12);
});

test('sessions that ended long ago are swept, those of late are kept', async () => {
  const person = await signedInAs(service, 'steward2');
  const sweep = service.app.get(AccountSweep, { strict: false });
  expect(await sweep.sweep()).toBe(0);
  travel(91 * 24 * 60 * MINUTE);
  expect(await sweep.sweep()).toBeGreaterThan(0);
  jest.restoreAllMocks();
  await person.get('/api/v1/me').expect(401);
});
