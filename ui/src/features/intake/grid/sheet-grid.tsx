import { defaultRangeExtractor, useVirtualizer } from '@tanstack/react-virtual';
import { useCallback, useEffect, useRef, useState } from 'react';
import type { EditorMove } from './cell-editor';
import type { GridCommand } from './grid-command';
import { GridHead } from './grid-head';
import { cellId, HEAD_PX, ROW_HEAD_PX, ROW_PX, textOf, type GridModel } from './grid-model';
import { GridRowView } from './grid-row';
import { PinnedBox } from './pinned-box';
import { rangeOf, rowsOf, type Cursor } from './move';
import { gridKeys } from './grid-keys';

type Props = GridModel & {
  cursor: Cursor;
  onCursor: (cursor: Cursor) => void;
  command: GridCommand | null;
};

/** The submission as it was sent, cell by cell: only rows and columns in sight are drawn. */
export function SheetGrid(props: Props) {
  const { label, columns, rowCount, cursor, onCursor, command, onSeen, kindOf, mayEdit } = props;
  const scroller = useRef<HTMLDivElement>(null);
  const grid = useRef<HTMLDivElement>(null);
  const [anchor, setAnchor] = useState<Cursor | null>(null);
  const [draft, setDraft] = useState<Draft | null>(null);
  const [proposed, setProposed] = useState<string | null>(null);
  const range = rangeOf(anchor ?? cursor, cursor);

  const rows = useVirtualizer({
    count: rowCount,
    getScrollElement: () => scroller.current,
    estimateSize: () => ROW_PX,
    overscan: 6,
    scrollMargin: HEAD_PX,
    scrollPaddingStart: HEAD_PX,
    rangeExtractor: (seen) =>
      withKept(defaultRangeExtractor(seen), [cursor.row - 1, (draft ?? cursor).row - 1]),
  });
  const across = useVirtualizer({
    horizontal: true,
    count: columns.length,
    getScrollElement: () => scroller.current,
    estimateSize: (index) => columns[index]?.widthPx ?? 96,
    overscan: 3,
    scrollMargin: ROW_HEAD_PX,
    scrollPaddingStart: ROW_HEAD_PX,
    rangeExtractor: (seen) =>
      withKept(defaultRangeExtractor(seen), [cursor.columnAt, (draft ?? cursor).columnAt]),
  });
  useEffect(() => across.measure(), [across, columns]);

  const shown = rows.getVirtualItems();
  const firstRow = (rows.range?.startIndex ?? 0) + 1;
  const lastRow = (rows.range?.endIndex ?? 0) + 1;
  useEffect(() => onSeen(firstRow, lastRow), [onSeen, firstRow, lastRow]);

  const reveal = useCallback(
    (to: Cursor) => {
      rows.scrollToIndex(to.row - 1, { align: 'auto' });
      across.scrollToIndex(to.columnAt, { align: 'auto' });
    },
    [rows, across],
  );
  const goTo = (to: Cursor, extend: boolean) => {
    setAnchor(extend ? (anchor ?? cursor) : null);
    onCursor(to);
    reveal(to);
  };
  const isOpen = mayEdit && kindOf(cursor.row) === 'data' && props.rowAt(cursor.row) !== undefined;
  const edit = (text: string | null) =>
    setDraft(isOpen && text !== null ? { ...cursor, text, tentative: false } : null);

  useEffect(() => {
    if (!command) return;
    setAnchor(null);
    reveal(cursor);
    grid.current?.focus({ preventScroll: true });
    setProposed(command.edit);
    // A command is carried out once, at the cell that it came with.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [command]);
  useEffect(() => {
    if (proposed === null || !isOpen) return; // the row may still be on its way
    setDraft({ ...cursor, text: proposed, tentative: true });
    setProposed(null);
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [proposed, isOpen]);

  const done = (text: string | null, move: EditorMove) => {
    if (!draft) return;
    setDraft(null);
    const { row, columnAt } = draft;
    const column = columns[columnAt]?.letter;
    if (text !== null && column && text !== textOf(props.rowAt(row), column))
      props.onMend([{ row, column, text }]);
    if (move === 'away') return;
    grid.current?.focus({ preventScroll: true });
    if (move === 'down') goTo({ columnAt, row: Math.min(rowCount, row + 1) }, false);
    if (move === 'right') goTo({ row, columnAt: Math.min(columns.length - 1, columnAt + 1) }, false);
  };

  const height = scroller.current?.clientHeight ?? 0;
  const pageRows = Math.max(1, Math.floor((height - HEAD_PX) / ROW_PX) - 1);
  const keys = gridKeys({ ...props, range, pageRows, goTo, edit });
  const widthPx = ROW_HEAD_PX + columns.reduce((sum, column) => sum + column.widthPx, 0);
  const letter = columns[cursor.columnAt]?.letter;
  const textAtCursor = () => (letter ? textOf(props.rowAt(cursor.row), letter) : '');
  return (
    <div ref={scroller} className="sheet-scroll">
      <div
        ref={grid}
        role="grid"
        aria-label={label}
        aria-rowcount={rowCount + 1}
        aria-colcount={columns.length + 1}
        aria-multiselectable
        aria-readonly={!mayEdit}
        aria-activedescendant={letter && draft === null ? cellId(letter, cursor.row) : undefined}
        tabIndex={0}
        className="sheet-grid"
        style={{ width: widthPx }}
        {...(draft === null ? keys : {})}
      >
        <GridHead columns={columns} items={across.getVirtualItems()} widthPx={widthPx} />
        <div role="rowgroup" className="grid-body" style={{ height: rowCount * ROW_PX }}>
          {shown.map(({ index, start }) => (
            <GridRowView
              key={index}
              {...props}
              row={index + 1}
              top={start - HEAD_PX}
              widthPx={widthPx}
              items={across.getVirtualItems()}
              range={range}
              draft={draft}
              onPick={(row, columnAt, extend) => goTo({ row, columnAt }, extend)}
              onEdit={() => edit(textAtCursor())}
              onDone={done}
              onPickRow={(row, target) => {
                const inside = row >= range.top && row <= range.bottom;
                if (!inside) goTo({ ...cursor, row }, false);
                props.onRowMenu(inside ? rowsOf(range) : [row], target);
              }}
            />
          ))}
        </div>
      </div>
      {props.popover && (
        <PinnedBox
          {...props.popover}
          columns={columns}
          rowCount={rowCount}
          scrollerWidthPx={scroller.current?.clientWidth ?? 390}
        />
      )}
    </div>
  );
}

type Draft = Cursor & { text: string; tentative: boolean };

/** The picked cell and the one being typed in stay drawn, wherever the sheet is scrolled to. */
const withKept = (inSight: number[], kept: number[]) =>
  [...new Set([...inSight, ...kept])].filter((index) => index >= 0).sort((a, b) => a - b);
