import type { ClipboardEvent, KeyboardEvent } from 'react';
import { blockText, parseBlock, placeBlock } from './block';
import { cellId, textOf, type GridModel } from './grid-model';
import { moveCursor, rowsOf, type Cursor, type Range } from './move';

type Keys = GridModel & {
  cursor: Cursor;
  range: Range;
  pageRows: number;
  goTo: (cursor: Cursor, extend: boolean) => void;
  edit: (text: string | null) => void;
};

const isTyped = ({ key, ctrlKey, metaKey, altKey }: KeyboardEvent) =>
  key.length === 1 && !ctrlKey && !metaKey && !altKey && key !== '[' && key !== ']';

/** What the keyboard and the clipboard do in the grid. */
export function gridKeys(grid: Keys) {
  const { cursor, range, columns, rowAt, kindOf, mayEdit } = grid;
  const letter = columns[cursor.columnAt]?.letter ?? 'A';
  const takes = (row: number) => mayEdit && kindOf(row) === 'data';

  const clear = () => {
    const cells = rowsOf(range)
      .filter(takes)
      .flatMap((row) =>
        columns.slice(range.left, range.right + 1).map((column) => ({ row, column: column.letter })),
      )
      .filter(({ row, column }) => textOf(rowAt(row), column) !== '');
    if (cells.length > 0) grid.onMend(cells.map((cell) => ({ ...cell, text: '' })));
  };

  const act = (event: KeyboardEvent): boolean => {
    const mended = grid.mendAt(letter, cursor.row);
    if (event.key === 'ContextMenu' || (event.key === 'F10' && event.shiftKey)) {
      const target = document.getElementById(cellId(letter, cursor.row));
      if (target) grid.onRowMenu(rowsOf(range), target);
    } else if ((event.ctrlKey || event.metaKey) && event.key === 'z' && mended !== undefined)
      grid.onUndo(mended);
    else if (!takes(cursor.row)) return false;
    else if (event.key === 'F2' || event.key === 'Enter') grid.edit(textOf(rowAt(cursor.row), letter));
    else if (event.key === 'Delete' || event.key === 'Backspace') clear();
    else if (isTyped(event)) grid.edit(event.key);
    else return false;
    return true;
  };

  return {
    onKeyDown: (event: KeyboardEvent) => {
      if (event.ctrlKey && event.key === 'Enter') return; // the decision bar's
      const bounds = { rowCount: grid.rowCount, columnCount: columns.length, pageRows: grid.pageRows };
      const next = moveCursor(cursor, event, bounds);
      if (next) grid.goTo(next, event.shiftKey);
      else if (!act(event)) return;
      event.preventDefault();
      event.stopPropagation();
    },
    onPaste: (event: ClipboardEvent) => {
      if (!mayEdit) return;
      event.preventDefault();
      const { cells, outside } = placeBlock(parseBlock(event.clipboardData.getData('text/plain')), {
        row: cursor.row,
        columnAt: cursor.columnAt,
        letters: columns.map((column) => column.letter),
        takes,
        textAt: (row, column) => textOf(rowAt(row), column),
      });
      if (cells.length > 0) grid.onMend(cells);
      grid.onPasted(cells.length, outside);
    },
    onCopy: (event: ClipboardEvent) => {
      event.preventDefault();
      const picked = columns.slice(range.left, range.right + 1);
      const rows = rowsOf(range).map((row) => picked.map((column) => textOf(rowAt(row), column.letter)));
      event.clipboardData.setData('text/plain', blockText(rows));
    },
  };
}
