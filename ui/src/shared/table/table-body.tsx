import { useVirtualizer } from '@tanstack/react-virtual';
import { useEffect, type KeyboardEvent } from 'react';
import { Digits } from '../number/digits';
import type { DataColumn } from './column';

const VIRTUAL_FROM = 200; // fewer rows are all drawn: the page can then be searched and printed whole

type Props<Row extends object> = {
  columns: readonly DataColumn<Row>[];
  all: readonly Row[];
  rowKey: (row: Row) => string;
  pinned?: readonly Row[];
  roomy?: boolean;
  heightPx?: number;
  selectedKey?: string | null;
  onSelect?: (row: Row) => void;
  onHover?: (row: Row | null) => void;
  scroller: HTMLDivElement | null;
};

/** Rows in sight, with the places of all others kept, so that counts and scroll stay true. */
export function TableBody<Row extends object>(props: Props<Row>) {
  const { all, columns, rowKey, roomy, heightPx, selectedKey, scroller } = props;
  const virtual = heightPx !== undefined && all.length > VIRTUAL_FROM;
  const rows = useVirtualizer({
    count: virtual ? all.length : 0,
    enabled: virtual, // otherwise it takes hold of the box late, and puts it back to its top
    getScrollElement: () => scroller,
    estimateSize: () => (roomy ? 37 : 25),
    overscan: 12,
  });
  const at = selectedKey ? all.findIndex((row) => rowKey(row) === selectedKey) : -1;
  useEffect(() => {
    if (at < 0) return;
    if (virtual) rows.scrollToIndex(at, { align: 'auto' });
    else if (heightPx) scrollRowIntoView(scroller, at);
    // Only a new selection scrolls, never a re-sort under the pointer.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [selectedKey, scroller]);
  if (!virtual) {
    return (
      <tbody>
        {all.map((row, index) => (
          <TableRow key={rowKey(row)} {...props} row={row} index={index} />
        ))}
      </tbody>
    );
  }
  const items = rows.getVirtualItems();
  return (
    <tbody>
      <Gap heightPx={items[0]?.start ?? 0} span={columns.length} />
      {items.map(({ index }) => (
        <TableRow key={rowKey(all[index]!)} {...props} row={all[index]!} index={index} />
      ))}
      <Gap heightPx={rows.getTotalSize() - (items.at(-1)?.end ?? 0)} span={columns.length} />
    </tbody>
  );
}

const Gap = ({ heightPx, span }: { heightPx: number; span: number }) =>
  heightPx > 0 ? (
    <tr aria-hidden="true">
      <td className="gap" colSpan={span} style={{ height: heightPx }} />
    </tr>
  ) : null;

function TableRow<Row extends object>({
  row,
  index,
  columns,
  rowKey,
  pinned,
  selectedKey,
  onSelect,
  onHover,
}: Props<Row> & { row: Row; index: number }) {
  const total = pinned?.includes(row);
  const pickable = onSelect && !total;
  const keys = (event: KeyboardEvent<HTMLTableRowElement>) => {
    if (event.target !== event.currentTarget) return;
    const step = { ArrowDown: 'nextElementSibling', ArrowUp: 'previousElementSibling' } as const;
    const way = step[event.key as keyof typeof step];
    if (way) {
      event.preventDefault();
      (event.currentTarget[way] as HTMLElement | null)?.focus();
    } else if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      onSelect?.(row);
    }
  };
  return (
    <tr
      aria-rowindex={index + 2}
      aria-selected={pickable ? rowKey(row) === selectedKey : undefined}
      className={total ? 'total' : pickable ? 'pick' : undefined}
      tabIndex={pickable ? 0 : undefined}
      onClick={pickable ? () => onSelect(row) : undefined}
      onKeyDown={pickable ? keys : undefined}
      onFocus={onHover && (() => onHover(row))}
      onPointerEnter={onHover && (() => onHover(row))}
      onPointerLeave={onHover && (() => onHover(null))}
    >
      {columns.map((column) => (
        <td key={column.id} className={column.align}>
          {column.cell ? column.cell(row) : shownValue(column.value(row))}
        </td>
      ))}
    </tr>
  );
}

const shownValue = (value: string | number | null | undefined) =>
  typeof value === 'number' ? <Digits value={value} /> : value || <span className="sl-muted">–</span>;

function scrollRowIntoView(box: HTMLElement | null, index: number): void {
  const row = box?.querySelectorAll<HTMLElement>('tbody tr')[index];
  if (!box || !row) return;
  const head = box.querySelector('thead')?.offsetHeight ?? 0;
  if (row.offsetTop - head < box.scrollTop) box.scrollTop = row.offsetTop - head;
  else if (row.offsetTop + row.offsetHeight > box.scrollTop + box.clientHeight) {
    box.scrollTop = row.offsetTop + row.offsetHeight - box.clientHeight;
  }
}
