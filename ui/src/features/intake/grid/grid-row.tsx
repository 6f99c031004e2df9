import type { VirtualItem } from '@tanstack/react-virtual';
import type { Cursor, Range } from './move';
import { isInRange } from './move';
import { GridCell, type GridCellProps } from './grid-cell';
import { ROW_HEAD_PX, ROW_PX, type GridModel } from './grid-model';

type Props = GridModel &
  Pick<GridCellProps, 'onPick' | 'onDone'> & {
    row: number;
    top: number;
    widthPx: number;
    items: VirtualItem[];
    cursor: Cursor;
    range: Range;
    draft: (Cursor & { text: string; tentative: boolean }) | null;
    onEdit: () => void;
    onPickRow: (row: number, target: HTMLElement) => void;
  };

const kindTitles = { data: undefined, heading: 'Heading', units: 'Units', other: 'Not data' } as const;

/** One row of the sheet; what is not data is greyed, what is left out is struck with its reason. */
export function GridRowView(props: Props) {
  const { row, top, widthPx, items, columns, cursor, range, rowAt, kindOf } = props;
  const kind = kindOf(row);
  const leftOut = props.leftOutAt(row);
  const cells = rowAt(row);
  const isData = kind === 'data';
  return (
    <div
      role="row"
      aria-rowindex={row + 1}
      className={['grid-row', kind, leftOut !== null && 'left-out'].filter(Boolean).join(' ')}
      style={{ transform: `translateY(${top}px)`, width: widthPx, height: ROW_PX }}
    >
      <div role="rowheader" aria-colindex={1} className="row-head" style={{ width: ROW_HEAD_PX }}>
        <button
          type="button"
          tabIndex={-1}
          aria-label={`Row ${row}${leftOut === null ? '' : `, left out: ${leftOut}`}: choices`}
          title={leftOut === null ? kindTitles[kind] : `Left out: ${leftOut}`}
          onClick={(event) => props.onPickRow(row, event.currentTarget)}
        >
          {row}
        </button>
      </div>
      {items.map(({ index, start }) => {
        const column = columns[index]!;
        const isCursor = cursor.row === row && cursor.columnAt === index;
        return (
          <GridCell
            key={index}
            row={row}
            column={column}
            at={index}
            left={start}
            cell={cells?.cells[column.letter]}
            isData={isData}
            mark={leftOut === null ? props.markAt(column.letter, row) : undefined}
            correctionId={props.mendAt(column.letter, row)}
            hasQuery={props.queryAt(column.letter, row)}
            unsent={props.unsentAt(column.letter, row)}
            isCursor={isCursor}
            inRange={!isCursor && isInRange(range, row, index)}
            draft={props.draft?.row === row && props.draft.columnAt === index ? props.draft.text : null}
            tentative={props.draft?.tentative ?? false}
            mayEdit={props.mayEdit}
            onPick={props.onPick}
            onEdit={props.onEdit}
            onDone={props.onDone}
            onUndo={props.onUndo}
            onOpenQuery={props.onOpenQuery}
          />
        );
      })}
      {leftOut !== null && <span className="left-out-reason">left out: {leftOut}</span>}
    </div>
  );
}
