import { readFileSync } from 'node:fs';
import * as path from 'node:path';
import * as xlsx from 'xlsx';
import type { RawCell, RawSheet, RawWorkbook } from './grid';

const samples = path.resolve(__dirname, '../../../reference/samples');

/** A sample workbook as plain cells. The product reads uploads in a process of its own; this is for tests only. */
export function sampleWorkbook(fileName: string): RawWorkbook {
  const book = xlsx.read(readFileSync(path.join(samples, fileName)), { cellFormula: true });
  const format = fileName.endsWith('.xls') ? 'xls' : 'xlsx';
  const sheets = book.SheetNames.map((name) => plainSheet(name, book.Sheets[name] ?? {}));
  return { fileName, format, sheets, readNotes: [] };
}

function plainSheet(name: string, sheet: xlsx.WorkSheet): RawSheet {
  const range = xlsx.utils.decode_range(sheet['!ref'] ?? 'A1');
  const rows = Array.from({ length: range.e.r + 1 }, (_row, r) =>
    Array.from({ length: range.e.c + 1 }, (_cell, c) =>
      plainCell(sheet[xlsx.utils.encode_cell({ r, c })] as xlsx.CellObject | undefined),
    ),
  );
  return {
    name,
    rows,
    columnCount: range.e.c + 1,
    merged: (sheet['!merges'] ?? []).map((merge) => xlsx.utils.encode_range(merge)),
  };
}

function plainCell(cell: xlsx.CellObject | undefined): RawCell | null {
  if (!cell || cell.v === undefined) return null;
  if (cell.t === 'n') return { text: String(cell.v), number: cell.v as number, kind: 'number' };
  return { text: String(cell.v), kind: 'text' };
}

/** A delimited Latin-1 or UTF-8 sample as plain text cells. */
export function sampleText(
  fileName: string,
  delimiter: string | RegExp,
  encoding: 'latin1' | 'utf8',
): RawWorkbook {
  return textWorkbook(
    readFileSync(path.join(samples, fileName), encoding),
    delimiter,
    path.basename(fileName),
  );
}

export function textWorkbook(
  text: string,
  delimiter: string | RegExp = ',',
  fileName = 'made-for-a-test.csv',
): RawWorkbook {
  const rows = text
    .split(/\r?\n/)
    .map((line) =>
      (typeof delimiter === 'string' ? line : line.trim())
        .split(delimiter)
        .map((cell): RawCell | null => (cell === '' ? null : { text: cell, kind: 'text' })),
    );
  return {
    fileName,
    format: 'csv',
    delimiter: String(delimiter),
    sheets: [sheetOf(fileName.replace(/\.[^.]*$/, ''), rows)],
    readNotes: [],
  };
}

/** A sheet from values: numbers become number cells, texts text cells, null an empty one. */
export function sheetOfValues(name: string, values: (string | number | null)[][]): RawSheet {
  return sheetOf(
    name,
    values.map((row) =>
      row.map((value) =>
        value === null
          ? null
          : typeof value === 'number'
            ? { text: String(value), number: value, kind: 'number' }
            : { text: value, kind: 'text' },
      ),
    ),
  );
}

const sheetOf = (name: string, rows: (RawCell | null)[][]): RawSheet => ({
  name,
  rows,
  columnCount: rows.reduce((most, row) => Math.max(most, row.length), 1),
});

export interface ExpectedRow {
  site: string;
  lat: number;
  lon: number;
  age: number;
  flux: number;
  uncertainty: number | null;
  quantity?: string;
}

/** Rows of an expected file of the samples. */
export function expectedRows(fileName: string): ExpectedRow[] {
  const [head = '', ...lines] = readFileSync(path.join(samples, fileName), 'utf8').trim().split(/\r?\n/);
  const names = head.split(',');
  return lines.map((line) => {
    const cells = line.split(',');
    const at = (name: string): string => cells[names.indexOf(name)] ?? '';
    const uncertainty = at('uncertainty_g_m2_yr');
    return {
      site: at('site'),
      lat: Number(at('lat')),
      lon: Number(at('lon')),
      age: Number(at('age_ka_BP')),
      flux: Number(at('flux_g_m2_yr')),
      uncertainty: uncertainty === '' ? null : Number(uncertainty),
      ...(names.includes('quantity') ? { quantity: at('quantity') } : {}),
    };
  });
}
