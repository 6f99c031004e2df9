import * as fs from 'node:fs';
import * as os from 'node:os';
import * as path from 'node:path';
import { QueryTypes, type Transaction } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { databaseOptions } from './database-options';
import { knownMigrations, migrate, migrator } from './migrator';
import { newId } from './row';
import { WriteQueue } from './write-queue';

let folder: string;
let database: Sequelize;
let writes: WriteQueue;
beforeEach(async () => {
  folder = fs.mkdtempSync(path.join(os.tmpdir(), 'siltlight-database-'));
  database = new Sequelize(databaseOptions(path.join(folder, 'test.sqlite')));
  writes = new WriteQueue(database);
  await database.query('CREATE TABLE counter (value INTEGER NOT NULL) STRICT');
  await database.query('INSERT INTO counter VALUES (0)');
});
afterEach(async () => {
  await database.close();
  fs.rmSync(folder, { recursive: true });
});

async function read(transaction?: Transaction): Promise<number> {
  const [row] = await database.query<{ value: number }>('SELECT value FROM counter', {
    type: QueryTypes.SELECT,
    ...(transaction ? { transaction } : {}),
  });
  return row!.value;
}

async function increment(transaction: Transaction): Promise<void> {
  const value = (await read(transaction)) + 1;
  await database.query('UPDATE counter SET value = :value', { replacements: { value }, transaction });
}

describe('the write queue', () => {
  test('lets 60 parallel read-then-write transactions all succeed, with reads going on meanwhile', async () => {
    const reads = Array.from({ length: 60 }, () => read());
    await Promise.all([...Array.from({ length: 60 }, () => writes.run(increment)), ...reads]);
    expect(await read()).toBe(60);
  });

  test('goes on after a write that fails, which leaves nothing', async () => {
    const failing = writes.run(async (transaction) => {
      await increment(transaction);
      throw new Error('no');
    });
    await expect(failing).rejects.toThrow('no');
    await writes.run(increment);
    expect(await read()).toBe(1);
  });

  test('refuses what is beyond its bound with 503 and when to come again', async () => {
    let open = () => {};
    const gate = new Promise<void>((resolve) => (open = resolve));
    const held = Array.from({ length: 500 }, () => writes.run(() => gate));
    await expect(writes.run(increment)).rejects.toMatchObject({
      status: 503,
      extras: { headers: { 'Retry-After': '2' } },
    });
    open();
    await Promise.all(held);
    await writes.run(increment);
    expect(await read()).toBe(1);
  });

  test('lets what a commit sets going write again', async () => {
    let later: Promise<void> | undefined;
    await writes.run(async (transaction) => {
      transaction.afterCommit(() => void (later = writes.run(increment)));
      await increment(transaction);
    });
    await later;
    expect(await read()).toBe(2);
  });

  test('says so instead of waiting for itself for ever', async () => {
    await expect(writes.run(() => writes.run(increment))).rejects.toThrow('inside a write');
  });
});

test.each([
  ['journal_mode', 'wal'],
  ['synchronous', 2],
  ['foreign_keys', 1],
  ['recursive_triggers', 1],
])('the pragma %s is %p on the connection of a transaction, too', async (pragma, expected) => {
  const ask = async (transaction?: Transaction) => {
    const options = { type: QueryTypes.SELECT as const, ...(transaction ? { transaction } : {}) };
    return Object.values((await database.query<object>(`PRAGMA ${pragma}`, options))[0]!);
  };
  expect(await ask()).toEqual([expected]);
  expect(await writes.run((transaction) => ask(transaction))).toEqual([expected]);
});

test('identifiers are UUIDs of version 7 and sort in the order of their making', async () => {
  const first = newId();
  await new Promise((resolve) => setTimeout(resolve, 2));
  expect(first).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  expect(newId() > first).toBe(true);
});

describe('migrations', () => {
  const file = () => path.join(folder, 'service.sqlite');
  const backups = () => path.join(folder, 'backups');

  test('build the schema on an empty file, once, under names without a suffix', async () => {
    const first = await migrate(file(), backups());
    expect(first).toEqual({ applied: knownMigrations() });
    expect(knownMigrations().every((name) => !/\.(ts|js)$/.test(name))).toBe(true);
    expect(await migrate(file(), backups())).toEqual({ applied: [] });
    expect(fs.existsSync(backups())).toBe(false);
  });

  test('copy a filled database before they touch it', async () => {
    await migrate(file(), backups());
    const filled = new Sequelize(databaseOptions(file()));
    const last = knownMigrations().at(-1)!;
    await migrator(filled).down({ to: last });
    await filled.query("INSERT INTO seed_runs VALUES ('kept', 'now')");
    await filled.close();
    const { applied, backupFile } = await migrate(file(), backups());
    expect(applied).toEqual([last]);
    const copy = new Sequelize(databaseOptions(backupFile!));
    expect(await copy.query('SELECT name FROM seed_runs', { type: QueryTypes.SELECT })).toEqual([
      { name: 'kept' },
    ]);
    await copy.close();
  });

  test('that fail leave the schema as it was, and can be run again', async () => {
    const sources = fs.mkdtempSync(path.join(folder, 'migrations-'));
    const write = (name: string, sql: string[]) =>
      fs.writeFileSync(
        path.join(sources, `${name}.js`),
        `exports.up = async ({ context }) => { ${sql.map((line) => `await context.sequelize.query(${JSON.stringify(line)});`).join(' ')} };`,
      );
    write('1.good', ['CREATE TABLE good (id TEXT) STRICT']);
    write('2.bad', ['CREATE TABLE half (id TEXT) STRICT', 'CREATE TABLE half (id TEXT) STRICT']);
    const tables = () => database.getQueryInterface().showAllTables();
    await expect(migrator(database, sources).up()).rejects.toThrow('half');
    expect(await tables()).not.toContain('half');
    expect(await tables()).toContain('good');
    write('2.bad', ['CREATE TABLE half (id TEXT) STRICT']);
    jest.resetModules(); // the corrected file is read anew, as a new process would
    await migrator(database, sources).up();
    expect(await tables()).toContain('half');
  });
});
