import type { Migration } from '../database/migrator';

/** Runs of estimates. The result is a versioned object; a run without one has not been computed. */
export const up: Migration = async ({ context }) => {
  await context.sequelize.query(`
    CREATE TABLE estimate_runs (
      id               TEXT PRIMARY KEY,
      run_number       INTEGER NOT NULL UNIQUE,
      title            TEXT NOT NULL,
      slice_slug       TEXT NOT NULL,
      request          TEXT NOT NULL CHECK (json_valid(request)),
      field_version_id TEXT NOT NULL REFERENCES versions (id),
      job_id           TEXT REFERENCES jobs (id),
      version_id       TEXT REFERENCES versions (id),
      created_by       TEXT NOT NULL REFERENCES people (id),
      created_at       TEXT NOT NULL
    ) STRICT`);
  await context.sequelize.query('CREATE INDEX estimate_runs_by_slice ON estimate_runs (slice_slug, run_number)');
  await context.sequelize.query('CREATE INDEX estimate_runs_by_field ON estimate_runs (field_version_id)');
};

export const down: Migration = ({ context }) => context.dropTable('estimate_runs');
