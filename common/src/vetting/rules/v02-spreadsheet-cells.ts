import type { SampleRow } from '../../dataset/sample-row';
import type { RawCell, RawSheet } from '../../sheet/grid';
import { presentText, problemKind } from '../cell-problems';
import { columnPlace, placeOf, splitAddress } from '../place';
import type { VettingContext } from '../context';
import type { Rule } from '../rule';
import { isWithoutValue } from '../samples';
import { counted } from '../wording';

/** Formulas, error values and dates that a spreadsheet program put where numbers or names are wanted. */
export const spreadsheetCells: Rule = {
  id: 'V02',
  slug: 'spreadsheet-cells',
  title: 'Formulas, error values and dates in cells',
  severity: 'error',
  stage: 'file',
  needs: [],
  source: 'common practice, no source: spreadsheets alter values',
  why: 'The stored result of a formula may be out of date, an error value hides a broken reference, and names such as 1-2 are turned into 1 February without a word.',
  kinds: 'all',

  *check(context) {
    const formulas = new Map<string, { sheet: string; field: string; first: string; count: number }>();
    for (const { row, field, cell, address } of mappedCells(context)) {
      if (cell.formula !== undefined) countFormula(formulas, row.sheet, field, address);
      if (row.cells[field]?.mended !== undefined) continue;
      const problem = problemKind(row.cells[field]);
      if (cell.kind === 'error' || problem === 'error-cell') {
        yield {
          ...placeOf(context, row, field),
          severity: isWithoutValue(context, row) ? 'note' : 'error',
          message: `Cell ${address} holds the error value ${cell.text}.`,
          remedy: 'Type the value over it, or leave the row out with a reason.',
          remedyKind: 'mend',
        };
      } else if (cell.kind === 'date' || problem === 'date') {
        yield {
          ...placeOf(context, row, field),
          severity: problem ? 'error' : 'warning',
          message: `Cell ${address} holds a date (${presentText(row.cells[field]!)}) where ${field} is wanted; it may have been made from a name or a range such as 1-2.`,
          remedy: 'Type what was meant over it, or waive it if the text is right.',
          remedyKind: problem ? 'mend' : 'waive',
        };
      }
    }
    for (const { sheet, field, first, count } of formulas.values()) {
      yield {
        ...columnPlace(context, sheet, field),
        severity: 'warning',
        subject: 'formula',
        message: `There are formulas in ${counted(count, 'cell')} of ${field} (first ${first}); the stored results were read and nothing was computed.`,
        remedy: 'Check that the stored results are up to date, or paste them as values and upload again.',
        remedyKind: 'waive',
      };
    }
  },
};

function countFormula(
  found: Map<string, { sheet: string; field: string; first: string; count: number }>,
  sheet: string,
  field: string,
  first: string,
): void {
  const key = `${sheet}\u0000${field}`;
  const known = found.get(key);
  if (known) known.count += 1;
  else found.set(key, { sheet, field, first, count: 1 });
}

/** Raw cells behind the rows' own values; a cell that serves many rows (a position above the table) comes once. */
function* mappedCells(
  context: VettingContext,
): Iterable<{ row: SampleRow; field: string; cell: RawCell; address: string }> {
  const sheets = new Map(context.workbook.sheets.map((sheet) => [sheet.name, sheet]));
  const shared = new Set<string>();
  for (const row of context.rows) {
    for (const [field, traced] of Object.entries(row.cells)) {
      const at = splitAddress(traced.cell);
      const cell = at && rawCell(sheets.get(row.sheet), at);
      if (!at || !cell) continue;
      if (at.row !== row.row) {
        const place = `${row.sheet}\u0000${traced.cell}`;
        if (shared.has(place)) continue;
        shared.add(place);
      }
      yield { row, field, cell, address: traced.cell! };
    }
  }
}

function rawCell(sheet: RawSheet | undefined, at: { column: string; row: number }): RawCell | null {
  let column = 0;
  for (const letter of at.column) column = column * 26 + letter.charCodeAt(0) - 64;
  return sheet?.rows[at.row - 1]?.[column - 1] ?? null;
}
