import { Injectable, type OnModuleInit } from '@nestjs/common';
import { hashPassword } from '../auth/password-hashing';
import { Settings } from '../config/settings';
import { SeedRegistry } from '../database/seed-registry';
import { WriteQueue } from '../database/write-queue';
import { LedgerService } from '../ledger/ledger.service';
import { demoAccounts, demoPasswordOf } from './demo-accounts';
import { PeopleService } from './people.service';

/** Before every other step of the scenario: the others need somebody to act. */
export const DEMO_PEOPLE_ORDER = 10;

@Injectable()
export class DemoPeopleSeed implements OnModuleInit {
  constructor(
    private readonly seeds: SeedRegistry,
    private readonly people: PeopleService,
    private readonly writes: WriteQueue,
    private readonly ledger: LedgerService,
    private readonly settings: Settings,
  ) {}

  onModuleInit(): void {
    this.seeds.register({ name: 'demo-people', order: DEMO_PEOPLE_ORDER, run: () => this.seed() });
  }

  private async seed(): Promise<void> {
    for (const account of demoAccounts) {
      const passwordHash = await hashPassword(demoPasswordOf(this.settings));
      await this.writes.run(async (transaction) => {
        if (await this.people.byEmail(account.email, transaction)) return;
        const row = await this.people.create({ ...account, passwordHash }, transaction);
        const object = { objectKind: 'person', objectId: row.id, objectTitle: row.name };
        const summary = 'Invented person of the demo scenario';
        await this.ledger.record({ actorId: null, verb: 'seed-person', ...object, summary }, transaction);
      });
    }
  }
}
