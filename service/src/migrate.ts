import { readSettings } from './config/read-settings';
import { migrate } from './database/migrator';

async function main(): Promise<void> {
  const settings = readSettings(process.env);
  const { applied, backupFile } = await migrate(settings.databaseFile, settings.backupsDir);
  if (backupFile) console.log(`A copy from before is kept at ${backupFile}`);
  console.log(applied.length > 0 ? `Migrated: ${applied.join(', ')}` : 'The database is up to date.');
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
});
