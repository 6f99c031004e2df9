import type { NestExpressApplication } from '@nestjs/platform-express';
import { createApp } from './app';
import { FirstAdministratorService } from './auth/first-administrator.service';
import { readSettings, SettingsError } from './config/read-settings';
import type { Settings } from './config/settings';
import { SeedRegistry } from './database/seed-registry';
import { demoAccounts, demoPasswordOf } from './users/demo-accounts';

const STOP_WITHIN_MS = 10_000;

async function main(): Promise<void> {
  const settings = readSettings(process.env);
  guardProcess(settings);
  const app = await createApp(settings);
  stopOnSignal(app, settings);
  if (settings.demo) await app.get(SeedRegistry).run();
  // The demo has known passwords, so it is served to this machine alone.
  await app.listen(settings.port, settings.demo ? '127.0.0.1' : '0.0.0.0');
  await greet(app, settings);
}

/** For people, on the terminal: where to go, and how to come in. */
async function greet(app: NestExpressApplication, settings: Settings): Promise<void> {
  console.log(`Siltlight is ready at ${settings.publicUrl}`);
  if (settings.demo) {
    console.log(`Demo accounts, all with the password "${demoPasswordOf(settings)}":`);
    for (const { email, roles } of demoAccounts) console.log(`  ${email}  (${roles.join(', ')})`);
  }
  const link = await app.get(FirstAdministratorService).link();
  if (link) console.log(`Make the first administrator, once, within a day: ${link}`);
}

/** Stops accepting, lets running requests end, closes the database; exit code 0 when that worked in time. */
function stopOnSignal(app: NestExpressApplication, settings: Settings): void {
  const stop = (signal: string) => {
    settings.log({ event: 'stopping', level: 'info', signal });
    setTimeout(() => process.exit(1), STOP_WITHIN_MS).unref();
    app.close().then(
      () => process.exit(0),
      (error: unknown) => {
        settings.log({ event: 'stopping-failed', level: 'error', error: String(error) });
        process.exit(1);
      },
    );
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
}

/** What nobody caught leaves the process in an unknown state: it is recorded, and the process ends. */
function guardProcess(settings: Settings): void {
  const giveUp = (error: unknown) => {
    const told = error instanceof Error ? (error.stack ?? error.message) : String(error);
    settings.log({ event: 'uncaught', level: 'error', error: told });
    process.exit(1);
  };
  process.on('uncaughtException', giveUp);
  process.on('unhandledRejection', giveUp);
}

main().catch((error: unknown) => {
  console.error(error instanceof SettingsError ? error.message : error);
  process.exit(1);
});
