import { createApp } from './app';
import { readSettings } from './config/read-settings';
import { SeedRegistry } from './database/seed-registry';

/** Fills the invented demo scenario into the database; what is there already is skipped. */
async function main(): Promise<void> {
  const settings = readSettings(process.env);
  if (!settings.demo)
    throw new Error('The seed is the invented demo scenario: set SILTLIGHT_DEMO=1 to have it.');
  const app = await createApp(settings);
  try {
    const ran = await app.get(SeedRegistry).run();
    console.log(ran.length > 0 ? `Seeded: ${ran.join(', ')}` : 'The demo scenario is there already.');
  } finally {
    await app.close();
  }
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
});
