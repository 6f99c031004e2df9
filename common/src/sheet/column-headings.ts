import type { RawSheet } from './grid';
import { type Heading, looksLikeUnit, splitHeading } from './heading';
import { isFilled, textOf } from './row-kind';

export interface TableRows {
  headerRows: number[];
  unitsRow: number | null;
}

/** Heading of one column: its header rows joined, merged cells spread over their columns, the unit beside it. */
export interface ColumnHeading extends Heading {
  /** zero-based */
  index: number;
}

/** Headings of all columns of a table; the units row wins over a unit inside the heading. */
export function columnHeadings(sheet: RawSheet, table: TableRows): ColumnHeading[] {
  const nameRows = table.headerRows.filter((row) => row !== table.unitsRow);
  const spread = nameRows.map((row) =>
    spreadRow(sheet, row, nameRows.length > 1 ? nameRows.at(-1) : undefined),
  );
  return Array.from({ length: sheet.columnCount }, (_unused, index) => {
    const parts = spread
      .map((cells) => (cells[index] ?? '').trim())
      .filter((part, i, all) => part !== '' && part !== all[i - 1]);
    const heading = splitHeading(parts.join(' '));
    const below = table.unitsRow === null ? '' : textOf(sheet.rows[table.unitsRow - 1]?.[index]).trim();
    // "EDC3" or "(assumed)" in the units row is no unit; other texts there are shown as what they are.
    const isRemark = !looksLikeUnit(below) && (heading.unit !== null || /^\(.*\)$/.test(below));
    return { ...heading, index, unit: below === '' || isRemark ? heading.unit : below };
  });
}

/** Texts of a header row; a merged cell, or one left empty over a statistic ("mean | s.d."), repeats its left neighbour. */
function spreadRow(sheet: RawSheet, row: number, lowest: number | undefined): string[] {
  const cells = sheet.rows[row - 1] ?? [];
  const texts = Array.from({ length: sheet.columnCount }, (_unused, i) => textOf(cells[i]));
  const merges = (sheet.merged ?? []).map(mergedColumns).filter((range) => range.row === row);
  for (const { first, last } of merges) texts.fill(texts[first] ?? '', first, last + 1);
  if (merges.length > 0 || lowest === undefined || row === lowest) return texts;
  const below = sheet.rows[lowest - 1] ?? [];
  for (let i = 1; i < texts.length; i += 1) {
    const under = below[i];
    if (texts[i] === '' && texts[i - 1] !== '' && isFilled(under) && isFilled(below[i - 1]))
      texts[i] = texts[i - 1] ?? '';
  }
  return texts;
}

function mergedColumns(range: string): { row: number; first: number; last: number } {
  const found = /^([A-Z]+)(\d+):([A-Z]+)\d+$/.exec(range);
  if (!found) return { row: -1, first: 0, last: -1 };
  return { row: Number(found[2]), first: columnIndex(found[1] ?? ''), last: columnIndex(found[3] ?? '') };
}

/** Zero-based index of a column letter: "A" is 0, "AA" is 26. */
export function columnIndex(letters: string): number {
  let index = 0;
  for (const letter of letters.toUpperCase()) index = index * 26 + letter.charCodeAt(0) - 64;
  return index - 1;
}
