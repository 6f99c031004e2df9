import type { DatasetKind } from '../dataset/field';
import { columnLetter, type RawCell, type RawSheet } from './grid';
import { headingKey, looksLikeUnit, splitHeading, uncertaintyOf } from './heading';
import type { TableProposal } from './mapping';
import { isFilled, isNumberLike, textOf } from './row-kind';

/** Column letters go to three places, and nobody turns a longer table. */
const MOST_FIELDS = 700;
const FEWEST_FIELDS = 3;

export interface TurnedTable {
  /** the sheet with rows and columns exchanged, so that the fields head its columns */
  sheet: RawSheet;
  /** the table in rows of that view */
  table: TableProposal;
}

/**
 * Finds a table whose fields run down a column and whose samples stand side by side: at least three rows in turn begin
 * with a heading of the kind, one of them that of a value or of what stands for it, and most of their other cells are numbers.
 * Null when the sheet has none.
 */
export function findTurned(sheet: RawSheet, kind: DatasetKind): TableProposal | null {
  const known = new Map(kind.fields.flatMap(({ field, headings }) => headings.map((key) => [key, field])));
  const wanted = new Set([kind.valueField, ...(kind.usableWith ?? []).flat()]);
  let run: { row: number; field: string }[] = [];
  let label = -1;
  for (let r = 0; r <= Math.min(sheet.rows.length, MOST_FIELDS); r += 1) {
    const row = sheet.rows[r] ?? [];
    const c = row.findIndex(isFilled);
    const field = c < 0 ? undefined : fieldHeaded(textOf(row[c]), known);
    const fits =
      field !== undefined &&
      row.slice(c + 1).filter(isFilled).length >= 2 &&
      (run.length === 0 || c === label);
    if (fits) {
      if (run.length === 0) label = c;
      run.push({ row: r + 1, field });
      continue;
    }
    if (c >= 0 && run.length > 0 && isUnknownField(row, c, label)) continue;
    if (
      run.length >= FEWEST_FIELDS &&
      run.some((one) => wanted.has(one.field)) &&
      mostlyNumbers(sheet, run, label)
    )
      return proposalOf(sheet, run[0]!.row, run.at(-1)!.row, label);
    run = [];
  }
  return null;
}

function fieldHeaded(text: string, known: Map<string, string>): string | undefined {
  const heading = splitHeading(text.replace(/[:=]\s*$/, ''));
  if (uncertaintyOf(heading) !== null && headingKey(heading.name).length > 0) return 'uncertainty';
  return known.get(heading.key);
}

/** A row in the middle that begins with a text no field is headed by, beside numbers. */
const isUnknownField = (row: readonly (RawCell | null)[], c: number, label: number): boolean =>
  c === label &&
  row[c]?.kind === 'text' &&
  row.slice(c + 1).filter((cell) => isFilled(cell) && isNumberLike(cell)).length >= 2;

/** Rows of a turned table differ in what they hold; a table the right way up has as many headings as columns in one row. */
function mostlyNumbers(sheet: RawSheet, run: { row: number }[], label: number): boolean {
  const numeric = run.filter(({ row }) => {
    const cells = (sheet.rows[row - 1] ?? []).slice(label + 1).filter(isFilled);
    return cells.filter(isNumberLike).length >= cells.length * 0.6;
  });
  return numeric.length >= 2;
}

function proposalOf(sheet: RawSheet, firstRow: number, lastRow: number, label: number): TableProposal {
  return {
    sheet: sheet.name,
    headerRows: [],
    unitsRow: null,
    firstRow,
    lastRow,
    used: true,
    reason: `Turned: the fields run down column ${columnLetter(label)} (rows ${firstRow}–${lastRow}) and each column to its right is a sample. In the list of columns, the letter stands for the row: A for row 1, B for row 2.`,
  };
}

/**
 * The turned view of a proposed or corrected table, or null when it is not turned: a table without header rows whose
 * rows begin with headings. Told from the sheet alone, so that it holds for any mapping with these rows.
 */
export function turnedTable(sheet: RawSheet, table: TableProposal, kind: DatasetKind): TurnedTable | null {
  if (table.headerRows.length > 0 || table.lastRow > MOST_FIELDS) return null;
  const cut: RawSheet = {
    ...sheet,
    rows: sheet.rows.map((row, r) => (r + 1 >= table.firstRow && r + 1 <= table.lastRow ? row : [])),
  };
  const found = findTurned(cut, kind);
  if (!found) return null;
  const label = (sheet.rows[found.firstRow - 1] ?? []).findIndex(isFilled);
  const width = cut.rows.reduce((most, row) => Math.max(most, row.length), 0);
  const rows = Array.from({ length: width }, (_column, c) => cut.rows.map((row) => row[c] ?? null));
  const units = rows[label + 1]?.filter(isFilled) ?? [];
  const hasUnits =
    units.length > 0 && units.filter((cell) => looksLikeUnit(cell.text)).length >= units.length * 0.5;
  const view = { name: sheet.name, rows, columnCount: sheet.rows.length };
  const first = label + (hasUnits ? 3 : 2);
  return {
    sheet: view,
    table: {
      ...table,
      headerRows: hasUnits ? [label + 1, label + 2] : [label + 1],
      unitsRow: hasUnits ? label + 2 : null,
      firstRow: first,
      lastRow: width,
    },
  };
}
