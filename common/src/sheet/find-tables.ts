import type { RawSheet } from './grid';
import { looksLikeUnit } from './heading';
import { isFilled, type RowShape, shapeOf, textOf } from './row-kind';

/** Rows of one table, counted from 1 as a spreadsheet does. */
export interface FoundTable {
  headerRows: number[];
  unitsRow: number | null;
  firstRow: number;
  lastRow: number;
}

/** Rows between two runs of numbers that may be gaps, sub-headings or subtotals of one table. */
const LARGEST_GAP = 8;
const MOST_HEADER_ROWS = 4;
/** Longer texts are prose. */
const LONGEST_HEADING = 80;

/**
 * Finds the tables of a sheet: runs of rows with numbers, each with the header rows right above it.
 * Totals, footnotes, blank rows and sub-headings inside or after a run do not end or extend it;
 * a new header row begins a new table. One pass over the cells.
 */
export function findTables(sheet: RawSheet): FoundTable[] {
  const shapes = sheet.rows.map(shapeOf);
  const tables: FoundTable[] = [];
  let from = 0;
  for (;;) {
    const first = indexOfNumbers(shapes, from, shapes.length);
    if (first < 0) return tables;
    if (isColumnNumbers(sheet, shapes, first)) {
      from = first + 1;
      continue;
    }
    const headerRows = headersAbove(sheet, shapes, first, from);
    const last = lastOfRun(sheet, shapes, first);
    const unitsRow = unitsRowOf(sheet, headerRows);
    tables.push({
      headerRows: headerRows.map((r) => r + 1),
      unitsRow: unitsRow === null ? null : unitsRow + 1,
      firstRow: first + 1,
      lastRow: last + 1,
    });
    from = last + 1;
  }
}

function indexOfNumbers(shapes: RowShape[], from: number, to: number): number {
  for (let r = from; r < to; r += 1) if (shapes[r]?.kind === 'numbers') return r;
  return -1;
}

/** "1  2  3" right above the headings: the columns are numbered for a list of them in the text. */
function isColumnNumbers(sheet: RawSheet, shapes: RowShape[], row: number): boolean {
  const cells = (sheet.rows[row] ?? []).filter(isFilled);
  const below = shapes[row + 1];
  if (below?.kind !== 'text' || below.texts < 2 || below.filled !== cells.length) return false;
  const numbers = cells.map((cell) => (/^\d{1,3}$/.test(cell.text.trim()) ? Number(cell.text) : NaN));
  return numbers.length >= 2 && numbers.every((number, i) => i === 0 || number === numbers[i - 1]! + 1);
}

function lastOfRun(sheet: RawSheet, shapes: RowShape[], first: number): number {
  let last = first;
  for (let r = first + 1; r < shapes.length; r += 1) {
    const kind = shapes[r]?.kind;
    if (kind === 'numbers' || (kind === 'some-numbers' && r === last + 1 && fitsColumns(sheet, last, r))) {
      last = r;
      continue;
    }
    const next = indexOfNumbers(shapes, r, Math.min(shapes.length, r + LARGEST_GAP));
    if (next < 0 || headersAbove(sheet, shapes, next, last + 1).length > 0) return last;
    r = next;
    last = next;
  }
  return last;
}

/** A row with a single number still belongs to the run when the number stands where the row above has one. */
function fitsColumns(sheet: RawSheet, above: number, row: number): boolean {
  return (sheet.rows[row] ?? []).some(
    (cell, c) => isFilled(cell) && cell.kind === 'number' && isFilled(sheet.rows[above]?.[c]),
  );
}

/** Rows of texts right above the first row of numbers, one blank row between them allowed. */
function headersAbove(sheet: RawSheet, shapes: RowShape[], first: number, from: number): number[] {
  const rows: number[] = [];
  let r = first - 1;
  if (r >= from && shapes[r]?.kind === 'blank') r -= 1;
  for (; r >= from && rows.length < MOST_HEADER_ROWS; r -= 1) {
    const shape = shapes[r];
    const texts = (sheet.rows[r] ?? []).filter(isFilled);
    const enough = shape && shape.texts >= (rows.length === 0 ? 1 : 2);
    if (
      !shape ||
      shape.kind !== 'text' ||
      !enough ||
      texts.some((cell) => cell.text.length > LONGEST_HEADING)
    )
      break;
    if (texts[0]?.text.trimStart().startsWith('#')) break;
    rows.unshift(r);
  }
  // A lone text above numbers is a title or sub-heading, not a header, unless a real header row stands above it.
  return rows.some((row) => (shapes[row]?.texts ?? 0) >= 2) ? rows : [];
}

/** The header row whose cells read as units; never the only header row, for "year" or "a" may head a column. */
function unitsRowOf(sheet: RawSheet, headerRows: number[]): number | null {
  let best: { row: number; share: number } | null = null;
  for (const row of headerRows.slice(1)) {
    const texts = (sheet.rows[row] ?? []).filter(isFilled).map(textOf);
    const share = texts.filter(looksLikeUnit).length / texts.length;
    if (share >= 0.5 && share > (best?.share ?? 0)) best = { row, share };
  }
  return best?.row ?? null;
}
