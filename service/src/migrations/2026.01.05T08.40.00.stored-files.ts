import type { Migration } from '../database/migrator';

/** Files kept by content: the name on disk is the SHA-256, theirs is only shown. */
export const up: Migration = async ({ context }) => {
  await context.sequelize.query(`
    CREATE TABLE stored_files (
      sha256     TEXT PRIMARY KEY CHECK (length(sha256) = 64),
      bytes      INTEGER NOT NULL CHECK (bytes >= 0),
      file_name  TEXT NOT NULL,
      media_type TEXT NOT NULL,
      created_at TEXT NOT NULL
    ) STRICT`);
};

export const down: Migration = ({ context }) => context.dropTable('stored_files');
