import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Op, type Transaction, type WhereOptions } from 'sequelize';
import { nowIso } from '../database/row';
import { canonicalJson } from '../versions/canonical';
import { CHAIN_START, hashOf } from './chain';
import { LedgerRow } from './models/ledger-row';

export interface Act {
  /** null: the service itself */
  actorId: string | null;
  verb: string;
  objectKind: string;
  objectId: string;
  objectTitle?: string;
  /** one sentence for people; no secret in it */
  summary: string;
  before?: unknown;
  after?: unknown;
}

export interface LedgerFilter {
  objectKind?: string | undefined;
  objectId?: string | undefined;
  personId?: string | undefined;
  verb?: string | undefined;
  /** acts to leave aside */
  notVerbs?: string[] | undefined;
}

export interface ChainCheck {
  intact: boolean;
  rows: number;
  /** hash of the last row; kept outside the database at each backup, so that a cut-off tail shows */
  head: string;
  firstBroken: { position: number; problem: string } | null;
}

const VERIFY_BATCH = 1000;

@Injectable()
export class LedgerService {
  constructor(@InjectModel(LedgerRow) private readonly rows: typeof LedgerRow) {}

  /** Joins the write of the act itself: both happen or neither does. */
  async record(act: Act, transaction: Transaction): Promise<void> {
    const last = await this.rows.findOne({ order: [['position', 'DESC']], transaction });
    const entry = {
      position: (last?.position ?? 0) + 1,
      at: nowIso(),
      actorId: act.actorId,
      verb: act.verb,
      objectKind: act.objectKind,
      objectId: act.objectId,
      objectTitle: act.objectTitle ?? null,
      summary: act.summary,
      before: jsonOrNull(act.before),
      after: jsonOrNull(act.after),
      previousHash: last?.hash ?? CHAIN_START,
    };
    await this.rows.create({ ...entry, hash: hashOf(entry) }, { transaction });
  }

  /** Newest first, beginning before a position. */
  find(filter: LedgerFilter, count: number, beforePosition?: number): Promise<LedgerRow[]> {
    const where = {
      ...selection(filter),
      ...(beforePosition ? { position: { [Op.lt]: beforePosition } } : {}),
    };
    return this.rows.findAll({ where, order: [['position', 'DESC']], limit: count });
  }

  count(filter: LedgerFilter): Promise<number> {
    return this.rows.count({ where: selection(filter) });
  }

  /** Walks the whole chain and names the first row that does not follow from the one before. */
  async verify(): Promise<ChainCheck> {
    let [head, position] = [CHAIN_START, 0];
    for (;;) {
      const where = { position: { [Op.gt]: position } };
      const batch = await this.rows.findAll({ where, order: [['position', 'ASC']], limit: VERIFY_BATCH });
      for (const row of batch) {
        const fault = faultOf(row, position + 1, head);
        if (fault)
          return {
            intact: false,
            rows: position,
            head,
            firstBroken: { position: row.position, problem: fault },
          };
        [head, position] = [row.hash, row.position];
      }
      if (batch.length < VERIFY_BATCH) return { intact: true, rows: position, head, firstBroken: null };
    }
  }
}

function faultOf(row: LedgerRow, expectedPosition: number, previousHash: string): string | null {
  if (row.position !== expectedPosition) return `Row ${expectedPosition} is missing.`;
  if (row.previousHash !== previousHash) return 'It does not carry the hash of the row before.';
  if (row.hash !== hashOf(row)) return 'Its content does not give its hash: it was altered.';
  return null;
}

function selection({ objectKind, objectId, personId, verb, notVerbs }: LedgerFilter): WhereOptions {
  return {
    ...(objectKind ? { objectKind } : {}),
    ...(objectId ? { objectId } : {}),
    ...(personId ? { actorId: personId } : {}),
    ...(verb ? { verb } : {}),
    ...(notVerbs ? { verb: { [Op.notIn]: notVerbs } } : {}),
  };
}

function jsonOrNull(value: unknown): string | null {
  return value === undefined || value === null ? null : canonicalJson(value);
}
