import type { Migration } from '../database/migrator';

const FIXED = ['id', 'object_id', 'number', 'content', 'checksum', 'note', 'created_by', 'created_at'];
const ONCE = ['published_by', 'published_at'];
const changed = (columns: string[]) =>
  columns.map((column) => `NEW.${column} IS NOT OLD.${column}`).join(' OR ');

/** Versioned objects of every kind. What has left the draft state cannot be changed or deleted by anybody. */
export const up: Migration = async ({ context }) => {
  const run = (sql: string) => context.sequelize.query(sql);
  await run(`
    CREATE TABLE objects (
      id         TEXT PRIMARY KEY,
      kind       TEXT NOT NULL,
      slug       TEXT NOT NULL,
      title      TEXT NOT NULL,
      owner_id   TEXT NOT NULL,
      created_at TEXT NOT NULL,
      UNIQUE (kind, slug)
    ) STRICT`);
  await run(`
    CREATE TABLE versions (
      id                       TEXT PRIMARY KEY,
      object_id                TEXT NOT NULL REFERENCES objects (id),
      number                   INTEGER NOT NULL CHECK (number > 0),
      state                    TEXT NOT NULL CHECK (state IN ('draft', 'published', 'superseded', 'withdrawn')),
      content                  TEXT NOT NULL CHECK (json_valid(content)),
      checksum                 TEXT NOT NULL CHECK (length(checksum) = 64),
      note                     TEXT,
      created_by               TEXT NOT NULL,
      created_at               TEXT NOT NULL,
      published_by             TEXT,
      published_at             TEXT CHECK (state = 'draft' OR published_at IS NOT NULL),
      withdrawn_reason         TEXT CHECK (state <> 'withdrawn' OR withdrawn_reason IS NOT NULL),
      superseded_by_version_id TEXT REFERENCES versions (id),
      stale_since              TEXT,
      stale_reason             TEXT,
      UNIQUE (object_id, number)
    ) STRICT`);
  await run("CREATE UNIQUE INDEX versions_one_published ON versions (object_id) WHERE state = 'published'");
  await run(`
    CREATE TRIGGER versions_fixed BEFORE UPDATE ON versions
    WHEN OLD.state <> 'draft' AND (${changed([...FIXED, ...ONCE])})
    BEGIN SELECT RAISE(ABORT, 'a version that was published cannot be changed'); END`);
  await run(`
    CREATE TRIGGER versions_forward_only BEFORE UPDATE OF state ON versions
    WHEN NEW.state IS NOT OLD.state AND (OLD.state || ' ' || NEW.state) NOT IN
      ('draft published', 'published superseded', 'published withdrawn', 'superseded withdrawn')
    BEGIN SELECT RAISE(ABORT, 'a version only moves forward: draft, published, superseded or withdrawn'); END`);
  await run(`
    CREATE TRIGGER versions_no_delete BEFORE DELETE ON versions WHEN OLD.state <> 'draft'
    BEGIN SELECT RAISE(ABORT, 'a version that was published cannot be deleted'); END`);
  await run(`
    CREATE TRIGGER versions_born_as_draft BEFORE INSERT ON versions WHEN NEW.state <> 'draft'
    BEGIN SELECT RAISE(ABORT, 'a version begins as a draft'); END`);
  await run(`
    CREATE TRIGGER objects_fixed BEFORE UPDATE ON objects
    WHEN NEW.id IS NOT OLD.id OR NEW.kind IS NOT OLD.kind OR NEW.created_at IS NOT OLD.created_at
    BEGIN SELECT RAISE(ABORT, 'identity and kind of an object cannot be changed'); END`);
};

export const down: Migration = async ({ context }) => {
  await context.dropTable('versions');
  await context.dropTable('objects');
};
