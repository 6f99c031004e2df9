import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';

/** This folder, whether the code runs from source or from `dist/`. */
const ROOT = path.basename(__dirname) === 'dist' ? path.dirname(__dirname) : __dirname;

export type CsvRow = Record<string, string>;

/** Absolute path of a file of this folder, e.g. `samples/A_expected.csv`. */
export function referencePath(name: string): string {
  const file = path.join(ROOT, name);
  if (!existsSync(file)) throw new Error(`reference/${name} does not exist`);
  return file;
}

/** Rows of a table of this folder as text, keyed by its header. UTF-8, RFC 4180. */
export function readCsv(name: string): CsvRow[] {
  const [header, ...rows] = parseCsv(readFileSync(referencePath(name), 'utf8'));
  if (!header) throw new Error(`reference/${name} is empty`);
  return rows.map((cells, index) => {
    if (cells.length !== header.length) {
      throw new Error(
        `reference/${name}, record ${index + 2}: ${cells.length} cells, ${header.length} headings`,
      );
    }
    return Object.fromEntries(header.map((column, i) => [column, cells[i] ?? '']));
  });
}

/** Splits RFC 4180 text into records of cells; empty lines are left out. */
export function parseCsv(text: string): string[][] {
  const records: string[][] = [];
  let record: string[] = [];
  for (const [, quoted, plain, end] of text.matchAll(/(?:"((?:[^"]|"")*)"|([^",\r\n]*))(,|\r?\n|$)/g)) {
    record.push(quoted === undefined ? (plain ?? '') : quoted.replaceAll('""', '"'));
    if (end === ',') continue;
    if (record.length > 1 || record[0] !== '') records.push(record);
    record = [];
  }
  return records;
}
