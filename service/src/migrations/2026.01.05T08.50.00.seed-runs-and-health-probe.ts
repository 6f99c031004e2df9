import type { Migration } from '../database/migrator';

/** What the seed has done already, and one row whose only purpose is to be written by the readiness check. */
export const up: Migration = async ({ context }) => {
  const run = (sql: string) => context.sequelize.query(sql);
  await run('CREATE TABLE seed_runs (name TEXT PRIMARY KEY, done_at TEXT NOT NULL) STRICT');
  await run('CREATE TABLE health_probe (id INTEGER PRIMARY KEY CHECK (id = 1), at TEXT NOT NULL) STRICT');
  await run("INSERT INTO health_probe (id, at) VALUES (1, '')");
};

export const down: Migration = async ({ context }) => {
  await context.dropTable('health_probe');
  await context.dropTable('seed_runs');
};
