import type { Migration } from '../database/migrator';

/** Samples of dataset versions in canonical units, each with its place in the file. They never change. */
export const up: Migration = async ({ context }) => {
  const run = (sql: string) => context.sequelize.query(sql);
  await run(`
    CREATE TABLE samples (
      id               TEXT PRIMARY KEY,
      version_id       TEXT NOT NULL REFERENCES versions (id),
      position         INTEGER NOT NULL CHECK (position >= 0),
      site             TEXT NOT NULL,
      latitude_deg     REAL NOT NULL CHECK (latitude_deg BETWEEN -90 AND 90),
      longitude_deg    REAL NOT NULL CHECK (longitude_deg BETWEEN -180 AND 180),
      region_code      TEXT,
      quantity         TEXT NOT NULL,
      age_ka_bp        REAL NOT NULL,
      age_young_ka_bp  REAL,
      age_old_ka_bp    REAL,
      age_sigma_ka     REAL,
      depth_m          REAL,
      flux_g_m2_yr     REAL NOT NULL CHECK (flux_g_m2_yr >= 0),
      flux_sigma_g_m2_yr REAL,
      size_cutoff      TEXT,
      sheet            TEXT NOT NULL,
      row              INTEGER NOT NULL CHECK (row > 0),
      cells            TEXT NOT NULL CHECK (json_valid(cells)),
      created_at       TEXT NOT NULL,
      UNIQUE (version_id, position)
    ) STRICT`);
  await run('CREATE INDEX samples_by_site ON samples (version_id, site, age_ka_bp)');
  await run(`
    CREATE TRIGGER samples_no_update BEFORE UPDATE ON samples
    BEGIN SELECT RAISE(ABORT, 'samples of a dataset version cannot be changed'); END`);
  await run(`
    CREATE TRIGGER samples_no_delete BEFORE DELETE ON samples
    BEGIN SELECT RAISE(ABORT, 'samples of a dataset version cannot be deleted'); END`);
};

export const down: Migration = ({ context }) => context.dropTable('samples');
