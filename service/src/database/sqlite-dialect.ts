import * as sqlite3 from 'sqlite3';

type OpenCallback = (error: Error | null) => void;

/**
 * Sequelize 6 opens SQLite connections itself, a fresh one for every transaction, and calls no hook after it.
 * So what must hold on every connection is put into the driver that it is given.
 */
export function sqliteWithPragmas(pragmas: readonly string[]): object {
  const statements = pragmas.map((pragma) => `PRAGMA ${pragma};`).join(' ');

  class Database extends sqlite3.Database {
    constructor(file: string, mode?: number | OpenCallback, callback?: OpenCallback) {
      const done = typeof mode === 'function' ? mode : callback;
      const flags = typeof mode === 'number' ? mode : sqlite3.OPEN_READWRITE | sqlite3.OPEN_CREATE;
      super(file, flags, (error) => {
        if (error) done?.(error);
        else this.exec(statements, (failed) => done?.(failed));
      });
    }
  }
  return { ...sqlite3, Database };
}
