import type { Migration } from '../database/migrator';

/**
 * People, what they may do, and how they prove who they are.
 * Secrets are stored as hashes only. The last administrator cannot be lost: see the triggers.
 */
export const up: Migration = async ({ context }) => {
  for (const statement of STATEMENTS) await context.sequelize.query(statement);
};

const STATEMENTS = [
  `CREATE TABLE people (
    id            TEXT PRIMARY KEY,
    name          TEXT NOT NULL CHECK (length(name) BETWEEN 1 AND 120),
    initials      TEXT NOT NULL CHECK (length(initials) BETWEEN 1 AND 4),
    email         TEXT NOT NULL UNIQUE CHECK (email = lower(email)),
    orcid         TEXT,
    password_hash TEXT,
    disabled_at   TEXT,
    token_version INTEGER NOT NULL DEFAULT 1,
    version       INTEGER NOT NULL DEFAULT 1,
    created_at    TEXT NOT NULL
  ) STRICT`,
  `CREATE TABLE person_roles (
    person_id TEXT NOT NULL REFERENCES people (id) ON DELETE CASCADE,
    role      TEXT NOT NULL CHECK (role IN ('scientist', 'steward', 'modeller', 'administrator')),
    PRIMARY KEY (person_id, role)
  ) STRICT, WITHOUT ROWID`,
  `CREATE TABLE sessions (
    id           TEXT PRIMARY KEY,
    person_id    TEXT NOT NULL REFERENCES people (id) ON DELETE CASCADE,
    browser      TEXT NOT NULL,
    address      TEXT NOT NULL,
    created_at   TEXT NOT NULL,
    last_seen_at TEXT NOT NULL,
    expires_at   TEXT NOT NULL,
    ended_at     TEXT,
    ended_reason TEXT
  ) STRICT`,
  `CREATE INDEX sessions_by_person ON sessions (person_id, created_at)`,
  `CREATE TABLE access_tokens (
    id           TEXT PRIMARY KEY,
    person_id    TEXT NOT NULL REFERENCES people (id) ON DELETE CASCADE,
    name         TEXT NOT NULL,
    scopes       TEXT NOT NULL CHECK (json_valid(scopes)),
    token_hash   TEXT NOT NULL UNIQUE CHECK (length(token_hash) = 64),
    created_at   TEXT NOT NULL,
    expires_at   TEXT NOT NULL,
    last_used_at TEXT,
    revoked_at   TEXT
  ) STRICT`,
  `CREATE INDEX access_tokens_by_person ON access_tokens (person_id, created_at)`,
  `CREATE TABLE one_time_tokens (
    id         TEXT PRIMARY KEY,
    kind       TEXT NOT NULL CHECK (kind IN ('invitation', 'password-reset', 'first-administrator')),
    person_id  TEXT REFERENCES people (id) ON DELETE CASCADE,
    token_hash TEXT NOT NULL UNIQUE CHECK (length(token_hash) = 64),
    created_at TEXT NOT NULL,
    expires_at TEXT NOT NULL,
    used_at    TEXT,
    CHECK ((person_id IS NULL) = (kind = 'first-administrator'))
  ) STRICT`,
  `CREATE INDEX one_time_tokens_by_person ON one_time_tokens (person_id, kind)`,
  // Whatever route or race tries it: somebody who can sign in stays administrator.
  `CREATE TRIGGER person_roles_keep_an_administrator BEFORE DELETE ON person_roles
   WHEN OLD.role = 'administrator' AND NOT EXISTS (
     SELECT 1 FROM person_roles JOIN people ON people.id = person_id
     WHERE role = 'administrator' AND person_id <> OLD.person_id
       AND disabled_at IS NULL AND password_hash IS NOT NULL)
     AND EXISTS (SELECT 1 FROM people WHERE id = OLD.person_id AND disabled_at IS NULL AND password_hash IS NOT NULL)
   BEGIN SELECT RAISE(ABORT, 'the last administrator must stay'); END`,
  `CREATE TRIGGER people_keep_an_administrator BEFORE UPDATE OF disabled_at ON people
   WHEN OLD.disabled_at IS NULL AND NEW.disabled_at IS NOT NULL AND OLD.password_hash IS NOT NULL
     AND EXISTS (SELECT 1 FROM person_roles WHERE person_id = OLD.id AND role = 'administrator')
     AND NOT EXISTS (
       SELECT 1 FROM person_roles JOIN people ON people.id = person_id
       WHERE role = 'administrator' AND person_id <> OLD.id AND disabled_at IS NULL AND password_hash IS NOT NULL)
   BEGIN SELECT RAISE(ABORT, 'the last administrator must stay'); END`,
  `CREATE TRIGGER people_are_never_deleted BEFORE DELETE ON people
   BEGIN SELECT RAISE(ABORT, 'people are disabled, never deleted: their work keeps their name'); END`,
];

export const down: Migration = async ({ context }) => {
  for (const trigger of ['people_are_never_deleted', 'people_keep_an_administrator']) {
    await context.sequelize.query(`DROP TRIGGER ${trigger}`);
  }
  await context.sequelize.query('DROP TRIGGER person_roles_keep_an_administrator');
  for (const table of ['one_time_tokens', 'access_tokens', 'sessions', 'person_roles', 'people']) {
    await context.sequelize.query(`DROP TABLE ${table}`);
  }
};
