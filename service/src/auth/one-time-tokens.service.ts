import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Transaction } from 'sequelize';
import { problem, type Problem } from '../http/problem';
import { type OneTimePurpose, OneTimeTokenRow } from './models/one-time-token-row';
import { hashOfSecret, newSecret } from './secret-token';
import { isoAt } from './session-limits';

const HOUR_MS = 3_600_000;
const GOOD_FOR_MS: Record<OneTimePurpose, number> = {
  invitation: 72 * HOUR_MS,
  'password-reset': HOUR_MS / 2,
  'first-administrator': 24 * HOUR_MS,
};

/** Secrets of links that work once, for one purpose, for a short time. Only their hashes are kept. */
@Injectable()
export class OneTimeTokensService {
  constructor(@InjectModel(OneTimeTokenRow) private readonly tokens: typeof OneTimeTokenRow) {}

  /** A new link makes the older ones for the same purpose void. */
  async issue(
    kind: OneTimePurpose,
    personId: string | null,
    transaction: Transaction,
  ): Promise<{ token: string; expiresAt: string }> {
    await this.voidAll(kind, personId, transaction);
    const token = newSecret();
    const expiresAt = isoAt(Date.now() + GOOD_FOR_MS[kind]);
    await this.tokens.create({ kind, personId, tokenHash: hashOfSecret(token), expiresAt }, { transaction });
    return { token, expiresAt };
  }

  /** @throws Problem 422 alike for what is unknown, of another kind, used or expired */
  async find(kind: OneTimePurpose, token: string): Promise<OneTimeTokenRow> {
    const row = await this.tokens.findOne({ where: { kind, tokenHash: hashOfSecret(token), usedAt: null } });
    if (!row || Date.now() >= Date.parse(row.expiresAt)) throw linkNotValid();
    return row;
  }

  /** Uses it up; of two at once only one comes through. */
  async use(row: OneTimeTokenRow, transaction: Transaction): Promise<void> {
    const where = { id: row.id, usedAt: null };
    const [used] = await this.tokens.update({ usedAt: isoAt(Date.now()) }, { where, transaction });
    if (used === 0) throw linkNotValid();
  }

  async voidAll(kind: OneTimePurpose, personId: string | null, transaction: Transaction): Promise<void> {
    const where = { kind, personId, usedAt: null };
    await this.tokens.update({ usedAt: isoAt(Date.now()) }, { where, transaction });
  }
}

function linkNotValid(): Problem {
  const message = 'The link was used, has expired or is incomplete. Ask for a new one.';
  return problem(422, 'link-not-valid', 'The link no longer works', message, [
    { pointer: '/token', field: 'token', message },
  ]);
}
