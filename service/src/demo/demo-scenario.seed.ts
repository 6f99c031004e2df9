import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { Person } from '../auth/policy';
import { SeedRegistry } from '../database/seed-registry';
import { personOf, PeopleService } from '../users/people.service';
import { DemoEstimates } from './demo-estimates';
import { DemoIntake } from './demo-intake';
import { demoSheets, queuedSheet, returnedSheet } from './demo-sites';

/** After the people, who act here. */
const ORDER = 20;

/** The invented scenario, made by the same acts that people do: upload, hand in, vet, build, run, sign off. */
@Injectable()
export class DemoScenario implements OnModuleInit {
  constructor(
    private readonly seeds: SeedRegistry,
    private readonly people: PeopleService,
    private readonly intake: DemoIntake,
    private readonly estimates: DemoEstimates,
  ) {}

  onModuleInit(): void {
    this.seeds.register({ name: 'demo-holdings', order: ORDER, run: () => this.holdings() });
    this.seeds.register({ name: 'demo-estimates', order: ORDER + 1, run: () => this.published() });
    this.seeds.register({ name: 'demo-queue', order: ORDER + 2, run: () => this.queue() });
  }

  private async holdings(): Promise<void> {
    const [contributor, steward] = await Promise.all([this.person('scientist2'), this.person('steward')]);
    for (const sheet of demoSheets) {
      await this.intake.approve(await this.intake.handIn(sheet, contributor), steward);
    }
  }

  private async published(): Promise<void> {
    await this.estimates.make(await this.person('scientist2'), await this.person('scientist'));
  }

  /** Work for the first look: one that waits, and one that came back with a query. */
  private async queue(): Promise<void> {
    const [waiting, returned] = await Promise.all([this.person('scientist2'), this.person('scientist')]);
    await this.intake.handIn(queuedSheet, waiting);
    const submission = await this.intake.handIn(returnedSheet, returned);
    await this.intake.returnWithQuery(submission, await this.person('steward'));
  }

  private async person(name: string): Promise<Person> {
    const row = await this.people.byEmail(`${name}@siltlight.example`);
    if (!row) throw new Error(`The demo person ${name} is missing.`);
    return personOf(row);
  }
}
