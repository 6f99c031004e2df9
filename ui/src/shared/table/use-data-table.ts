import {
  columnFilteringFeature,
  createFilteredRowModel,
  createSortedRowModel,
  globalFilteringFeature,
  rowSortingFeature,
  tableFeatures,
  useTable,
  type ColumnDef,
} from '@tanstack/react-table';
import { useMemo } from 'react';
import type { CellValue, DataColumn } from './column';
import type { TableView } from './use-table-address';

const features = tableFeatures({
  rowSortingFeature,
  columnFilteringFeature,
  globalFilteringFeature,
  sortedRowModel: createSortedRowModel(),
  filteredRowModel: createFilteredRowModel(),
});

/** Order of two cells: numbers by size, texts as people order them, absent values always last. */
export function compareCells(a: CellValue, b: CellValue): number {
  if (typeof a === 'number' && typeof b === 'number') return a - b;
  return String(a).localeCompare(String(b), 'en', { numeric: true, sensitivity: 'base' });
}

const isAbsent = (value: CellValue) => value === null || value === undefined || value === '';

/** Whether a row holds every word of the filter in some column. */
export function rowHolds<Row>(row: Row, columns: readonly DataColumn<Row>[], filter: string): boolean {
  const text = columns
    .map((column) => String(column.value(row) ?? ''))
    .join('\n')
    .toLowerCase();
  return filter
    .toLowerCase()
    .split(/\s+/)
    .every((word) => text.includes(word));
}

/** Rows of a table after its filter and sorting. */
export function useDataTable<Row extends object>(
  rows: readonly Row[],
  columns: readonly DataColumn<Row>[],
  view: TableView,
): Row[] {
  const definitions = useMemo<ColumnDef<typeof features, Row>[]>(
    () =>
      columns.map((column) => ({
        id: column.id,
        header: column.header,
        accessorFn: (row: Row) => (isAbsent(column.value(row)) ? undefined : column.value(row)),
        sortUndefined: 'last' as const,
        sortFn: (a: { original: Row }, b: { original: Row }) =>
          compareCells(column.value(a.original), column.value(b.original)),
      })),
    [columns],
  );
  const data = useMemo(() => [...rows], [rows]);
  const state = useMemo(
    () => ({
      sorting: view.sort ? [{ id: view.sort, desc: view.descending }] : [],
      globalFilter: view.filter.trim(),
    }),
    [view.sort, view.descending, view.filter],
  );
  const table = useTable({
    features,
    data,
    columns: definitions,
    state,
    getColumnCanGlobalFilter: () => true,
    globalFilterFn: (row: { original: Row }, _id: string, filter: string) =>
      rowHolds(row.original, columns, filter),
  });
  return table.getRowModel().rows.map((row) => row.original);
}
