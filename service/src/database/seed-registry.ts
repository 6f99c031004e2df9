import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { nowIso } from './row';
import { WriteQueue } from './write-queue';

/** One part of the invented demo scenario; a feature registers its own when its module starts. */
export interface SeedStep {
  /** steady: a step that is noted as done under this name is skipped */
  name: string;
  /** lower first */
  order: number;
  /** may be broken off half way and is then run again: look before adding */
  run: () => Promise<void>;
}

@Injectable()
export class SeedRegistry {
  private readonly steps: SeedStep[] = [];

  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly writes: WriteQueue,
  ) {}

  register(step: SeedStep): void {
    if (this.steps.some(({ name }) => name === step.name))
      throw new Error(`Seed step ${step.name} exists already.`);
    this.steps.push(step);
  }

  /** Runs what has not been done yet, in order; returns the names of the steps that ran. */
  async run(): Promise<string[]> {
    const done = await this.done();
    const open = this.steps.filter(({ name }) => !done.has(name)).sort((a, b) => a.order - b.order);
    for (const { name, run } of open) {
      await run();
      await this.writes.run((transaction) =>
        this.database.query('INSERT INTO seed_runs (name, done_at) VALUES (:name, :at)', {
          replacements: { name, at: nowIso() },
          transaction,
        }),
      );
    }
    return open.map(({ name }) => name);
  }

  private async done(): Promise<Set<string>> {
    const rows = await this.database.query<{ name: string }>('SELECT name FROM seed_runs', {
      type: QueryTypes.SELECT,
    });
    return new Set(rows.map(({ name }) => name));
  }
}
