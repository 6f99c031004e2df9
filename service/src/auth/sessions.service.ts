import { Injectable } from '@nestjs/common';
import { JwtService } from '@nestjs/jwt';
import { InjectModel } from '@nestjs/sequelize';
import type { SessionView } from '@siltlight/common/wire/auth';
import { Op, type Transaction } from 'sequelize';
import { Settings } from '../config/settings';
import { WriteQueue } from '../database/write-queue';
import { notFound } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import type { PersonRow } from '../users/models/person-row';
import { PeopleService } from '../users/people.service';
import { SessionRow } from './models/session-row';
import type { Person } from './policy';
import { ABSOLUTE_MS, IDLE_MS, isoAt, SEEN_EVERY_MS } from './session-limits';
import { type SessionClaims, sessionTokenOptions } from './session-token';

export interface Caller {
  address: string;
  browser: string;
}

/** Sessions live in the database, so that each can be ended at once; the token only names one. */
@Injectable()
export class SessionsService {
  constructor(
    @InjectModel(SessionRow) private readonly sessions: typeof SessionRow,
    private readonly people: PeopleService,
    private readonly jwt: JwtService,
    private readonly writes: WriteQueue,
    private readonly ledger: LedgerService,
    private readonly settings: Settings,
  ) {}

  async start(
    row: PersonRow,
    caller: Caller,
    transaction: Transaction,
  ): Promise<{ id: string; token: string }> {
    const now = Date.now();
    const session = await this.sessions.create(
      {
        personId: row.id,
        browser: caller.browser.slice(0, 200),
        address: caller.address,
        createdAt: isoAt(now),
        lastSeenAt: isoAt(now),
        expiresAt: isoAt(now + ABSOLUTE_MS),
      },
      { transaction },
    );
    const claims: SessionClaims = {
      sub: row.id,
      sid: session.id,
      kind: 'session',
      version: row.tokenVersion,
    };
    return { id: session.id, token: this.jwt.sign(claims, sessionTokenOptions(this.settings.secret)) };
  }

  /** The session and its person as the database has them now, or null when either is no longer good. */
  async resume(claims: SessionClaims): Promise<{ session: SessionRow; row: PersonRow } | null> {
    const session = await this.sessions.findByPk(claims.sid);
    if (!session || session.personId !== claims.sub || session.endedAt !== null) return null;
    const now = Date.now();
    if (now >= Date.parse(session.expiresAt) || now - Date.parse(session.lastSeenAt) >= IDLE_MS) return null;
    const row = await this.people.byId(session.personId);
    if (!row || row.disabledAt !== null || row.tokenVersion !== claims.version) return null;
    return { session, row };
  }

  async seen(session: SessionRow): Promise<void> {
    const now = Date.now();
    if (now - Date.parse(session.lastSeenAt) < SEEN_EVERY_MS) return;
    await this.writes.run((transaction) =>
      this.sessions.update({ lastSeenAt: isoAt(now) }, { where: { id: session.id }, transaction }),
    );
  }

  async list(personId: string, currentId: string | null): Promise<SessionView[]> {
    const rows = await this.sessions.findAll({
      where: { personId, ...this.alive() },
      order: [['createdAt', 'DESC']],
      limit: 200,
    });
    return rows.map(({ id, createdAt, lastSeenAt, expiresAt, browser, address }) => {
      return { id, current: id === currentId, createdAt, lastSeenAt, expiresAt, browser, address };
    });
  }

  /** Has this person been here from this address in the last weeks? */
  async knownAddress(personId: string, address: string): Promise<boolean> {
    return (await this.sessions.findOne({ where: { personId, address }, attributes: ['id'] })) !== null;
  }

  /** Ends one of a person's own sessions. */
  async end(person: Person, sessionId: string, verb: 'sign-out' | 'end-session'): Promise<void> {
    await this.writes.run(async (transaction) => {
      const where = { id: sessionId, personId: person.id, ...this.alive() };
      const [ended] = await this.sessions.update(
        { endedAt: isoAt(Date.now()), endedReason: verb },
        { where, transaction },
      );
      if (ended === 0) throw notFound('Session', sessionId);
      const summary = verb === 'sign-out' ? 'Signed out' : 'Ended one of the own sessions';
      await this.ledger.record(
        { actorId: person.id, verb, objectKind: 'session', objectId: sessionId, summary },
        transaction,
      );
    });
  }

  /** Ends every session of a person, at will except one, as part of another act. */
  async endAll(
    personId: string,
    reason: string,
    transaction: Transaction,
    exceptId?: string,
  ): Promise<number> {
    const where = { personId, endedAt: null, ...(exceptId ? { id: { [Op.ne]: exceptId } } : {}) };
    const change = { endedAt: isoAt(Date.now()), endedReason: reason };
    return (await this.sessions.update(change, { where, transaction }))[0];
  }

  private alive() {
    const now = Date.now();
    return {
      endedAt: null,
      expiresAt: { [Op.gt]: isoAt(now) },
      lastSeenAt: { [Op.gt]: isoAt(now - IDLE_MS) },
    };
  }
}
