import type { DatasetKind } from '../dataset/field';
import type { ColumnHeading, TableRows } from './column-headings';
import type { RawSheet } from './grid';
import { splitHeading } from './heading';
import { isFilled } from './row-kind';

const ROWS_SAMPLED = 20;
const MOST_WORDS = 4;

/**
 * Puts together headings that were cut at their blanks: a text file whose columns are parted by blanks gives
 * "Real | Part | Imaginary | Part" over two columns. Words that together are a heading of the kind are joined; the
 * result counts only if there are then as many headings as columns. Else the headings stay as they are.
 */
export function rejoined(
  headings: ColumnHeading[],
  sheet: RawSheet,
  table: TableRows & { firstRow: number; lastRow: number },
  kind: DatasetKind,
): ColumnHeading[] {
  const words = headings.filter(({ text }) => text !== '').map(({ text }) => text);
  const columns = sheet.rows
    .slice(table.firstRow - 1, Math.min(table.lastRow, table.firstRow - 1 + ROWS_SAMPLED))
    .reduce((most, row) => Math.max(most, row.findLastIndex(isFilled) + 1), 0);
  const rowsOfNames = table.headerRows.filter((row) => row !== table.unitsRow);
  if (rowsOfNames.length !== 1 || columns < 2 || words.length <= columns) return headings;
  const known = new Set(kind.fields.flatMap((field) => field.headings));
  const joined: string[] = [];
  for (let i = 0; i < words.length;) {
    const length = longestKnown(words, i, known);
    joined.push(words.slice(i, i + length).join(' '));
    i += length;
  }
  if (joined.length !== columns) return headings;
  return headings.map((heading, i) => ({ ...splitHeading(joined[i] ?? ''), index: heading.index }));
}

function longestKnown(words: string[], from: number, known: Set<string>): number {
  for (let length = Math.min(MOST_WORDS, words.length - from); length > 1; length -= 1) {
    if (known.has(splitHeading(words.slice(from, from + length).join(' ')).key)) return length;
  }
  return 1;
}
