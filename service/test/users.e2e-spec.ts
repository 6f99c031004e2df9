import { Sequelize } from 'sequelize-typescript';
import { LedgerService } from '../src/ledger/ledger.service';
import { DEMO_PASSWORD, demoAddress, signedInAs } from './support/sign-in';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
beforeAll(async () => {
  service = await testApp({ seeded: true });
});
afterAll(() => service.close());

const PEOPLE = '/api/v1/people';
const acts = () => service.app.get(LedgerService, { strict: false }).count({});

test('an administrator sees everybody, page by page, in a stable order', async () => {
  const admin = await signedInAs(service, 'admin');
  const all = await admin.get(PEOPLE).expect(200);
  expect(all.body).toMatchObject({ total: 6, nextCursor: null });
  const seen: string[] = [];
  let cursor = '';
  do {
    const page = await admin.get(`${PEOPLE}?limit=4${cursor}`).expect(200);
    seen.push(...page.body.items.map(({ email }: { email: string }) => email));
    cursor = page.body.nextCursor === null ? '' : `&cursor=${page.body.nextCursor}`;
  } while (cursor !== '');
  expect(seen).toEqual(all.body.items.map(({ email }: { email: string }) => email));
  expect(JSON.stringify(all.body)).not.toMatch(/hash|argon/i);
});

test('a role that is taken is gone at the next call of a session that goes on', async () => {
  const admin = await signedInAs(service, 'admin');
  const person = await signedInAs(service, 'steward2');
  const path = `${PEOPLE}/${person.person.id}`;
  const given = await admin.patch(path, { roles: ['steward', 'administrator'], version: 1 }).expect(200);
  await person.get(PEOPLE).expect(200);
  await admin.patch(path, { roles: ['steward'], version: given.body.version }).expect(200);
  expect((await person.get(PEOPLE).expect(403)).body.code).toBe('role-needed');
  await person.get('/api/v1/me').expect(200);
});

test('disabling ends every session and token at once and keeps the person out', async () => {
  const admin = await signedInAs(service, 'admin');
  const person = await signedInAs(service, 'modeller');
  const wanted = { name: 'script', scopes: ['read'], expiresInDays: 1 };
  const { token } = (await person.post('/api/v1/me/access-tokens', wanted).expect(201)).body;
  const bearer = () => service.stranger().get('/api/v1/me').set('Authorization', `Bearer ${token}`);
  await bearer().expect(200);
  const path = `${PEOPLE}/${person.person.id}`;
  const off = await admin.patch(path, { disabled: true, version: 1 }).expect(200);
  expect(off.body).toMatchObject({ state: 'disabled', roles: ['modeller'], version: 2 });
  await person.get('/api/v1/me').expect(401);
  await bearer().expect(401);
  const signIn = () =>
    service
      .stranger()
      .post('/api/v1/auth/sign-in')
      .send({ email: demoAddress('modeller'), password: DEMO_PASSWORD });
  expect((await signIn().expect(401)).body.code).toBe('wrong-credentials');
  await admin.patch(path, { disabled: false, version: 2 }).expect(200);
  await signIn().expect(200);
  await person.get('/api/v1/me').expect(401);
  await bearer().expect(401);
});

test('the last administrator can neither be disabled nor lose the role, by no route and no statement', async () => {
  const admin = await signedInAs(service, 'admin');
  const path = `${PEOPLE}/${admin.person.id}`;
  for (const change of [{ disabled: true }, { roles: ['steward'] }, { roles: [] }]) {
    const refused = await admin.patch(path, { ...change, version: 1 }).expect(409);
    expect(refused.body.code).toBe('last-administrator');
  }
  const run = (sql: string) => service.app.get(Sequelize).query(sql);
  await expect(run(`DELETE FROM person_roles WHERE role = 'administrator'`)).rejects.toThrow();
  await expect(
    run(`UPDATE people SET disabled_at = '2026-01-01' WHERE id = '${admin.person.id}'`),
  ).rejects.toThrow();
  await expect(run(`DELETE FROM people`)).rejects.toThrow();
  await admin.get(PEOPLE).expect(200);
});

test('a change needs the version that it was made from: 428 without, 412 when it is old', async () => {
  const admin = await signedInAs(service, 'admin');
  const person = await signedInAs(service, 'scientist2');
  const path = `${PEOPLE}/${person.person.id}`;
  await admin.patch(path, { roles: ['scientist'] }).expect(428);
  const { etag } = (await admin.get(path).expect(200)).headers as { etag: string };
  await admin
    .patch(path, { roles: ['scientist', 'modeller'] })
    .set('If-Match', etag)
    .expect(200);
  const late = await admin.patch(path, { roles: [] }).set('If-Match', etag).expect(412);
  expect(late.body.code).toBe('changed-meanwhile');
  await admin.patch(path, { roles: [] }).set('If-Match', 'W/"x"').expect(412);
  const both = await Promise.all(
    [1, 2].map((n) => person.patch('/api/v1/me', { name: `Tomas ${n}`, version: 2 })),
  );
  expect(both.map(({ status }) => status).sort()).toEqual([200, 412]);
});

test('each act leaves exactly one row in an unbroken ledger, a refused one none', async () => {
  const admin = await signedInAs(service, 'admin');
  const before = await acts();
  const wanted = { email: 'one@example.org', name: 'One Row', roles: ['scientist'] };
  const { person } = (await admin.post('/api/v1/invitations', wanted).expect(201)).body;
  await admin.patch(`${PEOPLE}/${person.id}`, { roles: ['steward'], version: 1 }).expect(200);
  await admin.patch(`${PEOPLE}/${person.id}`, { roles: ['modeller'], version: 1 }).expect(412);
  await admin.patch('/api/v1/me', { name: 'Edo J. Marwick', version: 1 }).expect(200);
  expect((await acts()) - before).toBe(3);
  expect(await service.app.get(LedgerService, { strict: false }).verify()).toMatchObject({ intact: true });
});

test('fields that are not a caller’s to set are refused, and names cannot carry line breaks', async () => {
  const person = await signedInAs(service, 'scientist');
  const given = {
    roles: ['administrator'],
    email: 'x@example.org',
    passwordHash: 'x',
    disabledAt: null,
    id: 'x',
  };
  for (const [field, value] of Object.entries(given)) {
    await person.patch('/api/v1/me', { name: 'Ilka V', version: 1, [field]: value }).expect(422);
  }
  for (const name of ['', ' ', 'Ilka\r\nBcc: x@example.org', 'a\u202eb', 'x'.repeat(121)]) {
    await person.patch('/api/v1/me', { name, version: 1 }).expect(422);
  }
  await person.patch('/api/v1/me', { orcid: '0000-0002-1825-0098', version: 1 }).expect(422);
  expect((await person.get('/api/v1/me')).body).toEqual(person.person);
});
