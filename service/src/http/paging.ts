import type { Page } from '@siltlight/common/wire/shared';
import { type Problem, problem } from './problem';

export interface PageSource<Row, Item> {
  /** reads up to `count` rows in a stable order, beginning after the row with the sort key `after` */
  fetch: (count: number, after: string | undefined) => Promise<Row[]>;
  count: () => Promise<number>;
  /** the sort key: unique, or made unique with the id */
  keyOf: (row: Row) => string;
  toItem: (row: Row) => Item;
}

/** One page of a list; the query is `pageQuery` of common/wire/shared with the list's own filters. */
export async function pageOf<Row, Item>(
  query: { limit: number; cursor?: string | undefined },
  { fetch, count, keyOf, toItem }: PageSource<Row, Item>,
): Promise<Page<Item>> {
  const after = query.cursor === undefined ? undefined : readCursor(query.cursor);
  // One row more than asked for tells whether anything follows.
  const [rows, total] = await Promise.all([fetch(query.limit + 1, after), count()]);
  const shown = rows.slice(0, query.limit);
  const last = shown.at(-1);
  const nextCursor = rows.length > query.limit && last !== undefined ? writeCursor(keyOf(last)) : null;
  return { items: shown.map(toItem), nextCursor, total };
}

export function writeCursor(key: string): string {
  return Buffer.from(key, 'utf8').toString('base64url');
}

export function readCursor(cursor: string): string {
  const key = Buffer.from(cursor, 'base64url').toString('utf8');
  if (key === '' || writeCursor(key) !== cursor) throw unusable(cursor);
  return key;
}

/** For lists that are ordered by a whole number. */
export function numberOfCursor(key: string): number {
  if (!/^\d{1,15}$/.test(key)) throw unusable(writeCursor(key));
  return Number(key);
}

function unusable(cursor: string): Problem {
  return problem(
    422,
    'invalid-cursor',
    'The cursor cannot be used',
    'Take it from nextCursor of the page before.',
    [{ pointer: '?cursor', field: 'cursor', value: cursor, message: 'This is no cursor of this list.' }],
  );
}
