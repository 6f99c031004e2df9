import { getConnectionToken } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { WriteQueue } from '../src/database/write-queue';
import { hashOf } from '../src/ledger/chain';
import { LedgerService } from '../src/ledger/ledger.service';
import { LedgerRow } from '../src/ledger/models/ledger-row';
import { signedInAs } from './support/sign-in';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
let ledger: LedgerService;
async function start(seeded: boolean): Promise<void> {
  service = await testApp({ seeded });
  ledger = service.app.get(LedgerService);
  for (const number of [1, 2, 3]) await act(number);
}
beforeEach(() => start(false));
afterEach(() => service.close());

const act = (number: number) =>
  service.app.get(WriteQueue).run((transaction) =>
    ledger.record(
      {
        actorId: 'somebody',
        verb: 'approve',
        objectKind: 'test-thing',
        objectId: `thing-${number}`,
        summary: `Approved thing ${number}`,
        before: { state: 'submitted', b: 1, a: 2 },
        after: { state: 'approved' },
      },
      transaction,
    ),
  );

const sql = (statement: string) =>
  service.app
    .get(WriteQueue)
    .run((transaction) => service.app.get<Sequelize>(getConnectionToken()).query(statement, { transaction }));

/** What somebody could do who has the file itself. */
async function withoutTriggers(...statements: string[]): Promise<void> {
  for (const name of ['ledger_no_update', 'ledger_no_delete', 'ledger_in_order'])
    await sql(`DROP TRIGGER ${name}`);
  for (const statement of statements) await sql(statement);
}

const lastPosition = async () => (await ledger.find({}, 1))[0]!.position;

test('an unbroken chain verifies and tells its head', async () => {
  const [last] = await ledger.find({}, 1);
  expect(await ledger.verify()).toEqual({
    intact: true,
    rows: last!.position,
    head: last!.hash,
    firstBroken: null,
  });
});

test.each([
  ["UPDATE ledger SET summary = 'Nothing happened'", 'no row can be changed'],
  ['DELETE FROM ledger', 'no row can be deleted'],
  ['INSERT OR REPLACE INTO ledger SELECT * FROM ledger WHERE position = 1', 'is a chain'],
  [
    `INSERT INTO ledger SELECT position + 100, at, actor_id, verb, object_kind, object_id, object_title, summary,
     before, after, previous_hash, printf('%064d', 7) FROM ledger WHERE position = 1`,
    'is a chain',
  ],
])('the database itself refuses: %s', async (statement, reason) => {
  await expect(sql(statement)).rejects.toMatchObject({
    original: { message: expect.stringContaining(reason) },
  });
  expect((await ledger.verify()).intact).toBe(true);
});

test('an altered row is found', async () => {
  const position = (await lastPosition()) - 1;
  await withoutTriggers(`UPDATE ledger SET summary = 'Declined' WHERE position = ${position}`);
  expect((await ledger.verify()).firstBroken).toEqual({
    position,
    problem: expect.stringContaining('altered'),
  });
});

test('a dropped row is found', async () => {
  const position = (await lastPosition()) - 1;
  await withoutTriggers(`DELETE FROM ledger WHERE position = ${position}`);
  expect((await ledger.verify()).firstBroken).toEqual({
    position: position + 1,
    problem: `Row ${position} is missing.`,
  });
});

test('two swapped rows are found', async () => {
  const last = await lastPosition();
  await withoutTriggers(
    `UPDATE ledger SET position = 999 WHERE position = ${last}`,
    `UPDATE ledger SET position = ${last} WHERE position = ${last - 1}`,
    `UPDATE ledger SET position = ${last - 1} WHERE position = 999`,
  );
  expect((await ledger.verify()).firstBroken?.position).toBe(last - 1);
});

test('an altered row with a recomputed hash is found by the row after it', async () => {
  const position = (await lastPosition()) - 1;
  const row = (await LedgerRow.findByPk(position))!;
  const forged = hashOf({ ...row.get({ plain: true }), summary: 'Declined' });
  await withoutTriggers(
    `UPDATE ledger SET summary = 'Declined', hash = '${forged}' WHERE position = ${position}`,
  );
  expect((await ledger.verify()).firstBroken?.position).toBe(position + 1);
});

test('a forged row at the end is found', async () => {
  const last = await lastPosition();
  await withoutTriggers(
    `INSERT INTO ledger SELECT position + 1, at, actor_id, verb, object_kind, object_id, object_title, summary,
     before, after, hash, printf('%064d', 7) FROM ledger WHERE position = ${last}`,
  );
  expect((await ledger.verify()).firstBroken?.position).toBe(last + 1);
});

test('an act whose write fails leaves no row', async () => {
  const before = await ledger.count({});
  const failing = service.app.get(WriteQueue).run(async (transaction) => {
    const act = {
      actorId: null,
      verb: 'fail',
      objectKind: 'test-thing',
      objectId: 'x',
      summary: 'Never happened',
    };
    await ledger.record(act, transaction);
    throw new Error('the act itself failed');
  });
  await expect(failing).rejects.toThrow('the act itself failed');
  expect(await ledger.count({})).toBe(before);
});

test('stewards and administrators read it page by page, newest first; others are refused', async () => {
  await service.close();
  await start(true);
  const steward = await signedInAs(service, 'steward');
  const first = await steward.get('/api/v1/ledger?objectKind=test-thing&limit=2').expect(200);
  expect(first.body).toMatchObject({ total: 3, items: [{ objectId: 'thing-3' }, { objectId: 'thing-2' }] });
  expect(first.body.items[0]).toMatchObject({
    before: { a: 2, b: 1, state: 'submitted' },
    after: { state: 'approved' },
  });
  const next = `/api/v1/ledger?objectKind=test-thing&limit=2&cursor=${first.body.nextCursor}`;
  expect((await steward.get(next).expect(200)).body).toMatchObject({
    items: [{ objectId: 'thing-1' }],
    nextCursor: null,
  });
  await steward.get('/api/v1/ledger?cursor=bm90aGluZw').expect(422);
  const admin = await signedInAs(service, 'admin');
  expect((await admin.get('/api/v1/ledger/verify').expect(200)).body.intact).toBe(true);
  for (const name of ['scientist', 'modeller'] as const) {
    const other = await signedInAs(service, name);
    await other.get('/api/v1/ledger').expect(403);
    await other.get('/api/v1/ledger/verify').expect(403);
  }
  await service.stranger().get('/api/v1/ledger').expect(401);
});
