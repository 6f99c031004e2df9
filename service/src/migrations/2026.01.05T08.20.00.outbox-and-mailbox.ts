import type { Migration } from '../database/migrator';

/** Mail waits here from the moment of the decision; the mailbox is what the loopback fake has received. */
export const up: Migration = async ({ context }) => {
  const run = (sql: string) => context.sequelize.query(sql);
  await run(`
    CREATE TABLE outbox (
      id              TEXT PRIMARY KEY,
      to_person_id    TEXT NOT NULL,
      to_name         TEXT NOT NULL,
      to_address      TEXT NOT NULL,
      mail_kind       TEXT NOT NULL,
      subject         TEXT NOT NULL,
      body            TEXT NOT NULL,
      message_id      TEXT NOT NULL UNIQUE,
      state           TEXT NOT NULL CHECK (state IN ('waiting', 'sent', 'failed')),
      attempts        INTEGER NOT NULL DEFAULT 0,
      next_attempt_at TEXT NOT NULL,
      last_error      TEXT,
      created_at      TEXT NOT NULL,
      sent_at         TEXT
    ) STRICT`);
  await run("CREATE INDEX outbox_due ON outbox (next_attempt_at) WHERE state = 'waiting'");
  await run(`
    CREATE TABLE mailbox_messages (
      id           TEXT PRIMARY KEY,
      message_id   TEXT NOT NULL,
      from_address TEXT NOT NULL,
      to_address   TEXT NOT NULL,
      subject      TEXT NOT NULL,
      text         TEXT NOT NULL,
      raw          TEXT NOT NULL,
      received_at  TEXT NOT NULL
    ) STRICT`);
  await run('CREATE INDEX mailbox_recipient ON mailbox_messages (to_address, id)');
};

export const down: Migration = async ({ context }) => {
  await context.dropTable('mailbox_messages');
  await context.dropTable('outbox');
};
