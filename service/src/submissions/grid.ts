import type { SampleRow } from '@siltlight/common/dataset/sample-row';
import { columnLetter, type RawSheet } from '@siltlight/common/sheet/grid';
import type { TableProposal } from '@siltlight/common/sheet/mapping';
import type { GridWindow } from '@siltlight/common/wire/submissions';
import { notFound } from '../http/problem';
import type { Evaluation } from './evaluation.service';

/** A window of a sheet: raw cells, and under each mapped one its canonical value. */
export function gridWindow(
  { workbook, rows }: Evaluation,
  tables: readonly TableProposal[],
  query: { sheet: string; fromRow: number; limit: number },
): GridWindow {
  const sheet = workbook.sheets.find(({ name }) => name === query.sheet);
  if (!sheet) throw notFound('Sheet', query.sheet);
  const samples = samplesByRow(rows, sheet.name);
  const used = tables.filter((table) => table.used && table.sheet === sheet.name);
  const last = Math.min(sheet.rows.length, query.fromRow + query.limit - 1);
  const numbers = Array.from(
    { length: Math.max(0, last - query.fromRow + 1) },
    (_, index) => query.fromRow + index,
  );
  return {
    sheet: sheet.name,
    columns: Array.from({ length: sheet.columnCount }, (_, index) => columnLetter(index)),
    rowCount: sheet.rows.length,
    fromRow: query.fromRow,
    rows: numbers.map((number) => ({
      row: number,
      data: used.some(({ firstRow, lastRow }) => number >= firstRow && number <= lastRow),
      leftOut: samples.get(number)?.[0]?.leftOut ?? null,
      cells: cellsOf(sheet, number, samples.get(number) ?? []),
    })),
  };
}

/** A row with two tracers gives two samples. */
function samplesByRow(rows: readonly SampleRow[], sheet: string): Map<number, SampleRow[]> {
  const byRow = new Map<number, SampleRow[]>();
  for (const row of rows) {
    if (row.sheet === sheet) byRow.set(row.row, [...(byRow.get(row.row) ?? []), row]);
  }
  return byRow;
}

type Cells = GridWindow['rows'][number]['cells'];

function cellsOf(sheet: RawSheet, row: number, samples: readonly SampleRow[]): Cells {
  const cells: Cells = {};
  (sheet.rows[row - 1] ?? []).forEach((cell, index) => {
    if (!cell) return;
    cells[columnLetter(index)] =
      cell.formula === undefined ? { text: cell.text } : { text: cell.text, formula: cell.formula };
  });
  for (const { cell, raw, mended, value, unit, rule, problem } of samples.flatMap((sample) =>
    Object.values(sample.cells),
  )) {
    // A value taken from above the table or from the form stands in no cell of this row.
    const column = cell?.endsWith(String(row)) ? cell.slice(0, -String(row).length) : '';
    if (!/^[A-Z]+$/.test(column)) continue;
    cells[column] = {
      ...(cells[column] ?? { text: raw }),
      value,
      unit,
      rule,
      ...(mended === undefined ? {} : { mended }),
      ...(problem === undefined ? {} : { problem: problem.message }),
    };
  }
  return cells;
}
