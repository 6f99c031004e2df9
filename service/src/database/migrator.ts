import * as fs from 'node:fs';
import * as path from 'node:path';
import { QueryTypes, Sequelize } from 'sequelize';
import type { QueryInterface } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import type { MigrationFn } from 'umzug';
import { databaseOptions } from './database-options';

/** A migration runs written SQL, one transaction each; what has landed is never edited. */
export type Migration = MigrationFn<QueryInterface>;

export interface MigrationReport {
  applied: string[];
  /** copy made before a filled database was touched */
  backupFile?: string;
}

export const SCHEMA_TABLE = 'schema_migrations';
const SOURCES = path.resolve(__dirname, '..');

/** Brings the database to the newest schema. A failure leaves the schema of the last good migration. */
export async function migrate(file: string, backupsDir: string): Promise<MigrationReport> {
  fs.mkdirSync(path.dirname(file), { recursive: true });
  const sequelize = new Sequelize(databaseOptions(file));
  try {
    const umzug = migrator(sequelize);
    const [pending, executed] = [await umzug.pending(), await umzug.executed()];
    if (pending.length === 0) return { applied: [] };
    const backupFile = executed.length > 0 ? await backUp(sequelize, backupsDir) : undefined;
    const applied = (await umzug.up()).map((migration) => migration.name);
    return backupFile ? { applied, backupFile } : { applied };
  } finally {
    await sequelize.close();
  }
}

/** Names of the migrations that this build knows, oldest first, without the suffix of source or build. */
export function knownMigrations(): string[] {
  return fs
    .readdirSync(path.join(SOURCES, 'migrations'))
    .filter((name) => /\.(js|ts)$/.test(name) && !name.endsWith('.d.ts'))
    .map(withoutSuffix)
    .sort();
}

export function migrator(sequelize: Sequelize, folder = 'migrations'): Umzug<QueryInterface> {
  return new Umzug({
    migrations: {
      glob: [`${folder}/*.{js,ts}`, { cwd: SOURCES, ignore: '**/*.d.ts' }],
      resolve: ({ name, path: file, context }) => {
        // Only require reads both the built files and, through the test runner, the sources.
        // eslint-disable-next-line @typescript-eslint/no-require-imports
        const load = () => require(file!) as { up: Migration; down?: Migration };
        const params = { name: withoutSuffix(name), context, path: file! };
        return {
          name: withoutSuffix(name),
          up: () => inOneTransaction(sequelize, () => load().up(params)),
          down: () => inOneTransaction(sequelize, async () => load().down?.(params)),
        };
      },
    },
    context: sequelize.getQueryInterface(),
    storage: new SequelizeStorage({ sequelize, tableName: SCHEMA_TABLE }),
    logger: undefined,
  });
}

/** Everything outside a Sequelize transaction goes over one connection, so plain statements can bracket the work. */
async function inOneTransaction(sequelize: Sequelize, work: () => Promise<unknown>): Promise<void> {
  await sequelize.query('BEGIN IMMEDIATE');
  try {
    await work();
    const broken = await sequelize.query('PRAGMA foreign_key_check', { type: QueryTypes.SELECT });
    if (broken.length > 0) throw new Error(`${broken.length} rows would refer to rows that do not exist.`);
    await sequelize.query('COMMIT');
  } catch (error) {
    await sequelize.query('ROLLBACK');
    throw error;
  }
}

async function backUp(sequelize: Sequelize, backupsDir: string): Promise<string> {
  fs.mkdirSync(backupsDir, { recursive: true });
  const stamp = new Date().toISOString().replace(/[:.]/g, '-');
  const file = path.join(backupsDir, `before-migration-${stamp}.sqlite`);
  await sequelize.query('VACUUM INTO :file', { replacements: { file } });
  return file;
}

function withoutSuffix(name: string): string {
  return path.basename(name).replace(/\.(js|ts)$/, '');
}
