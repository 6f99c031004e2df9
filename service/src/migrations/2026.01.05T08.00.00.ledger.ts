import type { Migration } from '../database/migrator';

/** The audit trail: rows are only ever added, one after the other, each carrying the hash of the one before. */
export const up: Migration = async ({ context }) => {
  const run = (sql: string) => context.sequelize.query(sql);
  await run(`
    CREATE TABLE ledger (
      position      INTEGER PRIMARY KEY CHECK (position > 0),
      at            TEXT NOT NULL,
      actor_id      TEXT,
      verb          TEXT NOT NULL,
      object_kind   TEXT NOT NULL,
      object_id     TEXT NOT NULL,
      object_title  TEXT,
      summary       TEXT NOT NULL,
      before        TEXT CHECK (before IS NULL OR json_valid(before)),
      after         TEXT CHECK (after IS NULL OR json_valid(after)),
      previous_hash TEXT NOT NULL CHECK (length(previous_hash) = 64),
      hash          TEXT NOT NULL UNIQUE CHECK (length(hash) = 64)
    ) STRICT`);
  await run('CREATE INDEX ledger_object ON ledger (object_kind, object_id, position)');
  await run('CREATE INDEX ledger_actor ON ledger (actor_id, position)');
  await run(`
    CREATE TRIGGER ledger_no_update BEFORE UPDATE ON ledger
    BEGIN SELECT RAISE(ABORT, 'the ledger is append-only: no row can be changed'); END`);
  await run(`
    CREATE TRIGGER ledger_no_delete BEFORE DELETE ON ledger
    BEGIN SELECT RAISE(ABORT, 'the ledger is append-only: no row can be deleted'); END`);
  await run(`
    CREATE TRIGGER ledger_in_order BEFORE INSERT ON ledger
    WHEN NEW.position <> (SELECT coalesce(max(position), 0) + 1 FROM ledger)
      OR NEW.previous_hash <> coalesce((SELECT hash FROM ledger ORDER BY position DESC LIMIT 1), printf('%064d', 0))
    BEGIN SELECT RAISE(ABORT, 'the ledger is a chain: a row follows the last one'); END`);
};

export const down: Migration = ({ context }) => context.dropTable('ledger');
