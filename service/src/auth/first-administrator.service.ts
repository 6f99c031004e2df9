import { Injectable } from '@nestjs/common';
import type { FirstAdministrator } from '@siltlight/common/wire/auth';
import type { PersonView } from '@siltlight/common/wire/people';
import { Settings } from '../config/settings';
import { WriteQueue } from '../database/write-queue';
import { problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import { PeopleService, viewOf } from '../users/people.service';
import { OneTimeTokensService } from './one-time-tokens.service';
import { hashPassword } from './password-hashing';
import { requireGoodPassword } from './password-rules';

/** There is no account to begin with: whoever can read the server's first output makes the first one. */
@Injectable()
export class FirstAdministratorService {
  constructor(
    private readonly people: PeopleService,
    private readonly oneTime: OneTimeTokensService,
    private readonly writes: WriteQueue,
    private readonly ledger: LedgerService,
    private readonly settings: Settings,
  ) {}

  /** The address to print at the start; null as soon as there are people, and in the demo. Each start makes a new one. */
  async link(): Promise<string | null> {
    if (this.settings.demo || (await this.people.count()) > 0) return null;
    const { token } = await this.writes.run((transaction) =>
      this.oneTime.issue('first-administrator', null, transaction),
    );
    return `${this.settings.publicUrl}/first-administrator?token=${token}`;
  }

  async create({ token, name, email, password }: FirstAdministrator): Promise<PersonView> {
    const used = await this.oneTime.find('first-administrator', token);
    requireGoodPassword(password, 'password', [name, email]);
    const passwordHash = await hashPassword(password);
    return this.writes.run(async (transaction) => {
      if ((await this.people.count(transaction)) > 0) {
        const detail = 'There are people already. Ask an administrator for an invitation.';
        throw problem(409, 'not-the-first', 'The first administrator exists', detail);
      }
      await this.oneTime.use(used, transaction);
      const row = await this.people.create(
        { name, email, roles: ['administrator'], passwordHash },
        transaction,
      );
      const object = { objectKind: 'person', objectId: row.id, objectTitle: row.name };
      const summary = 'Became the first administrator';
      await this.ledger.record(
        { actorId: row.id, verb: 'create-first-administrator', ...object, summary },
        transaction,
      );
      return viewOf(row);
    });
  }
}
