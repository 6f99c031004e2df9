import { readCsv, type CsvRow } from '../../reference/read';

/** Rows of a table of published or independent check values, e.g. `orbit/annual_insolation.csv`. */
export function checkTable(name: string): CsvRow[] {
  const rows = readCsv(`checks/${name}`);
  if (rows.length === 0)
    throw new Error(`reference/checks/${name} has no rows: a test over it would assert nothing`);
  return rows;
}

/** A cell as a number; fails on an empty or unreadable one instead of comparing with NaN. */
export function numberIn(row: CsvRow, column: string): number {
  const text = row[column];
  const value = Number(text);
  if (text === undefined || text.trim() === '' || !Number.isFinite(value)) {
    throw new Error(`column ${column} holds "${String(text)}", not a number`);
  }
  return value;
}

/** Distance from the expected value over its size, with a floor that keeps rounded zeros comparable. */
export function relativeError(value: number, expected: number, floor = 1e-12): number {
  return Math.abs(value - expected) / Math.max(Math.abs(expected), floor);
}
