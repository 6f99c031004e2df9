import { type Options, Transaction } from 'sequelize';
import { sqliteWithPragmas } from './sqlite-dialect';

/**
 * FULL syncs at each commit: NORMAL could lose the last acknowledged writes when power fails.
 * busy_timeout only matters for other processes; inside this one the write queue keeps order.
 * recursive_triggers lets the triggers that refuse DELETE see INSERT OR REPLACE, too.
 */
const PRAGMAS = [
  'journal_mode=WAL',
  'busy_timeout=5000',
  'foreign_keys=ON',
  'synchronous=FULL',
  'recursive_triggers=ON',
];

export function databaseOptions(file: string): Options {
  return {
    dialect: 'sqlite',
    dialectModule: sqliteWithPragmas(PRAGMAS),
    storage: file,
    logging: false,
    transactionType: Transaction.TYPES.IMMEDIATE,
    // A failed BEGIN must not be repeated on its own: the whole unit of work is what may be tried again.
    retry: { max: 0 },
  };
}
