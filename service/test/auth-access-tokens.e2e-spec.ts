import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { mailsOf } from './support/mailed-links';
import { DEMO_PASSWORD, type DemoName, signedInAs } from './support/sign-in';
import { travel } from './support/travel';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
beforeAll(async () => {
  service = await testApp({ seeded: true });
});
afterAll(() => service.close());
afterEach(() => jest.restoreAllMocks());

const DAY = 86_400_000;
const TOKENS = '/api/v1/me/access-tokens';

async function tokenOf(name: DemoName, scopes: string[], expiresInDays = 30): Promise<string> {
  const person = await signedInAs(service, name);
  return (await person.post(TOKENS, { name: 'night run', scopes, expiresInDays }).expect(201)).body.token;
}

/** A call of a script: no cookie, no CSRF token. */
const call = (method: 'get' | 'post' | 'patch' | 'delete', path: string, token: string) =>
  service.stranger()[method](path).set('Authorization', `Bearer ${token}`);

test('a token is shown once, stored as a hash, listed without it, and its owner is told by mail', async () => {
  const mails = mailsOf(service);
  const person = await signedInAs(service, 'scientist');
  const made = await person
    .post(TOKENS, { name: 'my script', scopes: ['read'], expiresInDays: 7 })
    .expect(201);
  expect(made.body).toMatchObject({ name: 'my script', scopes: ['read'], lastUsedAt: null });
  expect(made.body.token).toMatch(/^siltlight_[A-Za-z0-9_-]{43}$/);
  const list = await person.get(TOKENS).expect(200);
  expect(list.body.items.map((item: { id: string }) => item.id)).toContain(made.body.id);
  expect(JSON.stringify(list.body)).not.toContain(made.body.token);
  const rows = await service.app
    .get(Sequelize)
    .query('SELECT * FROM access_tokens', { type: QueryTypes.SELECT });
  expect(JSON.stringify(rows)).not.toContain(made.body.token);
  expect(mails.at(-1)).toMatchObject({ toPersonId: person.person.id, mailKind: 'access-token-created' });
  expect(JSON.stringify(service.logged)).not.toContain(made.body.token);
});

test('the scope read reads, and changes nothing', async () => {
  const token = await tokenOf('scientist', ['read']);
  await call('get', '/api/v1/me', token).expect(200);
  const refused = await call('patch', '/api/v1/me', token).send({ name: 'Other', version: 1 }).expect(403);
  expect(refused.body.code).toBe('scope-needed');
});

test('the scope write changes without a CSRF token, and does not read', async () => {
  const token = await tokenOf('scientist2', ['write']);
  await call('get', '/api/v1/me', token).expect(403);
  const changed = await call('patch', '/api/v1/me', token)
    .send({ orcid: '0000-0002-1825-0097', version: 1 })
    .expect(200);
  expect(changed.body).toMatchObject({ orcid: '0000-0002-1825-0097', version: 2 });
});

test('the scope admin alone reaches administration, and only administrators get it', async () => {
  const narrow = await tokenOf('admin', ['read', 'write']);
  await call('get', '/api/v1/people', narrow).expect(403);
  await call('get', '/api/v1/people', await tokenOf('admin', ['admin'])).expect(200);
  const steward = await signedInAs(service, 'steward');
  const refused = await steward.post(TOKENS, { name: 'x', scopes: ['admin'], expiresInDays: 1 }).expect(422);
  expect(refused.body).toMatchObject({ code: 'scope-beyond-roles', errors: [{ pointer: '/scopes' }] });
});

test('a token loses what its person loses, at once', async () => {
  const admin = await signedInAs(service, 'admin');
  const steward = await signedInAs(service, 'steward2');
  const path = `/api/v1/people/${steward.person.id}`;
  const given = await admin.patch(path, { roles: ['steward', 'administrator'], version: 1 }).expect(200);
  const token = await tokenOf('steward2', ['admin']);
  await call('get', '/api/v1/people', token).expect(200);
  await admin.patch(path, { roles: ['steward'], version: given.body.version }).expect(200);
  expect((await call('get', '/api/v1/people', token).expect(403)).body.code).toBe('role-needed');
});

test('a token ends when it is revoked, and nobody else can revoke it', async () => {
  const owner = await signedInAs(service, 'modeller');
  const made = await owner.post(TOKENS, { name: 'export', scopes: ['read'], expiresInDays: 1 }).expect(201);
  const other = await signedInAs(service, 'admin');
  await other.delete(`${TOKENS}/${made.body.id}`).expect(404);
  await call('get', '/api/v1/me', made.body.token).expect(200);
  await owner.delete(`${TOKENS}/${made.body.id}`).expect(204);
  await call('get', '/api/v1/me', made.body.token).expect(401);
  await owner.delete(`${TOKENS}/${made.body.id}`).expect(404);
});

test('a token ends on its day', async () => {
  const token = await tokenOf('modeller', ['read'], 2);
  travel(2 * DAY - 60_000);
  await call('get', '/api/v1/me', token).expect(200);
  jest.restoreAllMocks();
  travel(2 * DAY + 1000);
  await call('get', '/api/v1/me', token).expect(401);
});

test('a token makes no further token, ends no session and changes no password', async () => {
  const token = await tokenOf('admin', ['read', 'write', 'admin']);
  const wanted = { name: 'child', scopes: ['read'], expiresInDays: 1 };
  expect((await call('post', TOKENS, token).send(wanted).expect(403)).body.code).toBe('session-needed');
  await call('post', '/api/v1/me/password', token).send({}).expect(403);
  await call('delete', '/api/v1/me/sessions/any', token).expect(403);
});

test('half an hour after signing in, the password is asked again for a token', async () => {
  const person = await signedInAs(service, 'scientist');
  const wanted = { name: 'late', scopes: ['read'], expiresInDays: 1 };
  travel(20 * 60_000);
  await person.post(TOKENS, wanted).expect(201);
  travel(40 * 60_000);
  expect((await person.post(TOKENS, wanted).expect(422)).body.code).toBe('password-needed');
  await person.post(TOKENS, { ...wanted, password: 'not the password' }).expect(422);
  await person.post(TOKENS, { ...wanted, password: DEMO_PASSWORD }).expect(201);
});

test.each([
  [{ name: '', scopes: ['read'], expiresInDays: 1 }, '/name'],
  [{ name: 'a', scopes: [], expiresInDays: 1 }, '/scopes'],
  [{ name: 'a', scopes: ['read', 'read'], expiresInDays: 1 }, '/scopes'],
  [{ name: 'a', scopes: ['everything'], expiresInDays: 1 }, '/scopes/0'],
  [{ name: 'a', scopes: ['read'], expiresInDays: 366 }, '/expiresInDays'],
  [{ name: 'a', scopes: ['read'], expiresInDays: 1, tokenHash: 'mine' }, ''],
])('an impossible wish (%#) is refused and names its place', async (wanted, pointer) => {
  const person = await signedInAs(service, 'scientist');
  const refused = await person.post(TOKENS, wanted).expect(422);
  expect(refused.body.errors[0].pointer).toBe(pointer);
});
