import { execFileSync } from 'node:child_process';
import * as path from 'node:path';
import { getConnectionToken } from '@nestjs/sequelize';
import fc from 'fast-check';
import type { Sequelize, Transaction } from 'sequelize';
import { WriteQueue } from '../src/database/write-queue';
import { checksumOf } from '../src/versions/canonical';
import { VersionsService } from '../src/versions/versions.service';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
let versions: VersionsService;
let database: Sequelize;
beforeAll(async () => {
  service = await testApp();
  versions = service.app.get(VersionsService);
  database = service.app.get(getConnectionToken());
});
afterAll(() => service.close());

const write = <T>(work: (transaction: Transaction) => Promise<T>) => service.app.get(WriteQueue).run(work);
const sql = (statement: string, id: string) =>
  write((transaction) => database.query(statement, { replacements: { id }, transaction }));

async function draft(content: unknown = { fluxes: [1.5, 2] }, title = 'Dust of Dôme C') {
  const given = { kind: 'test-thing', title, ownerId: 'owner', content };
  return write((transaction) => versions.createObject(given, transaction));
}

async function published(content?: unknown) {
  const { object, version } = await draft(content);
  return {
    object,
    version: await write((transaction) => versions.publish(version.id, 'steward', transaction)),
  };
}

test('a new object has a readable slug of its own and a first version in draft', async () => {
  const [first, second] = [await draft({}, 'Größe: Dôme C / II'), await draft({}, 'Größe: Dôme C / II')];
  expect(first.object.slug).toBe('grosse-dome-c-ii');
  expect(second.object.slug).toBe('grosse-dome-c-ii-2');
  expect(first.version).toMatchObject({ number: 1, state: 'draft', content: {}, checksum: checksumOf({}) });
});

test('a draft can be changed, and its checksum follows', async () => {
  const { version } = await draft();
  const saved = await write((transaction) => versions.saveDraft(version.id, { fluxes: [3] }, transaction));
  expect(saved).toMatchObject({ content: { fluxes: [3] }, checksum: checksumOf({ fluxes: [3] }) });
});

test('publishing a second version supersedes the first and names its successor', async () => {
  const { object, version: first } = await published();
  const next = await write((transaction) =>
    versions.createVersion(
      object.id,
      { content: { fluxes: [9] }, createdBy: 'owner', note: 'Corrected' },
      transaction,
    ),
  );
  const second = await write((transaction) => versions.publish(next.id, 'steward', transaction));
  expect(second).toMatchObject({ number: 2, state: 'published', publishedBy: 'steward', note: 'Corrected' });
  expect(await versions.get(first.id)).toMatchObject({
    state: 'superseded',
    supersededByVersionId: second.id,
  });
  expect((await versions.latestPublished(object.id))?.id).toBe(second.id);
  expect(await versions.list('test-thing', { objectIds: [object.id], states: ['superseded'] })).toHaveLength(
    1,
  );
});

test('what was withdrawn stays readable with its reason, and is no longer in force', async () => {
  const { object, version } = await published();
  await write((transaction) => versions.withdraw(version.id, 'steward', 'Wrong age model', transaction));
  expect(await versions.get(version.id)).toMatchObject({
    state: 'withdrawn',
    withdrawnReason: 'Wrong age model',
  });
  expect(await versions.latestPublished(object.id)).toBeNull();
});

test('steps out of order are refused with 409 and the present state', async () => {
  const { version } = await published();
  const { version: open } = await draft();
  const wrong = [
    (transaction: Transaction) => versions.publish(version.id, 'steward', transaction),
    (transaction: Transaction) => versions.saveDraft(version.id, {}, transaction),
    (transaction: Transaction) => versions.withdraw(open.id, 'steward', 'a reason', transaction),
  ];
  for (const step of wrong)
    await expect(write(step)).rejects.toMatchObject({ status: 409, code: 'wrong-state' });
});

test.each([
  ["UPDATE versions SET content = '{}' WHERE id = :id", 'cannot be changed'],
  [
    'UPDATE versions SET checksum = :id || substr(checksum, length(:id) + 1) WHERE id = :id',
    'cannot be changed',
  ],
  ['UPDATE versions SET number = 77 WHERE id = :id', 'cannot be changed'],
  ["UPDATE versions SET created_by = 'another' WHERE id = :id", 'cannot be changed'],
  ["UPDATE versions SET published_at = '2000' WHERE id = :id", 'cannot be changed'],
  ["UPDATE versions SET state = 'draft' WHERE id = :id", 'only moves forward'],
  ['DELETE FROM versions WHERE id = :id', 'cannot be deleted'],
  ['INSERT OR REPLACE INTO versions SELECT * FROM versions WHERE id = :id', 'begins as a draft'],
  [
    `INSERT OR REPLACE INTO versions (id, object_id, number, state, content, checksum, created_by, created_at)
     SELECT id, object_id, number, 'draft', '{}', checksum, created_by, created_at FROM versions WHERE id = :id`,
    'cannot be deleted',
  ],
])('raw SQL through the own connection cannot touch a published version: %s', async (statement, reason) => {
  const { version } = await published();
  await expect(sql(statement, version.id)).rejects.toMatchObject({
    original: { message: expect.stringContaining(reason) },
  });
  expect(await versions.get(version.id)).toEqual(version);
});

test('marking as stale is possible after publication and keeps the first reason', async () => {
  const { version } = await published();
  for (const reason of ['A dataset was superseded', 'Another one']) {
    await write((transaction) => versions.markStale([version.id], reason, transaction));
  }
  expect((await versions.get(version.id)).staleReason).toBe('A dataset was superseded');
});

test('a second program, written from the description only, gets the same checksums', () => {
  const awkward = [
    { unit: 'g m-2 yr-1', flux: [0.1, 1e21, -0, 1.5], site: 'Dôme C\n', note: null },
    {
      numbers: [
        1e20, 123456789012345680000, 1e-6, 1e-7, 1.5e-7, 5e-324, 1.7976931348623157e308, 4.35, 100, 0.3,
      ],
    },
    { '😀': 1, '\ufb33': 2, a: { B: [], b: {} }, '\u0001"\\/': '\u007f\u2028\b\f' },
  ];
  const drawn = fc.sample(fc.jsonValue(), { numRuns: 300, seed: 42 });
  const contents = [...awkward, ...drawn];
  const program = path.join(__dirname, 'support', 'canonical_checksum.py');
  const input = contents
    .map((content) => JSON.stringify(content).replace(/[\u2028\u2029\u0085]/g, escaped))
    .join('\n');
  const sums = execFileSync('python3', [program], { input, encoding: 'utf8' }).trim().split('\n');
  expect(sums).toEqual(contents.map(checksumOf));
});

/** Python breaks lines at these, too; as escapes they are the same JSON. */
function escaped(character: string): string {
  return `\\u${character.charCodeAt(0).toString(16).padStart(4, '0')}`;
}
