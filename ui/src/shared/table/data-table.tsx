import { SearchBox } from '@fluentui/react-components';
import { useMemo, useState, type ReactNode } from 'react';
import { useNarrow } from '../theme/colour-mode';
import { counted } from '../number/format';
import type { DataColumn } from './column';
import { TableBody } from './table-body';
import { TableHead } from './table-head';
import { TableTools } from './table-tools';
import { useDataTable } from './use-data-table';
import { useTableView } from './use-table-address';
import './table.css';

export type DataTableProps<Row extends object> = {
  caption: string;
  /** Behind the caption: what is counted, in which unit. */
  sub?: ReactNode;
  columns: readonly DataColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  empty: ReactNode;
  /** Rows shown before all others, whatever the sorting (a global mean). */
  pinned?: readonly Row[];
  startSort?: string;
  startDescending?: boolean;
  /** Prefix under which sorting and filter stand in the address; without it they stay in the table. */
  address?: string;
  filterable?: boolean;
  /** The caption stands in a figure's head already. */
  bare?: boolean;
  roomy?: boolean;
  heightPx?: number;
  selectedKey?: string | null;
  onSelect?: (row: Row) => void;
  onHover?: (row: Row | null) => void;
  foot?: ReactNode;
};

/** The one table: sorted, filtered, copied and saved; long ones draw only the rows in sight. */
export function DataTable<Row extends object>(props: DataTableProps<Row>) {
  const { caption, sub, columns, rows, empty, address, bare, filterable, heightPx, foot, roomy } = props;
  const narrow = useNarrow();
  // Kept as state: the rows are drawn inside the box, and must be drawn again once it is there.
  const [scroller, setScroller] = useState<HTMLDivElement | null>(null);
  const [view, change] = useTableView(address, {
    sort: props.startSort ?? null,
    descending: props.startDescending ?? false,
    filter: '',
  });
  const shown = useMemo(
    () => (narrow ? columns.filter((column) => !column.wideOnly) : columns),
    [columns, narrow],
  );
  const sorted = useDataTable(rows, columns, view);
  const all = props.pinned ? [...props.pinned, ...sorted] : sorted;
  return (
    <section className="data-table" aria-label={caption}>
      {(!bare || filterable) && (
        <div className="data-table-bar">
          {!bare && <h3>{caption}</h3>}
          {sub && <span className="sl-small sl-muted">{sub}</span>}
          <span className="sl-grow" />
          {filterable && (
            <SearchBox
              size="small"
              aria-label={`Filter ${caption}`}
              placeholder="Filter"
              value={view.filter}
              onChange={(_, data) => change({ ...view, filter: data.value })}
            />
          )}
          {!bare && <TableTools title={caption} columns={columns} rows={all} />}
        </div>
      )}
      {rows.length === 0 ? (
        empty
      ) : (
        <div
          ref={setScroller}
          className="data-table-scroll"
          style={heightPx ? { maxHeight: heightPx } : undefined}
          tabIndex={heightPx ? 0 : undefined}
          role={heightPx ? 'region' : undefined}
          aria-label={heightPx ? `${caption}, rows` : undefined}
        >
          <table
            className={roomy ? 'sl-table roomy' : 'sl-table'}
            aria-label={caption}
            aria-rowcount={all.length + 1}
          >
            <TableHead columns={shown} view={view} onChange={change} />
            <TableBody {...props} columns={shown} all={all} scroller={scroller} />
          </table>
        </div>
      )}
      {rows.length > 0 && sorted.length === 0 && (
        <p className="data-table-foot">No row holds “{view.filter}”.</p>
      )}
      {foot && <p className="data-table-foot">{foot}</p>}
      <span className="sl-hidden" role="status">
        {view.filter && `${counted(sorted.length, 'row')} of ${rows.length}`}
      </span>
    </section>
  );
}
