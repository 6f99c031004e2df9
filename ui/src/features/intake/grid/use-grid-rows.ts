import { useQueries } from '@tanstack/react-query';
import { useCallback, useMemo, useState } from 'react';
import { GRID_CHUNK, gridQuery } from '../queries';
import type { GridRow } from './grid-model';

const chunkOf = (row: number) => Math.floor((row - 1) / GRID_CHUNK);

/** Rows of a sheet, fetched in chunks as they come into sight. */
export function useGridRows(id: string, sheet: string) {
  const [seen, setSeen] = useState<[number, number]>([0, 0]);
  const chunks = Array.from({ length: seen[1] - seen[0] + 1 }, (_, index) => seen[0] + index);
  const answers = useQueries({
    queries: chunks.map((chunk) => gridQuery(id, sheet, chunk)),
    combine: (results) => ({
      windows: results.map((result) => result.data),
      error: results.find((result) => result.error)?.error ?? null,
      refetch: () => Promise.all(results.map((result) => result.refetch())),
    }),
  });
  const rows = useMemo(() => {
    const byNumber = new Map<number, GridRow>();
    for (const window of answers.windows) for (const row of window?.rows ?? []) byNumber.set(row.row, row);
    return byNumber;
  }, [answers.windows]);
  const rowAt = useCallback((row: number) => rows.get(row), [rows]);
  const onSeen = useCallback((firstRow: number, lastRow: number) => {
    const [from, to] = [chunkOf(firstRow), chunkOf(lastRow)];
    setSeen((before) => (before[0] === from && before[1] === to ? before : [from, to]));
  }, []);
  return {
    rowAt,
    onSeen,
    error: answers.error,
    refetch: answers.refetch,
    columns: answers.windows[0]?.columns,
  };
}
