import { readableKind } from '../dataset/record-kinds';
import type { SampleRow, TracedValue } from '../dataset/sample-row';
import { turnedTable } from '../sheet/turned';
import { isRefused, presentText } from './cell-problems';
import type { VettingContext } from './context';
import type { RuleHit } from './rule';

/** Where a finding is pinned. What is null is the whole of it. */
export type Place = Pick<RuleHit, 'sheet' | 'row' | 'column' | 'field'>;

/** "AB12" → column AB, row 12; null for anything else. */
export function splitAddress(cell: string | null | undefined): { column: string; row: number } | null {
  const parts = /^([A-Z]{1,3})(\d{1,7})$/.exec(cell ?? '');
  return parts ? { column: parts[1]!, row: Number(parts[2]) } : null;
}

/** Sheets whose table is turned, by context: there a mapped letter stands for a row. */
const known = new WeakMap<VettingContext, Set<string>>();

function turnedSheets(context: VettingContext): Set<string> {
  const before = known.get(context);
  if (before) return before;
  const kind = readableKind(context.kind ?? 'dust-flux');
  const turned = context.mapping.tables.filter((table) => {
    const sheet = context.workbook.sheets.find(({ name }) => name === table.sheet);
    return table.used && sheet !== undefined && turnedTable(sheet, table, kind) !== null;
  });
  const sheets = new Set(turned.map(({ sheet }) => sheet));
  known.set(context, sheets);
  return sheets;
}

/** Column letter a field was mapped from on a sheet, null when it came from elsewhere or runs along a row. */
export function columnOf(context: VettingContext, sheet: string, field: string): string | null {
  if (turnedSheets(context).has(sheet)) return null;
  return context.mapping.columns.find((c) => c.sheet === sheet && c.field === field)?.column ?? null;
}

/** The cell behind one field of a row; the row alone when the value came from no cell. */
export function placeOf(context: VettingContext, row: SampleRow, field: string): Place {
  const address = splitAddress(row.cells[field]?.cell);
  return {
    sheet: row.sheet,
    row: address?.row ?? row.row,
    column: address?.column ?? columnOf(context, row.sheet, field),
    field,
  };
}

/** A whole column, or the sheet when the field has none. */
export function columnPlace(context: VettingContext, sheet: string, field: string): Place {
  return { sheet, row: null, column: columnOf(context, sheet, field), field };
}

export const sheetPlace = (sheet: string, field?: string): Place => ({
  sheet,
  row: null,
  column: null,
  field,
});

export const filePlace = (field?: string): Place => ({ sheet: null, row: null, column: null, field });

/** A row's number for a field, also for fields that only its cells hold. */
export function numberOf(row: SampleRow, field: string): number | null {
  const own = (row as unknown as Record<string, unknown>)[field];
  const value = own === undefined ? row.cells[field]?.value : own;
  return typeof value === 'number' && Number.isFinite(value) ? value : null;
}

/** A row's text for a field, also for fields that only its cells hold; null when empty. */
export function textOf(row: SampleRow, field: string): string | null {
  const own = (row as unknown as Record<string, unknown>)[field];
  const value = own === undefined ? row.cells[field]?.value : own;
  return typeof value === 'string' && value.trim() !== '' ? value.trim() : null;
}

/**
 * Rows with a field, but each source cell only once: a position that stands above its table,
 * or was typed in the form, is one fault and not one a row.
 */
export function* distinctCells(
  rows: Iterable<SampleRow>,
  field: string,
): Iterable<{ row: SampleRow; traced: TracedValue | undefined }> {
  const seen = new Set<string>();
  for (const row of rows) {
    const traced = row.cells[field];
    if (traced && !isOwnCell(row, traced.cell)) {
      const key = `${row.sheet}\u0000${traced.cell ?? 'form'}\u0000${traced.raw}`;
      if (seen.has(key)) continue;
      seen.add(key);
    }
    yield { row, traced };
  }
}

/** Whether a cell stands in the row's own line, so that no other row shares it: "F7" in row 7, not in row 17. */
function isOwnCell(row: SampleRow, cell: string | null): boolean {
  const line = String(row.row);
  return cell !== null && cell.endsWith(line) && !(cell.charCodeAt(cell.length - line.length - 1) < 65);
}

/** Rows by sheet, sheets in the order they come. */
export function bySheet(rows: Iterable<SampleRow>): Map<string, SampleRow[]> {
  return groupBy(rows, (row) => row.sheet);
}

export function groupBy<T>(items: Iterable<T>, keyOf: (item: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>();
  for (const item of items) {
    const key = keyOf(item);
    const group = groups.get(key);
    if (group) group.push(item);
    else groups.set(key, [item]);
  }
  return groups;
}

/** The finding for a cell whose number was refused on reading as impossible; null for any other cell. */
export function refusedHit(
  context: VettingContext,
  row: SampleRow,
  field: string,
  title: string,
): RuleHit | null {
  const traced = row.cells[field];
  if (!isRefused(traced)) return null;
  return {
    ...placeOf(context, row, field),
    message: `The ${title} "${presentText(traced)}" is impossible: ${traced.problem!.message.replace(/\.$/, '')}.`,
    remedy: `Type the right ${title} over it, or leave the row out with a reason.`,
    remedyKind: 'mend',
  };
}
