import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { AccessTokenCreated, AccessTokenRequest, AccessTokenView } from '@siltlight/common/wire/auth';
import { Op, type Transaction } from 'sequelize';
import { WriteQueue } from '../database/write-queue';
import { newId } from '../database/row';
import { notFound, problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import { OutboxService } from '../notifications/outbox.service';
import type { PersonRow } from '../users/models/person-row';
import { PeopleService } from '../users/people.service';
import { AccessTokenRow } from './models/access-token-row';
import type { Person } from './policy';
import { hashOfSecret, newSecret } from './secret-token';
import { isoAt, SEEN_EVERY_MS } from './session-limits';

const DAY_MS = 86_400_000;
/** Known letters in front let a leaked token be recognised as one of ours. */
const PREFIX = 'siltlight_';
const MOST_TOKENS = 50;

/** Tokens for scripts: a person's own, narrower or equal to what the person may do at the moment of the call. */
@Injectable()
export class AccessTokensService {
  constructor(
    @InjectModel(AccessTokenRow) private readonly tokens: typeof AccessTokenRow,
    private readonly people: PeopleService,
    private readonly writes: WriteQueue,
    private readonly ledger: LedgerService,
    private readonly outbox: OutboxService,
  ) {}

  async create(person: Person, wanted: AccessTokenRequest): Promise<AccessTokenCreated> {
    requireOwnScopes(person, wanted);
    const token = newSecret(PREFIX);
    const { name, scopes, expiresInDays } = wanted;
    const id = newId();
    const expiresAt = isoAt(Date.now() + expiresInDays * DAY_MS);
    const row = await this.writes.run(async (transaction) => {
      await this.requireRoom(person, transaction);
      const values = { id, personId: person.id, name, scopes, tokenHash: hashOfSecret(token), expiresAt };
      const created = await this.tokens.create(values, { transaction });
      const summary = `Made an access token with ${scopes.join(', ')} until ${expiresAt.slice(0, 10)}`;
      await this.record(person, 'create-access-token', created, summary, transaction);
      await this.outbox.queue(
        {
          toPersonId: person.id,
          mailKind: 'access-token-created',
          subject: 'A new access token for your account',
          lines: [`${summary}.`, 'If this was not you, revoke it and change your password.'],
          linkPath: '/account',
        },
        transaction,
      );
      return created;
    });
    return { ...viewOfToken(row), token };
  }

  async list(person: Person): Promise<AccessTokenView[]> {
    const where = { personId: person.id, revokedAt: null, expiresAt: { [Op.gt]: isoAt(Date.now()) } };
    const rows = await this.tokens.findAll({ where, order: [['createdAt', 'DESC']], limit: MOST_TOKENS });
    return rows.map(viewOfToken);
  }

  async revoke(person: Person, id: string): Promise<void> {
    await this.writes.run(async (transaction) => {
      const row = await this.tokens.findOne({
        where: { id, personId: person.id, revokedAt: null },
        transaction,
      });
      if (!row) throw notFound('Access token', id);
      await row.update({ revokedAt: isoAt(Date.now()) }, { transaction });
      await this.record(person, 'revoke-access-token', row, 'Revoked an access token', transaction);
    });
  }

  /** All of a person's tokens, as part of another act. */
  async revokeAll(personId: string, transaction: Transaction): Promise<void> {
    const where = { personId, revokedAt: null };
    await this.tokens.update({ revokedAt: isoAt(Date.now()) }, { where, transaction });
  }

  /** The person behind a presented token, or null when the token is unknown, revoked, expired or its person is out. */
  async resume(token: string): Promise<{ token: AccessTokenRow; row: PersonRow } | null> {
    const found = await this.tokens.findOne({ where: { tokenHash: hashOfSecret(token) } });
    if (!found || found.revokedAt !== null || Date.now() >= Date.parse(found.expiresAt)) return null;
    const row = await this.people.byId(found.personId);
    if (!row || row.disabledAt !== null) return null;
    await this.used(found);
    return { token: found, row };
  }

  private async used(row: AccessTokenRow): Promise<void> {
    const now = Date.now();
    if (row.lastUsedAt !== null && now - Date.parse(row.lastUsedAt) < SEEN_EVERY_MS) return;
    await this.writes.run((transaction) =>
      this.tokens.update({ lastUsedAt: isoAt(now) }, { where: { id: row.id }, transaction }),
    );
  }

  private async requireRoom(person: Person, transaction: Transaction): Promise<void> {
    const where = { personId: person.id, revokedAt: null, expiresAt: { [Op.gt]: isoAt(Date.now()) } };
    if ((await this.tokens.count({ where, transaction })) < MOST_TOKENS) return;
    const detail = `You have ${MOST_TOKENS} access tokens, which is the most; revoke one that is no longer needed.`;
    throw problem(409, 'too-many-access-tokens', 'Too many access tokens', detail);
  }

  private record(
    person: Person,
    verb: string,
    row: AccessTokenRow,
    summary: string,
    transaction: Transaction,
  ) {
    const object = { objectKind: 'access-token', objectId: row.id, objectTitle: row.name };
    return this.ledger.record({ actorId: person.id, verb, ...object, summary }, transaction);
  }
}

function requireOwnScopes(person: Person, { scopes }: AccessTokenRequest): void {
  if (!scopes.includes('admin') || person.roles.includes('administrator')) return;
  const message = 'The scope admin is for administrators: a token cannot do more than you may. Leave it out.';
  throw problem(422, 'scope-beyond-roles', 'The token would do more than you may', message, [
    { pointer: '/scopes', field: 'scopes', value: scopes, allowed: ['read', 'write'], message },
  ]);
}

function viewOfToken({
  id,
  name,
  scopes,
  createdAt,
  expiresAt,
  lastUsedAt,
}: AccessTokenRow): AccessTokenView {
  return { id, name, scopes, createdAt, expiresAt, lastUsedAt: lastUsedAt ?? null };
}
