import type { DatasetKind } from '../dataset/field';
import { parseAgeUnit } from '../units/age';
import { isUnitProblem } from '../units/unit';
import type { ColumnHeading } from './column-headings';
import { cellAddress, type RawSheet } from './grid';
import { headingKey, looksLikeUnit } from './heading';
import type { RowSpan } from './positions';
import { isFilled } from './row-kind';

/** What a line above a table says of one of its columns. */
interface ColumnNote {
  text: string;
  unit: string | null;
  cell: string;
}

const AGE_WORDS =
  /(?:in|\()\s*((?:thousands? of |millions? of )?(?:years?|k?yrs?|ka|Ma)(?:\s+(?:BP|b2k|CE|AD|before\s+(?:the\s+)?(?:year\s+)?(?:\d{4}(?:\s+(?:CE|AD))?|present)))?)/i;

/**
 * Gives headings the units that lines above the table state: "Ca : concentration of Ca++ ions in (ng/g)" under the
 * column's own name, or "Column 2: EDC3 age (kyr BP)" in the order of the columns, when there are as many lines as
 * columns. A unit in the heading itself goes before; a heading that means nothing is read by its line instead.
 */
export function withColumnNotes(
  headings: ColumnHeading[],
  sheet: RawSheet,
  span: RowSpan,
  kind: DatasetKind,
): ColumnHeading[] {
  const { byName, inOrder } = notesAbove(sheet, span);
  const filled = headings.filter((heading) => heading.text !== '');
  const known = new Set(kind.fields.flatMap((field) => field.headings));
  const counted = inOrder.length === filled.length ? inOrder : [];
  return headings.map((heading) => {
    const note = byName.get(heading.text) ?? counted[filled.indexOf(heading)];
    if (!note) return heading;
    const unit = heading.unit ?? note.unit;
    const key = known.has(heading.key)
      ? heading.key
      : headingKey(note.text.replace(/\([^)]*\)/g, ' ')) || heading.key;
    return { ...heading, unit, key };
  });
}

function notesAbove(
  sheet: RawSheet,
  span: RowSpan,
): { byName: Map<string, ColumnNote>; inOrder: ColumnNote[] } {
  const byName = new Map<string, ColumnNote>();
  const inOrder: ColumnNote[] = [];
  for (let r = span.from - 1; r < Math.min(span.before - 1, sheet.rows.length); r += 1) {
    const cells = (sheet.rows[r] ?? []).filter(isFilled);
    if (cells.length === 0 || cells.length > 60) continue;
    const text = cells.map((cell) => cell.text.trim()).join(' ');
    const found = /^#?\s*(Column\s+\d{1,3}|[^:]{1,40}?)\s*:\s*(\S.*)$/u.exec(text);
    if (!found) continue;
    const [, name = '', said = ''] = found;
    const note = { text: said, unit: unitIn(said), cell: cellAddress(0, r + 1) };
    if (/^Column\s+\d/i.test(name)) inOrder.push(note);
    else byName.set(name.trim(), note);
  }
  return { byName, inOrder };
}

function unitIn(text: string): string | null {
  const brackets = [...text.matchAll(/\(([^()]{1,40})\)|\[([^\]]{1,40})\]/g)].map((found) =>
    (found[1] ?? found[2] ?? '').trim(),
  );
  const unit = brackets.find((inner) => looksLikeUnit(inner) || isDatedAge(inner));
  if (unit !== undefined) return unit;
  const age = AGE_WORDS.exec(text)?.[1];
  if (age !== undefined) return age.trim();
  return /(?<!\p{L})per\s?mil(?:le)?(?!\p{L})|‰/iu.exec(text)?.[0] ?? null;
}

const isDatedAge = (text: string): boolean => {
  const age = parseAgeUnit(text);
  return !isUnitProblem(age) && age.datum !== null;
};
