import type { Migration } from '../database/migrator';

/** Files made for download. The bytes lie in the file store under their checksum. */
export const up: Migration = async ({ context }) => {
  await context.sequelize.query(`
    CREATE TABLE exports (
      id          TEXT PRIMARY KEY,
      format      TEXT NOT NULL CHECK (format IN ('regional-table-csv', 'slice-fields-netcdf')),
      estimate_id TEXT NOT NULL REFERENCES estimate_runs (id),
      title       TEXT NOT NULL,
      job_id      TEXT REFERENCES jobs (id),
      file_name   TEXT,
      sha256      TEXT,
      bytes       INTEGER,
      created_by  TEXT NOT NULL REFERENCES people (id),
      created_at  TEXT NOT NULL
    ) STRICT`);
  await context.sequelize.query('CREATE INDEX exports_of ON exports (created_by, id)');
};

export const down: Migration = ({ context }) => context.dropTable('exports');
