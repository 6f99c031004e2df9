import type { Migration } from '../database/migrator';

/** Submissions and everything people do to them. The uploaded file itself lies in the file store and never changes. */
export const up: Migration = async ({ context }) => {
  const run = (sql: string) => context.sequelize.query(sql);
  await run(`
    CREATE TABLE submissions (
      id                 TEXT PRIMARY KEY,
      number             INTEGER NOT NULL UNIQUE,
      title              TEXT NOT NULL,
      kind               TEXT NOT NULL CHECK (kind IN ('dust-flux', 'point-optical-depth')),
      state              TEXT NOT NULL CHECK (state IN ('draft', 'submitted', 'in-review', 'returned', 'approved', 'declined', 'withdrawn')),
      contributor_id     TEXT NOT NULL REFERENCES people (id),
      reviewer_id        TEXT REFERENCES people (id),
      invented           INTEGER NOT NULL CHECK (invented IN (0, 1)),
      file_name          TEXT NOT NULL,
      file_sha256        TEXT NOT NULL,
      file_bytes         INTEGER NOT NULL,
      workbook           TEXT NOT NULL CHECK (json_valid(workbook)),
      mapping            TEXT NOT NULL CHECK (json_valid(mapping)),
      metadata           TEXT NOT NULL CHECK (json_valid(metadata)),
      counts             TEXT NOT NULL CHECK (json_valid(counts)),
      revision           INTEGER NOT NULL CHECK (revision > 0),
      dataset_version_id TEXT REFERENCES versions (id),
      submitted_at       TEXT,
      decided_at         TEXT,
      created_at         TEXT NOT NULL
    ) STRICT`);
  await run('CREATE INDEX submissions_by_contributor ON submissions (contributor_id, number)');
  await run('CREATE INDEX submissions_by_state ON submissions (state, submitted_at)');
  const child = (name: string, columns: string, constraint = '') =>
    run(`
    CREATE TABLE ${name} (
      id            TEXT PRIMARY KEY,
      submission_id TEXT NOT NULL REFERENCES submissions (id),
      person_id     TEXT NOT NULL REFERENCES people (id),
      ${columns},
      created_at    TEXT NOT NULL${constraint}
    ) STRICT`);
  const cell = 'sheet TEXT NOT NULL, row INTEGER NOT NULL CHECK (row > 0), "column" TEXT NOT NULL';
  await child(
    'submission_corrections',
    `${cell}, raw_text TEXT NOT NULL, text TEXT NOT NULL, undone_at TEXT`,
  );
  await child(
    'submission_left_out',
    'sheet TEXT NOT NULL, row INTEGER NOT NULL, reason TEXT NOT NULL',
    ', UNIQUE (submission_id, sheet, row)',
  );
  await child(
    'submission_waivers',
    'finding_key TEXT NOT NULL, reason TEXT NOT NULL',
    ', UNIQUE (submission_id, finding_key)',
  );
  await child('submission_queries', `${cell}, text TEXT NOT NULL`);
  await child(
    'submission_replies',
    'query_id TEXT NOT NULL REFERENCES submission_queries (id), text TEXT NOT NULL',
  );
  await child(
    'submission_decisions',
    "decision TEXT NOT NULL CHECK (decision IN ('approve', 'return', 'decline')), reason TEXT",
  );
  for (const name of ['corrections', 'left_out', 'waivers', 'queries', 'replies', 'decisions']) {
    await run(`CREATE INDEX submission_${name}_of ON submission_${name} (submission_id)`);
  }
  await run(`
    CREATE TABLE remembered_mappings (
      id             TEXT PRIMARY KEY,
      contributor_id TEXT NOT NULL REFERENCES people (id),
      pattern        TEXT NOT NULL,
      columns        TEXT NOT NULL CHECK (json_valid(columns)),
      created_at     TEXT NOT NULL,
      UNIQUE (contributor_id, pattern)
    ) STRICT`);
};

export const down: Migration = async ({ context }) => {
  for (const name of ['replies', 'queries', 'corrections', 'left_out', 'waivers', 'decisions']) {
    await context.dropTable(`submission_${name}`);
  }
  await context.dropTable('remembered_mappings');
  await context.dropTable('submissions');
};
