import type { Migration } from '../database/migrator';

/** Long work. The partial index makes the same request, asked twice while it is open, one job. */
export const up: Migration = async ({ context }) => {
  const run = (sql: string) => context.sequelize.query(sql);
  await run(`
    CREATE TABLE jobs (
      id          TEXT PRIMARY KEY,
      kind        TEXT NOT NULL,
      title       TEXT NOT NULL,
      person_id   TEXT NOT NULL,
      dedupe_key  TEXT,
      payload     TEXT NOT NULL CHECK (json_valid(payload)),
      state       TEXT NOT NULL CHECK (state IN ('queued', 'running', 'done', 'failed', 'cancelled')),
      progress    REAL NOT NULL DEFAULT 0 CHECK (progress BETWEEN 0 AND 1),
      stage       TEXT,
      attempts    INTEGER NOT NULL DEFAULT 0,
      error       TEXT,
      result      TEXT CHECK (result IS NULL OR json_valid(result)),
      created_at  TEXT NOT NULL,
      started_at  TEXT,
      finished_at TEXT
    ) STRICT`);
  await run(`
    CREATE UNIQUE INDEX jobs_open_once ON jobs (person_id, kind, dedupe_key)
    WHERE dedupe_key IS NOT NULL AND state IN ('queued', 'running')`);
  await run('CREATE INDEX jobs_of_person ON jobs (person_id, id)');
  await run("CREATE INDEX jobs_open ON jobs (state, id) WHERE state IN ('queued', 'running')");
};

export const down: Migration = ({ context }) => context.dropTable('jobs');
