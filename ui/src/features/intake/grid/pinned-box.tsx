import type { ReactNode } from 'react';
import type { GridColumn } from './columns';
import { HEAD_PX, ROW_HEAD_PX, ROW_PX } from './grid-model';

type Props = {
  row: number;
  column: string;
  content: ReactNode;
  columns: readonly GridColumn[];
  rowCount: number;
  scrollerWidthPx: number;
};

const WIDTH_PX = 342;
const ROWS_TALL = 7;

/** A box whose point stands at its cell and which moves with the sheet; above the cell where the sheet ends. */
export function PinnedBox({ row, column, content, columns, rowCount, scrollerWidthPx }: Props) {
  const at = columns.findIndex(({ letter }) => letter === column);
  if (at < 0) return null;
  const left = columns.slice(0, at).reduce((sum, one) => sum + one.widthPx, ROW_HEAD_PX);
  const middle = left + columns[at]!.widthPx / 2;
  const width = Math.min(WIDTH_PX, scrollerWidthPx - 16);
  const boxLeft = Math.max(8, middle - width * 0.7);
  const above = row > rowCount - ROWS_TALL && row > ROWS_TALL;
  const top = HEAD_PX + (above ? row - 1 : row) * ROW_PX + (above ? -9 : 9);
  return (
    <div
      className={above ? 'pinned-box above' : 'pinned-box'}
      style={{ top, left: boxLeft, width, ['--point' as string]: `${middle - boxLeft - 6}px` }}
      onKeyDown={(event) => event.stopPropagation()}
      onPaste={(event) => event.stopPropagation()}
      onCopy={(event) => event.stopPropagation()}
    >
      {content}
    </div>
  );
}
