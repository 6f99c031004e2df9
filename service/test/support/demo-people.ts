import { WriteQueue } from '../../src/database/write-queue';
import { SeedRegistry } from '../../src/database/seed-registry';
import { nowIso } from '../../src/database/row';
import { Sequelize } from 'sequelize-typescript';
import { testApp, type TestApp, type TestAppOptions } from './test-app';

/**
 * The service with the demo's people and without the rest of its scenario, or with some of its steps: what is noted
 * as done is skipped, and building estimates takes far longer than most tests.
 */
export async function testAppWithPeople(
  wanted: ('demo-holdings' | 'demo-queue')[] = [],
  options: TestAppOptions = {},
): Promise<TestApp> {
  const service = await testApp(options);
  const scenario = ['demo-holdings', 'demo-estimates', 'demo-queue'] as const;
  const skipped = scenario.filter((name) => !(wanted as string[]).includes(name));
  await service.app.get(WriteQueue).run(async (transaction) => {
    for (const name of skipped) {
      await service.app.get(Sequelize).query('INSERT INTO seed_runs (name, done_at) VALUES (:name, :at)', {
        replacements: { name, at: nowIso() },
        transaction,
      });
    }
  });
  await service.app.get(SeedRegistry).run();
  return service;
}
