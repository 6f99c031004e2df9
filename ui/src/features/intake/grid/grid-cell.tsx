import { ArrowUndo16Regular, Comment16Filled } from '@fluentui/react-icons';
import { memo } from 'react';
import { formatNumber } from '../../../shared/number/format';
import { CellEditor, type EditorMove } from './cell-editor';
import type { GridColumn } from './columns';
import { cellId, type GridRow } from './grid-model';
import type { CellMark } from './marks';

type Cell = GridRow['cells'][string];

export type GridCellProps = {
  row: number;
  column: GridColumn;
  at: number;
  left: number;
  cell: Cell | undefined;
  isData: boolean;
  mark: CellMark | undefined;
  correctionId: string | undefined;
  hasQuery: boolean;
  unsent: string | undefined;
  isCursor: boolean;
  inRange: boolean;
  /** text in the editor, null while the cell is only shown */
  draft: string | null;
  /** the text was proposed, not typed */
  tentative: boolean;
  mayEdit: boolean;
  onPick: (row: number, at: number, extend: boolean) => void;
  onEdit: () => void;
  onDone: (text: string | null, move: EditorMove) => void;
  onUndo: (correctionId: string) => void;
  onOpenQuery: (column: string, row: number) => void;
};

/** Raw text, the canonical value under it, and in the corner the worst finding. */
export const GridCell = memo(function GridCell(props: GridCellProps) {
  const { row, column, at, left, cell, isData, mark, isCursor, inRange, draft } = props;
  const classes = ['grid-cell', column.numeric && isData && 'right', mark && `mark-${mark.worst}`];
  return (
    <div
      role="gridcell"
      id={cellId(column.letter, row)}
      aria-colindex={at + 2}
      aria-selected={isCursor || inRange}
      aria-readonly={!props.mayEdit || !isData}
      className={[...classes, isCursor && 'cursor', inRange && 'in-range'].filter(Boolean).join(' ')}
      style={{ left, width: column.widthPx }}
      onMouseDown={(event) => event.button === 0 && props.onPick(row, at, event.shiftKey)}
      onDoubleClick={props.onEdit}
    >
      {draft === null ? <CellContent {...props} cell={cell} /> : <CellEditor {...props} start={draft} />}
    </div>
  );
});

function CellContent(props: GridCellProps) {
  const { cell, isData, mark, column, row, correctionId, hasQuery, unsent, mayEdit } = props;
  const mended = cell?.mended !== undefined;
  const text = unsent ?? cell?.mended ?? cell?.text ?? '';
  return (
    <>
      {mark && <i className={`corner ${mark.worst}`} aria-hidden="true" />}
      {hasQuery && (
        <button
          type="button"
          tabIndex={-1}
          className="cell-sign query-sign"
          aria-label={`Query on ${column.letter}${row}`}
          onClick={() => props.onOpenQuery(column.letter, row)}
        >
          <Comment16Filled />
        </button>
      )}
      {mended && mayEdit && correctionId !== undefined && !hasQuery && (
        <button
          type="button"
          tabIndex={-1}
          className="cell-sign undo-sign"
          aria-label={`Undo the mend of ${column.letter}${row}, was ${cell.text || 'empty'}`}
          onClick={() => props.onUndo(correctionId)}
        >
          <ArrowUndo16Regular />
        </button>
      )}
      <span
        className={rawClass(mended, unsent !== undefined)}
        title={mended ? `was “${cell.text}”` : undefined}
      >
        {text || (isData && column.title !== null && <em>empty</em>)}
      </span>
      {isData && column.title !== null && <Normalised cell={cell} numeric={column.numeric} />}
      {mark && <span className="sl-hidden">{`${mark.worst}: ${mark.messages[0]}`}</span>}
    </>
  );
}

const rawClass = (mended: boolean, unsent: boolean) =>
  ['raw', mended && 'mended', unsent && 'unsent'].filter(Boolean).join(' ');

function Normalised({ cell, numeric }: { cell: Cell | undefined; numeric: boolean }) {
  if (cell?.problem) return <span className="norm bad">{cell.problem}</span>;
  const value = cell?.value;
  if (value === null || value === undefined)
    return <span className="norm">{cell?.text ? 'no value' : '–'}</span>;
  return <span className="norm">{shownValue(value, numeric)}</span>;
}

/** Four figures say enough under a raw cell; the whole number stands in the line beneath the grid. */
export function shownValue(value: string | number, numeric: boolean): string {
  if (typeof value !== 'number') return value;
  if (!numeric) return formatNumber(value, { decimals: decimalsOf(value) });
  if (Math.abs(value) < 1e-4 && value !== 0) return value.toExponential(2).replace(/-/g, '\u2212');
  const short = Number(value.toPrecision(Math.abs(value) >= 1000 ? 6 : 4));
  return formatNumber(short, { decimals: decimalsOf(short) });
}

const decimalsOf = (value: number) =>
  Math.min(8, String(value).split('.')[1]?.replace(/e.*$/, '').length ?? 0);
