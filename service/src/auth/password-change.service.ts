import { Injectable } from '@nestjs/common';
import type { AcceptInvitation, ChangePassword, PasswordResetConfirm } from '@siltlight/common/wire/auth';
import type { Transaction } from 'sequelize';
import { WriteQueue } from '../database/write-queue';
import { problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import { OutboxService } from '../notifications/outbox.service';
import type { PersonRow } from '../users/models/person-row';
import { PeopleService, stateOf } from '../users/people.service';
import { OneTimeTokensService } from './one-time-tokens.service';
import { hashPassword, passwordMatches } from './password-hashing';
import { requireGoodPassword } from './password-rules';
import type { Person } from './policy';
import { SessionsService } from './sessions.service';
import { SignInThrottle } from './sign-in-throttle';

/** The three ways to a new password: with the present one, with a mailed link, and the first one after an invitation. */
@Injectable()
export class PasswordChangeService {
  constructor(
    private readonly people: PeopleService,
    private readonly oneTime: OneTimeTokensService,
    private readonly sessions: SessionsService,
    private readonly throttle: SignInThrottle,
    private readonly writes: WriteQueue,
    private readonly ledger: LedgerService,
    private readonly outbox: OutboxService,
  ) {}

  /** Ends the person's other sessions: whoever knew the old password is out. */
  async change(person: Person, wanted: ChangePassword, address: string, sessionId: string): Promise<void> {
    await this.requirePresentPassword(person, wanted.presentPassword, address, 'presentPassword');
    requireGoodPassword(wanted.newPassword, 'newPassword', [person.name, person.email]);
    const passwordHash = await hashPassword(wanted.newPassword);
    await this.writes.run(async (transaction) => {
      const row = (await this.people.byId(person.id, transaction))!;
      await row.update({ passwordHash, version: row.version + 1 }, { transaction });
      const ended = await this.sessions.endAll(person.id, 'password-changed', transaction, sessionId);
      await this.oneTime.voidAll('password-reset', person.id, transaction);
      await this.record(
        row,
        'change-password',
        `Changed the password; ${ended} other sessions ended`,
        transaction,
      );
      await this.tellChanged(row, transaction);
    });
  }

  /** Asked again before what would let a borrowed screen become a lasting key. */
  async requirePresentPassword(
    person: Person,
    password: string,
    address: string,
    field: string,
  ): Promise<void> {
    const row = await this.people.byId(person.id);
    const check = () => passwordMatches(row?.passwordHash ?? null, password);
    if (await this.throttle.attempt(`${person.id} again`, address, check)) return;
    const message = 'This is not your present password. Type it again.';
    throw problem(422, 'wrong-password', 'The present password is wrong', message, [
      { pointer: `/${field}`, field, message },
    ]);
  }

  async acceptInvitation({ token, password }: AcceptInvitation): Promise<{ email: string }> {
    const { row, used, passwordHash } = await this.byLink('invitation', token, password);
    await this.writes.run(async (transaction) => {
      await this.oneTime.use(used, transaction);
      await row.update({ passwordHash, version: row.version + 1 }, { transaction });
      await this.record(row, 'accept-invitation', 'Accepted the invitation', transaction);
    });
    return { email: row.email };
  }

  async confirmReset({ token, password }: PasswordResetConfirm): Promise<{ email: string }> {
    const { row, used, passwordHash } = await this.byLink('password-reset', token, password);
    await this.writes.run(async (transaction) => {
      await this.oneTime.use(used, transaction);
      const tokenVersion = row.tokenVersion + 1;
      await row.update({ passwordHash, tokenVersion, version: row.version + 1 }, { transaction });
      const ended = await this.sessions.endAll(row.id, 'password-reset', transaction);
      await this.record(
        row,
        'reset-password',
        `Set a new password by mail; ${ended} sessions ended`,
        transaction,
      );
      await this.tellChanged(row, transaction);
    });
    return { email: row.email };
  }

  /** Nothing is sent to strangers, and nobody learns from the answer or its time who is known here. */
  async sendResetLink(email: string): Promise<void> {
    const row = await this.people.byEmail(email);
    if (!row || stateOf(row) !== 'active') return;
    await this.writes.run(async (transaction) => {
      const { token } = await this.oneTime.issue('password-reset', row.id, transaction);
      await this.record(row, 'request-password-reset', 'Asked for a new password by mail', transaction);
      const lines = [
        'Somebody, probably you, asked for a new password.',
        'The link works once, for 30 minutes.',
      ];
      const subject = 'Choose a new password';
      const linkPath = `/reset-password?token=${token}`;
      const mail = { toPersonId: row.id, mailKind: 'password-reset', subject, lines, linkPath };
      await this.outbox.queue(mail, transaction);
    });
  }

  private async byLink(kind: 'invitation' | 'password-reset', token: string, password: string) {
    const used = await this.oneTime.find(kind, token);
    const row = (await this.people.byId(used.personId!))!;
    if (row.disabledAt !== null) {
      const detail = 'The account is disabled. Ask an administrator.';
      throw problem(422, 'account-disabled', 'The account is disabled', detail);
    }
    requireGoodPassword(password, 'password', [row.name, row.email]);
    return { row, used, passwordHash: await hashPassword(password) };
  }

  private record(row: PersonRow, verb: string, summary: string, transaction: Transaction): Promise<void> {
    const object = { objectKind: 'person', objectId: row.id, objectTitle: row.name };
    return this.ledger.record({ actorId: row.id, verb, ...object, summary }, transaction);
  }

  private tellChanged(row: PersonRow, transaction: Transaction): Promise<void> {
    const lines = [
      'Your password was changed just now.',
      'If this was not you, ask for a new password at once.',
    ];
    const subject = 'Your password was changed';
    return this.outbox.queue(
      { toPersonId: row.id, mailKind: 'password-changed', subject, lines },
      transaction,
    );
  }
}
