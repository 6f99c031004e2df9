import type { DatasetKind } from '../dataset/field';
import type { Claim } from './claim';
import type { FoundTable } from './find-tables';
import { cellAddress, type RawSheet } from './grid';
import type { TableConstant } from './mapping';
import { constantsAbove, type RowSpan } from './positions';
import { isFilled, textOf } from './row-kind';

/** Columns of one of several tables that stand side by side, zero-based, both ends included. */
export interface ColumnBlock {
  first: number;
  last: number;
}

/** A block that is a site of its own. */
export interface SiteBlock extends ColumnBlock {
  constants: TableConstant[];
}

/** Words by which blocks are told to be versions of one table, not sites. */
const VERSION =
  /revis|correct|version|age (?:scale|model)|time ?scale|(?<!\p{L})(?:old|new|alt|neu)(?!\p{L})|EDC\d|GICC|AICC|SS\d\d/iu;

/** Parts of a table parted by empty columns, or by the heading of its first column coming again. */
export function columnBlocks(claims: Claim[]): Claim[][] {
  const blocks: Claim[][] = [[]];
  for (const claim of claims) {
    const block = blocks.at(-1)!;
    const isEmpty = claim.heading.text === '' && claim.heading.unit === null;
    const begins = block.length > 1 && claim.heading.text === block[0]!.heading.text;
    if (isEmpty || begins) blocks.push([]);
    if (!isEmpty) blocks.at(-1)!.push(claim);
  }
  return blocks.filter((block) => block.length > 0);
}

/** A header row with one text over each block is their titles: the rows without it, or null. */
export function withoutTitles(sheet: RawSheet, found: FoundTable): FoundTable | null {
  const [title, ...rest] = found.headerRows;
  if (title === undefined || rest.filter((row) => row !== found.unitsRow).length === 0) return null;
  const over = (sheet.rows[title - 1] ?? []).filter(isFilled).length;
  const under = (sheet.rows[(rest[0] ?? title) - 1] ?? []).filter(isFilled).length;
  return over >= 2 && over * 2 <= under ? { ...found, headerRows: rest } : null;
}

/**
 * The sites of a table whose blocks stand side by side: each block has an age of its own, and above it a position or
 * name that the others have not. Null when the blocks are versions of one table, or there is only one.
 */
export function siteBlocks(
  claims: Claim[],
  sheet: RawSheet,
  span: RowSpan,
  kind: DatasetKind,
): SiteBlock[] | null {
  const aged = columnBlocks(claims).filter((block) => block.some(({ field }) => field === 'ageKaBp'));
  if (aged.length < 2) return null;
  const blocks = aged.map((block): SiteBlock => {
    const columns = { first: block[0]!.heading.index, last: block.at(-1)!.heading.index };
    return { ...columns, constants: ownConstants(sheet, columns, span, kind) };
  });
  const names = blocks.map(({ constants }) =>
    constants
      .filter(({ field }) => ['site', 'latitudeDeg', 'longitudeDeg'].includes(field))
      .map(({ text }) => text)
      .join(' '),
  );
  const areSites =
    names.every((name) => name !== '' && !VERSION.test(name)) && new Set(names).size === names.length;
  return areSites ? blocks : null;
}

/** What stands above a block in its own columns: labels with values, a position in text, and its title. */
function ownConstants(
  sheet: RawSheet,
  block: ColumnBlock,
  span: RowSpan,
  kind: DatasetKind,
): TableConstant[] {
  const rows = sheet.rows
    .slice(0, span.before - 1)
    .map((row) => row.map((cell, c) => (c >= block.first && c <= block.last ? cell : null)));
  const stated = constantsAbove({ ...sheet, rows }, span, kind);
  if (stated.some(({ field }) => field === 'site')) return stated;
  const title = titleNearest({ ...sheet, rows }, span, stated);
  return title ? [...stated, title] : stated;
}

/** The text nearest above the block that gives nothing else: its beginning up to a bracket, comma or colon. */
function titleNearest(sheet: RawSheet, span: RowSpan, stated: TableConstant[]): TableConstant | null {
  for (let r = span.before - 2; r >= span.from - 1; r -= 1) {
    const row = sheet.rows[r] ?? [];
    const c = row.findIndex(isFilled);
    if (c < 0 || row.filter(isFilled).length > 1) continue;
    const text = textOf(row[c]).trim();
    const name = text.split(/[,:;(|]/)[0]?.trim() ?? '';
    if (name === '' || name.length > 40 || /^\d/.test(name) || stated.some((one) => one.text === name))
      continue;
    const cell = cellAddress(c, r + 1);
    const reason = 'The title over its block of columns; change it if the site has another name.';
    return { sheet: sheet.name, field: 'site', text: name, unit: null, cell, reason };
  }
  return null;
}

/** The claims of one block; those of the others belong to their own table. */
export function claimsOfBlock(claims: Claim[], block: ColumnBlock): Claim[] {
  return claims.map((claim) =>
    claim.heading.index >= block.first && claim.heading.index <= block.last
      ? claim
      : { ...claim, field: null, reason: 'It belongs to the table beside this one.' },
  );
}
