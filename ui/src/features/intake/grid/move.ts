export type Cursor = { row: number; columnAt: number };
type Bounds = { rowCount: number; columnCount: number; pageRows: number };
type Pressed = { key: string; ctrlKey: boolean; metaKey: boolean };

const clamp = (value: number, low: number, high: number) => Math.min(high, Math.max(low, value));

/** Where a key leads from a cell, as in any spreadsheet; null when the key moves nothing. Rows count from 1. */
export function moveCursor(
  { row, columnAt }: Cursor,
  { key, ctrlKey, metaKey }: Pressed,
  { rowCount, columnCount, pageRows }: Bounds,
): Cursor | null {
  const far = ctrlKey || metaKey;
  const to = (nextRow: number, nextColumn: number) => ({
    row: clamp(nextRow, 1, Math.max(1, rowCount)),
    columnAt: clamp(nextColumn, 0, Math.max(0, columnCount - 1)),
  });
  switch (key) {
    case 'ArrowUp':
      return to(far ? 1 : row - 1, columnAt);
    case 'ArrowDown':
      return to(far ? rowCount : row + 1, columnAt);
    case 'ArrowLeft':
      return to(row, far ? 0 : columnAt - 1);
    case 'ArrowRight':
      return to(row, far ? columnCount - 1 : columnAt + 1);
    case 'PageUp':
      return to(row - pageRows, columnAt);
    case 'PageDown':
      return to(row + pageRows, columnAt);
    case 'Home':
      return to(far ? 1 : row, 0);
    case 'End':
      return to(far ? rowCount : row, columnCount - 1);
    default:
      return null;
  }
}

export type Range = { top: number; bottom: number; left: number; right: number };

/** The rectangle between where a selection began and where it stands. */
export const rangeOf = (anchor: Cursor, cursor: Cursor): Range => ({
  top: Math.min(anchor.row, cursor.row),
  bottom: Math.max(anchor.row, cursor.row),
  left: Math.min(anchor.columnAt, cursor.columnAt),
  right: Math.max(anchor.columnAt, cursor.columnAt),
});

export const isInRange = (range: Range, row: number, columnAt: number) =>
  row >= range.top && row <= range.bottom && columnAt >= range.left && columnAt <= range.right;

export const rowsOf = ({ top, bottom }: Range) =>
  Array.from({ length: bottom - top + 1 }, (_, index) => top + index);
