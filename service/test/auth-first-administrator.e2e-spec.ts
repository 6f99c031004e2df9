import { FirstAdministratorService } from '../src/auth/first-administrator.service';
import { DEMO_PASSWORD, demoAddress, signedIn } from './support/sign-in';
import { testApp } from './support/test-app';

const NEW_PASSWORD = 'violet tundra ladder nineteen';
const AUTH = '/api/v1/auth';

describe('the first administrator', () => {
  const variables = { SILTLIGHT_DEMO: '0', SILTLIGHT_SECRET: 'thirty-two bytes for this test alone' };

  test('is made once with the printed link, and there is no account before', async () => {
    const fresh = await testApp({ variables });
    const call = (body: object) => fresh.stranger().post(`${AUTH}/first-administrator`).send(body);
    const link = await fresh.app.get(FirstAdministratorService, { strict: false }).link();
    const token = new URL(link!).searchParams.get('token')!;
    const wanted = { token, name: 'Ada Kromm', email: 'ada@example.org', password: NEW_PASSWORD };
    await fresh
      .stranger()
      .post(`${AUTH}/sign-in`)
      .send({ email: demoAddress('admin'), password: DEMO_PASSWORD })
      .expect(401);
    await call({ ...wanted, token: 'guess' }).expect(422);
    const made = await call(wanted).expect(201);
    expect(made.body).toMatchObject({ roles: ['administrator'], state: 'active', email: 'ada@example.org' });
    expect((await call({ ...wanted, email: 'second@example.org' })).status).toBeGreaterThanOrEqual(409);
    expect(await fresh.app.get(FirstAdministratorService, { strict: false }).link()).toBeNull();
    await signedIn(fresh, 'ada@example.org', NEW_PASSWORD);
    await fresh.close();
  });

  test('is not offered in the demo, which has its own people', async () => {
    const service = await testApp();
    expect(await service.app.get(FirstAdministratorService, { strict: false }).link()).toBeNull();
    await service.close();
  });
});

test('behind https the cookie is bound to the host and Secure', async () => {
  const secure = await testApp({
    seeded: true,
    variables: { SILTLIGHT_PUBLIC_URL: 'https://desk.example.org' },
  });
  const credentials = { email: demoAddress('admin'), password: DEMO_PASSWORD };
  const answer = await secure.stranger().post(`${AUTH}/sign-in`).send(credentials).expect(200);
  const cookie = answer.get('Set-Cookie')![0]!;
  expect(cookie).toMatch(/^__Host-siltlight=/);
  for (const attribute of ['Secure', 'HttpOnly', 'Path=/']) expect(cookie).toContain(attribute);
  expect(cookie).not.toContain('Domain');
  await secure.stranger().get('/api/v1/me').set('Cookie', cookie.split(';')[0]!).expect(200);
  await secure.close();
});
