import { ArrowSortDown16Regular, ArrowSortUp16Regular } from '@fluentui/react-icons';
import type { DataColumn } from './column';
import type { TableView } from './use-table-address';

type Props<Row> = {
  columns: readonly DataColumn<Row>[];
  view: TableView;
  onChange: (view: TableView) => void;
};

/** First press sorts upwards, the second downwards, the third gives back the order of arrival. */
function nextSort(view: TableView, id: string): TableView {
  if (view.sort !== id) return { ...view, sort: id, descending: false };
  if (!view.descending) return { ...view, descending: true };
  return { ...view, sort: null, descending: false };
}

export function TableHead<Row>({ columns, view, onChange }: Props<Row>) {
  return (
    <thead>
      <tr aria-rowindex={1}>
        {columns.map((column) => (
          <th
            key={column.id}
            scope="col"
            className={column.align}
            style={column.widthPx ? { width: column.widthPx } : undefined}
            aria-sort={view.sort === column.id ? (view.descending ? 'descending' : 'ascending') : undefined}
          >
            {column.sortable === false ? (
              (column.heading ?? (column.header || <span className="sl-hidden">Acts</span>))
            ) : (
              <button type="button" onClick={() => onChange(nextSort(view, column.id))}>
                {view.sort === column.id &&
                  (view.descending ? (
                    <ArrowSortDown16Regular aria-hidden />
                  ) : (
                    <ArrowSortUp16Regular aria-hidden />
                  ))}
                {column.heading ?? column.header}
              </button>
            )}
          </th>
        ))}
      </tr>
    </thead>
  );
}
