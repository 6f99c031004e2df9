import { DEMO_PASSWORD, demoAddress, signedInAs } from './support/sign-in';
import { travel } from './support/travel';
import { testApp } from './support/test-app';

// The database models belong to the service that started last, so these run one after the other.
afterEach(() => jest.restoreAllMocks());

describe('guessing', () => {
  test('is slowed with 429 and Retry-After, and the right password works after the wait', async () => {
    const slow = await testApp({ seeded: true });
    const tryWith = (password: string) =>
      slow
        .stranger()
        .post('/api/v1/auth/sign-in')
        .send({ email: demoAddress('steward'), password });
    const answers = [];
    for (let count = 0; count < 20; count += 1) answers.push(await tryWith('a wrong password'));
    const statuses = answers.map((answer) => answer.status);
    expect(statuses.slice(0, 5)).toEqual([401, 401, 401, 401, 401]);
    const refused = answers.find((answer) => answer.status === 429)!;
    const seconds = Number(refused.headers['retry-after']);
    expect(seconds).toBeGreaterThanOrEqual(1);
    expect(seconds).toBeLessThanOrEqual(60);
    expect(refused.body.retryAfterSeconds).toBe(seconds);
    await tryWith(DEMO_PASSWORD).expect(429);
    travel(61_000);
    await tryWith(DEMO_PASSWORD).expect(200);
    await slow.close();
  });

  test('at many accounts from one address is slowed, too', async () => {
    const slow = await testApp();
    const statuses = [];
    for (let count = 0; count < 35; count += 1) {
      const email = `person${count}@siltlight.example`;
      const answer = await slow
        .stranger()
        .post('/api/v1/auth/sign-in')
        .send({ email, password: 'a wrong password' });
      statuses.push(answer.status);
    }
    expect(statuses.slice(0, 30).every((status) => status === 401)).toBe(true);
    expect(statuses[34]).toBe(429);
    await slow.close();
  });

  test('from elsewhere does not keep the right person out of the usual place', async () => {
    const desk = await testApp({ seeded: true });
    desk.app.set('trust proxy', true);
    const tryFrom = (address: string, password: string) =>
      desk
        .stranger()
        .post('/api/v1/auth/sign-in')
        .set('X-Forwarded-For', address)
        .send({ email: demoAddress('modeller'), password });
    await tryFrom('192.0.2.1', DEMO_PASSWORD).expect(200);
    for (let count = 0; count < 6; count += 1) await tryFrom('203.0.113.9', 'a wrong password');
    await tryFrom('203.0.113.77', DEMO_PASSWORD).expect(429);
    await tryFrom('192.0.2.1', DEMO_PASSWORD).expect(200);
    await desk.close();
  });

  test('cannot hide behind a made-up address when no proxy is configured', async () => {
    const desk = await testApp({ seeded: true });
    const call = desk.stranger().post('/api/v1/auth/sign-in').set('X-Forwarded-For', '192.0.2.1');
    await call.send({ email: demoAddress('modeller'), password: DEMO_PASSWORD }).expect(200);
    const person = await signedInAs(desk, 'modeller');
    const list = await person.get('/api/v1/me/sessions').expect(200);
    expect(JSON.stringify(list.body)).not.toContain('192.0.2.1');
    await desk.close();
  });
});
