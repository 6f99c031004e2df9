import { columnLetter } from '@siltlight/common/sheet/grid';
import { useCallback, useMemo, useState } from 'react';
import { ErrorState } from '../../shared/feedback/error-state';
import { useSay } from '../../shared/feedback/toasts';
import { useNarrow } from '../../shared/theme/colour-mode';
import { CellLine } from './cell-line';
import { undoCorrection, type Mapping } from './changes';
import { gridColumns } from './grid/columns';
import { cellMarks } from './grid/marks';
import { SheetGrid } from './grid/sheet-grid';
import { useGridRows } from './grid/use-grid-rows';
import { keyOf, rowKindOf } from './places';
import { QueryBox } from './query-box';
import { RowMenu, type RowMenuAt } from './row-menu';
import type { Bench } from './use-bench';

/** The grid of one sheet with the line of its picked cell; `tables` are those being edited beside it. */
export function BenchGrid({ bench, tables }: { bench: Bench; tables: Mapping['tables'] }) {
  const { detail, place, items, changing, mends, queryAt, openQuery, pick } = bench;
  const narrow = useNarrow();
  const say = useSay();
  const [menu, setMenu] = useState<RowMenuAt | null>(null);
  const { sheet } = place;
  const size = detail.workbook.sheets.find(({ name }) => name === sheet);
  const { rowAt, onSeen, error, refetch } = useGridRows(detail.id, sheet);

  const columns = useMemo(() => {
    const letters = Array.from({ length: size?.columnCount ?? 0 }, (_, index) => columnLetter(index));
    return gridColumns(detail, sheet, letters, narrow);
  }, [detail, sheet, size?.columnCount, narrow]);
  const marks = useMemo(() => cellMarks(items), [items]);
  const corrections = useMemo(
    () => new Map(detail.corrections.map((one) => [keyOf(one.sheet, one.column, one.row), one.id])),
    [detail.corrections],
  );
  const queries = useMemo(
    () => new Set(detail.queries.map((one) => keyOf(one.sheet, one.column, one.row))),
    [detail.queries],
  );
  const leftOut = useMemo(
    () => new Map(detail.leftOut.filter((one) => one.sheet === sheet).map((one) => [one.row, one.reason])),
    [detail.leftOut, sheet],
  );
  const kindOf = useCallback((row: number) => rowKindOf(tables, sheet, row), [tables, sheet]);
  const openMenu = useCallback((rows: number[], target: HTMLElement) => setMenu({ rows, target }), []);
  const at = Math.max(
    0,
    columns.findIndex(({ letter }) => letter === place.column),
  );

  if (error) return <ErrorState error={error} kept="Nothing you did is lost." retry={() => void refetch()} />;
  if (!size || size.rowCount === 0) return <p className="bench-empty">This sheet is empty.</p>;
  const pinned = queryAt && queryAt.sheet === sheet ? queryAt : null;
  return (
    <div className="bench-grid">
      <SheetGrid
        key={sheet}
        label={`Cells of ${sheet}`}
        columns={columns}
        rowCount={size.rowCount}
        rowAt={rowAt}
        kindOf={kindOf}
        leftOutAt={(row) => leftOut.get(row) ?? null}
        markAt={(column, row) => marks.get(keyOf(sheet, column, row))}
        mendAt={(column, row) => corrections.get(keyOf(sheet, column, row))}
        queryAt={(column, row) => queries.has(keyOf(sheet, column, row))}
        unsentAt={(column, row) => mends.unsent.get(keyOf(sheet, column, row))}
        mayEdit={detail.rights.mayEdit}
        onMend={(cells) => void mends.send(cells.map((cell) => ({ ...cell, sheet })))}
        onUndo={(id) => void changing.change(undoCorrection(id))}
        onOpenQuery={(column, row) => openQuery({ sheet, column, row })}
        onRowMenu={openMenu}
        onSeen={onSeen}
        onPasted={(taken, outside) => sayPasted(say, taken, outside)}
        popover={
          pinned && {
            ...pinned,
            content: <QueryBox key={keyOf(sheet, pinned.column, pinned.row)} bench={bench} place={pinned} />,
          }
        }
        cursor={{ row: Math.min(place.row, size.rowCount), columnAt: at }}
        onCursor={({ row, columnAt }) => pick({ sheet, row, column: columns[columnAt]?.letter ?? 'A' })}
        command={bench.command}
      />
      <CellLine
        bench={bench}
        row={rowAt(place.row)}
        kind={kindOf(place.row)}
        mark={marks.get(keyOf(sheet, place.column, place.row))}
        onRowMenu={openMenu}
      />
      {menu && <RowMenu bench={bench} at={menu} onClose={() => setMenu(null)} />}
    </div>
  );
}

function sayPasted(say: ReturnType<typeof useSay>, taken: number, outside: number): void {
  if (outside > 0)
    say(
      `${outside} pasted cells fall outside the data`,
      'They were not taken. Headings and notes are corrected in the mapping.',
      'warning',
    );
  if (taken === 0 && outside === 0)
    say('Nothing changed', 'The pasted cells say what stands there already.', 'info');
}
