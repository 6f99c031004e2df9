import * as fs from 'node:fs/promises';
import { type BeforeApplicationShutdown, Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { Settings } from '../config/settings';
import { knownMigrations, SCHEMA_TABLE } from '../database/migrator';
import { nowIso } from '../database/row';
import { WriteQueue } from '../database/write-queue';
import { Problem } from '../http/problem';

const MIN_FREE_BYTES = 200 * 1024 * 1024;
const MAX_OUTBOX_AGE_MS = 60 * 60 * 1000;

export interface Check {
  name: string;
  ok: boolean;
  detail: string;
}

@Injectable()
export class HealthService implements BeforeApplicationShutdown {
  private stopping = false;

  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly writes: WriteQueue,
    private readonly settings: Settings,
  ) {}

  beforeApplicationShutdown(): void {
    this.stopping = true;
  }

  async ready(): Promise<{ status: 'ready'; checks: Check[] }> {
    if (this.stopping) throw notReady([{ name: 'process', ok: false, detail: 'The service is stopping.' }]);
    const checks = await Promise.all([
      check('database-write', () => this.databaseWrite()),
      check('schema', () => this.schema()),
      check('disk', () => this.disk()),
      check('outbox', () => this.outbox()),
    ]);
    if (checks.some(({ ok }) => !ok)) throw notReady(checks);
    return { status: 'ready', checks };
  }

  private async databaseWrite(): Promise<Omit<Check, 'name'>> {
    await this.writes.run((transaction) =>
      this.database.query('UPDATE health_probe SET at = :at', {
        replacements: { at: nowIso() },
        transaction,
      }),
    );
    return { ok: true, detail: `longest write ${Math.round(this.writes.longestMs)} ms` };
  }

  private async schema(): Promise<Omit<Check, 'name'>> {
    const rows = await this.database.query<{ name: string }>(`SELECT name FROM ${SCHEMA_TABLE}`, {
      type: QueryTypes.SELECT,
    });
    const applied = new Set(rows.map(({ name }) => name));
    const missing = knownMigrations().filter((name) => !applied.has(name));
    const detail =
      missing.length > 0 ? `${missing.length} migrations are missing` : `${applied.size} migrations`;
    return { ok: missing.length === 0, detail };
  }

  private async disk(): Promise<Omit<Check, 'name'>> {
    const { bavail, bsize } = await fs.statfs(this.settings.dataDir);
    const free = bavail * bsize;
    return { ok: free >= MIN_FREE_BYTES, detail: `${Math.floor(free / 1024 / 1024)} MiB free` };
  }

  private async outbox(): Promise<Omit<Check, 'name'>> {
    const [row] = await this.database.query<{ oldest: string | null }>(
      "SELECT min(created_at) AS oldest FROM outbox WHERE state = 'waiting'",
      { type: QueryTypes.SELECT },
    );
    if (!this.settings.smtp && !this.settings.demo)
      return { ok: true, detail: 'no mail server is configured: mail waits' };
    const ageMs = row?.oldest ? Date.now() - Date.parse(row.oldest) : 0;
    return { ok: ageMs <= MAX_OUTBOX_AGE_MS, detail: `oldest waiting mail ${Math.round(ageMs / 1000)} s` };
  }
}

/** A failing check is an answer, not an exception: the others are still told. */
async function check(name: string, look: () => Promise<Omit<Check, 'name'>>): Promise<Check> {
  try {
    return { name, ...(await look()) };
  } catch (error) {
    return { name, ok: false, detail: error instanceof Problem ? error.title : 'failed' };
  }
}

function notReady(checks: Check[]): Problem {
  return new Problem(503, 'not-ready', 'The service is not ready', {
    detail: checks
      .filter(({ ok }) => !ok)
      .map(({ name, detail }) => `${name}: ${detail}`)
      .join('; '),
    headers: { 'Retry-After': '5' },
    members: { checks },
  });
}
