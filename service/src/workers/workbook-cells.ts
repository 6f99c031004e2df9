import { cellAddress } from '@siltlight/common/sheet/grid';
import type { CellObject, WorkSheet } from 'xlsx';
import { countInWords, type ReadLimits } from './limits';
import { cellKinds, type WireCell } from './reader-messages';
import { UploadRefused } from './upload-refused';
import { tooManyCells } from './zip-workbook';

/** The parts of the parser's number formatting that dates need. */
export interface DateFormats {
  is_date(format: string): boolean;
  parse_date_code(serial: number, options: { date1904: boolean }): DateParts | null;
}

interface DateParts {
  y: number;
  m: number;
  d: number;
  H: number;
  M: number;
  S: number;
}

export interface CellTally {
  cells: number;
  formulas: number;
  formulasWithoutValue: number;
}

interface SheetContext {
  fileName: string;
  sheetName: string;
  limits: ReadLimits;
  date1904: boolean;
  dates: DateFormats;
  tally: CellTally;
}

/** A row of a dense sheet that has cells; a row without any is a hole. */
export interface FilledRow {
  /** zero-based */
  index: number;
  cells: WireCell[];
}

/** Walks the cells that exist. The extent a sheet states for itself is never looked at. */
export function filledRows(sheet: WorkSheet, context: SheetContext): FilledRow[] {
  const filled: FilledRow[] = [];
  (sheet as unknown as (CellObject | undefined)[][]).forEach((row, index) => {
    if (!Array.isArray(row)) return;
    const cells: WireCell[] = [];
    row.forEach((cell, column) => {
      const wire = cell ? wireCell(cell, context) : null;
      if (wire === null) return;
      checkPlace(wire, index, column, context);
      while (cells.length < column) cells.push(null);
      cells.push(wire);
    });
    if (cells.length > 0) filled.push({ index, cells });
  });
  return filled;
}

function checkPlace(
  cell: WireCell,
  row: number,
  column: number,
  { fileName, sheetName, limits, tally }: SheetContext,
): void {
  const where = `"${fileName}", sheet "${sheetName}", cell ${cellAddress(column, row + 1)}`;
  if (column >= limits.columns) {
    throw new UploadRefused(
      'too-many-columns',
      `${where} lies beyond the ${countInWords(limits.columns)} columns that are read. Clear it if it is there by accident, or send the table in parts.`,
      limits.columns,
    );
  }
  if (row >= limits.workbookRows) {
    throw new UploadRefused(
      'too-many-rows',
      `${where} lies beyond the ${countInWords(limits.workbookRows)} rows that are read from a workbook. Clear it if it is there by accident, or save the sheet as .csv.`,
      limits.workbookRows,
    );
  }
  const text = typeof cell === 'string' ? cell : (cell?.[1] ?? '');
  if (text.length > limits.cellCharacters) throw cellTooLong(where, text.length, limits.cellCharacters);
  tally.cells += 1;
  if (tally.cells > limits.workbookCells) throw tooManyCells(fileName, limits.workbookCells);
}

export const cellTooLong = (where: string, characters: number, limit: number): UploadRefused =>
  new UploadRefused(
    'cell-too-long',
    `${where} holds ${countInWords(characters)} characters; ${countInWords(limit)} are allowed. Shorten it, or check for a quotation mark that is never closed.`,
    limit,
  );

function wireCell(cell: CellObject, context: SheetContext): WireCell {
  const formula =
    typeof cell.f === 'string' && cell.f !== '' ? cell.f.slice(0, context.limits.cellCharacters) : undefined;
  const value = wireValue(cell, context);
  if (formula === undefined) return value;
  context.tally.formulas += 1;
  if (value === null) context.tally.formulasWithoutValue += 1;
  if (value === null || typeof value === 'string') return [0, value ?? '', null, formula];
  return [value[0], value[1], value[2] ?? null, formula];
}

function wireValue(cell: CellObject, context: SheetContext): WireCell {
  switch (cell.t) {
    case 's':
      return cell.v === undefined || cell.v === '' ? null : String(cell.v);
    case 'b':
      return kind('boolean', cell.v ? 'TRUE' : 'FALSE');
    case 'e':
      return kind('error', cell.w ?? '#ERROR');
    case 'd':
      return kind('date', isoText(cell.v));
    case 'n':
      return wireNumber(cell, context);
    default:
      return null;
  }
}

function wireNumber(cell: CellObject, { date1904, dates }: SheetContext): WireCell {
  const value = cell.v;
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    return kind('error', cell.w ?? String(value ?? ''));
  }
  const format = typeof cell.z === 'string' ? cell.z : 'General';
  // A duration such as [h]:mm counts hours beyond a day: it stays a number.
  if (!/\[[hms]+\]/i.test(format) && dates.is_date(format)) {
    const parts = dates.parse_date_code(value, { date1904 });
    if (parts) return kind('date', isoOf(parts, value));
  }
  return kind('number', cell.w ?? String(value), value);
}

const kind = (name: (typeof cellKinds)[number], text: string, number?: number): WireCell =>
  number === undefined ? [cellKinds.indexOf(name), text] : [cellKinds.indexOf(name), text, number];

const isoText = (value: unknown): string =>
  value instanceof Date ? value.toISOString().replace(/T00:00:00\.000Z$/, '') : String(value);

const pad = (n: number, width = 2): string => String(Math.floor(n)).padStart(width, '0');

/** "1998-05-06", "1998-05-06T12:30:00", or "12:30:00" when the cell holds a time of day only. */
function isoOf({ y, m, d, H, M, S }: DateParts, serial: number): string {
  const time = `${pad(H)}:${pad(M)}:${pad(S)}`;
  if (serial >= 0 && serial < 1) return time;
  const date = `${pad(y, 4)}-${pad(m)}-${pad(d)}`;
  return H || M || S ? `${date}T${time}` : date;
}
