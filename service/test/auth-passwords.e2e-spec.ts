import { eventually, mailsOf, tokenIn } from './support/mailed-links';
import { DEMO_PASSWORD, demoAddress, signedIn, signedInAs } from './support/sign-in';
import { travel } from './support/travel';
import { testApp, type TestApp } from './support/test-app';

const NEW_PASSWORD = 'violet tundra ladder nineteen';
const OTHER_PASSWORD = 'quiet lantern over 7 rivers';
const AUTH = '/api/v1/auth';

let service: TestApp;
let mails: ReturnType<typeof mailsOf>;
beforeAll(async () => {
  service = await testApp({ seeded: true });
  mails = mailsOf(service);
});
afterAll(() => service.close());
afterEach(() => jest.restoreAllMocks());

const post = (path: string, body: object) => service.stranger().post(path).send(body);

describe('changing the own password', () => {
  test('asks for the present one, ends the other sessions and tells by mail', async () => {
    const [here, there] = [await signedInAs(service, 'scientist'), await signedInAs(service, 'scientist')];
    const wrong = await here
      .post('/api/v1/me/password', { presentPassword: 'wrong', newPassword: NEW_PASSWORD })
      .expect(422);
    expect(wrong.body).toMatchObject({ code: 'wrong-password', errors: [{ pointer: '/presentPassword' }] });
    await here
      .post('/api/v1/me/password', { presentPassword: DEMO_PASSWORD, newPassword: NEW_PASSWORD })
      .expect(204);
    await here.get('/api/v1/me').expect(200);
    await there.get('/api/v1/me').expect(401);
    await post(`${AUTH}/sign-in`, { email: demoAddress('scientist'), password: DEMO_PASSWORD }).expect(401);
    await signedIn(service, demoAddress('scientist'), NEW_PASSWORD);
    expect(mails.at(-1)).toMatchObject({ toPersonId: here.person.id, mailKind: 'password-changed' });
  });

  test.each([
    ['too short', 'fourteen chars', 'invalid-input'],
    ['common', 'passwordpassword123', 'weak-password'],
    ['the own name', 'pialindroth-pialindroth', 'weak-password'],
    ['the product', 'siltlight-siltlight-2026', 'weak-password'],
  ])('refuses one that is %s, says why and does not repeat it', async (_why, newPassword, code) => {
    const person = await signedInAs(service, 'modeller');
    const refused = await person
      .post('/api/v1/me/password', { presentPassword: DEMO_PASSWORD, newPassword })
      .expect(422);
    expect(refused.body).toMatchObject({ code, errors: [{ pointer: '/newPassword' }] });
    expect(JSON.stringify(refused.body)).not.toContain(newPassword);
  });

  test('takes 64 characters whole: a change in the last one does not match', async () => {
    const person = await signedInAs(service, 'scientist2');
    const long = 'Zwischen Eiszeit und Löss liegt ein Staubkorn 🧊 aus 64 Zeichen x'.padEnd(64, 'q');
    await person
      .post('/api/v1/me/password', { presentPassword: DEMO_PASSWORD, newPassword: `${long}a` })
      .expect(204);
    await post(`${AUTH}/sign-in`, { email: demoAddress('scientist2'), password: `${long}b` }).expect(401);
    await signedIn(service, demoAddress('scientist2'), `${long}a`);
  });
});

describe('a forgotten password', () => {
  const ask = (email: string) => post(`${AUTH}/password-reset`, { email }).expect(202);
  const resetMail = () => mails.filter(({ mailKind }) => mailKind === 'password-reset').at(-1);

  test('gets the same answer for everybody, and mail only for those who have an account', async () => {
    const before = mails.length;
    const unknown = await ask('nobody@siltlight.example');
    const known = await ask(demoAddress('steward'));
    expect(unknown.body).toEqual(known.body);
    const mail = await eventually(resetMail);
    expect(mails).toHaveLength(before + 1);
    expect(mail.linkPath).toMatch(/^\/reset-password\?token=[\w-]{43}$/);
  });

  test('is replaced once by the link, which ends every session', async () => {
    const person = await signedInAs(service, 'steward');
    const token = tokenIn(await eventually(resetMail));
    const confirm = (password: string) => post(`${AUTH}/password-reset/confirm`, { token, password });
    await confirm('passwordpassword').expect(422);
    const done = await confirm(NEW_PASSWORD).expect(200);
    expect(done.body).toEqual({ email: demoAddress('steward') });
    await person.get('/api/v1/me').expect(401);
    await signedIn(service, demoAddress('steward'), NEW_PASSWORD);
    expect((await confirm(OTHER_PASSWORD).expect(422)).body.code).toBe('link-not-valid');
  });

  test('is not replaced by an expired link, an older link, or a token of another kind', async () => {
    const count = () => mails.filter(({ mailKind }) => mailKind === 'password-reset').length;
    const linkFor = async (name: 'steward2' | 'modeller') => {
      const before = count();
      await ask(demoAddress(name));
      await eventually(() => (count() > before ? true : undefined));
      return tokenIn(resetMail()!);
    };
    const [older, newer] = [await linkFor('steward2'), await linkFor('steward2')];
    const confirm = (token: string) =>
      post(`${AUTH}/password-reset/confirm`, { token, password: NEW_PASSWORD });
    await confirm(older).expect(422);
    await post(`${AUTH}/accept-invitation`, { token: newer, password: NEW_PASSWORD }).expect(422);
    await service.stranger().get('/api/v1/me').set('Authorization', `Bearer ${newer}`).expect(401);
    travel(31 * 60_000);
    await confirm(newer).expect(422);
  });
});

describe('an invitation', () => {
  const invite = async (email: string) => {
    const admin = await signedInAs(service, 'admin');
    const answer = await admin
      .post('/api/v1/invitations', { email, name: 'Ruta Ebeling', roles: ['modeller'] })
      .expect(201);
    return { answer, token: tokenIn(mails.at(-1)!) };
  };

  test('makes a person who chooses a password once, and then signs in', async () => {
    const { answer, token } = await invite('Ruta@Example.org');
    expect(answer.body.person).toMatchObject({ email: 'ruta@example.org', initials: 'RE', state: 'invited' });
    expect(JSON.stringify(answer.body)).not.toContain(token);
    await post(`${AUTH}/sign-in`, { email: 'ruta@example.org', password: NEW_PASSWORD }).expect(401);
    const accept = () => post(`${AUTH}/accept-invitation`, { token, password: NEW_PASSWORD });
    const answers = await Promise.all([accept(), accept()]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 422]);
    await accept().expect(422);
    const person = await signedIn(service, 'ruta@example.org', NEW_PASSWORD);
    expect(person.person).toMatchObject({ roles: ['modeller'], state: 'active' });
  });

  test('sent again makes the first link void; one for an account that exists is refused', async () => {
    const first = await invite('later@example.org');
    const second = await invite('later@example.org');
    const accept = (token: string) => post(`${AUTH}/accept-invitation`, { token, password: OTHER_PASSWORD });
    await accept(first.token).expect(422);
    await accept(second.token).expect(200);
    const admin = await signedInAs(service, 'admin');
    const again = { email: 'later@example.org', name: 'Again', roles: ['steward'] };
    expect((await admin.post('/api/v1/invitations', again).expect(409)).body.code).toBe('already-here');
  });

  test('expires after three days', async () => {
    const { token } = await invite('slow@example.org');
    travel(73 * 3_600_000);
    await post(`${AUTH}/accept-invitation`, { token, password: OTHER_PASSWORD }).expect(422);
  });
});
