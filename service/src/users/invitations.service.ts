import { Injectable } from '@nestjs/common';
import type { InvitationView, InviteRequest } from '@siltlight/common/wire/people';
import type { Transaction } from 'sequelize';
import { OneTimeTokensService } from '../auth/one-time-tokens.service';
import type { Person } from '../auth/policy';
import { WriteQueue } from '../database/write-queue';
import { problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import { OutboxService } from '../notifications/outbox.service';
import type { PersonRow } from './models/person-row';
import { PeopleService, stateOf, viewOf } from './people.service';

@Injectable()
export class InvitationsService {
  constructor(
    private readonly people: PeopleService,
    private readonly oneTime: OneTimeTokensService,
    private readonly writes: WriteQueue,
    private readonly ledger: LedgerService,
    private readonly outbox: OutboxService,
  ) {}

  /** Inviting somebody again, who has not accepted yet, sends a new link and makes the old one void. */
  invite(by: Person, wanted: InviteRequest): Promise<InvitationView> {
    return this.writes.run(async (transaction) => {
      const row = await this.invitedPerson(wanted, transaction);
      const { token, expiresAt } = await this.oneTime.issue('invitation', row.id, transaction);
      const object = { objectKind: 'person', objectId: row.id, objectTitle: row.name };
      const summary = `Invited ${row.name} as ${wanted.roles.join(', ')}`;
      const after = { roles: wanted.roles };
      await this.ledger.record(
        { actorId: by.id, verb: 'invite-person', ...object, summary, after },
        transaction,
      );
      await this.outbox.queue(invitationMail(by, row, token), transaction);
      return { person: viewOf(row), expiresAt };
    });
  }

  private async invitedPerson(
    { email, name, roles }: InviteRequest,
    transaction: Transaction,
  ): Promise<PersonRow> {
    const known = await this.people.byEmail(email, transaction);
    if (!known) return this.people.create({ email, name, roles, passwordHash: null }, transaction);
    if (stateOf(known) !== 'invited') throw alreadyHere(email);
    await known.update({ name, version: known.version + 1 }, { transaction });
    await this.people.giveRoles(known.id, roles, transaction);
    return (await this.people.byId(known.id, transaction))!;
  }
}

function invitationMail(by: Person, row: PersonRow, token: string) {
  return {
    toPersonId: row.id,
    mailKind: 'invitation',
    subject: 'You are invited to Siltlight',
    lines: [
      `${by.name} invites you to work in Siltlight.`,
      'Open the link to choose a password. It works once, for three days.',
    ],
    linkPath: `/accept-invitation?token=${token}`,
  };
}

function alreadyHere(email: string) {
  const message = 'A person with this address has an account already. Change their roles instead.';
  return problem(409, 'already-here', 'This person has an account', message, [
    { pointer: '/email', field: 'email', value: email, message },
  ]);
}
