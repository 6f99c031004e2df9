import { useCallback, useState } from 'react';
import { useSearchParams } from 'react-router-dom';

export type TableView = { sort: string | null; descending: boolean; filter: string };

/**
 * Sorting and filter of a table: in the address under a prefix (so that a link shows the same view),
 * or with the component alone where no prefix is given.
 */
export function useTableView(prefix: string | undefined, start: TableView) {
  const [params, setParams] = useSearchParams();
  const [local, setLocal] = useState(start);
  const view = prefix === undefined ? local : fromAddress(params, prefix, start);
  const change = useCallback(
    (next: TableView) => {
      if (prefix === undefined) setLocal(next);
      else
        setParams((before) => intoAddress(before, prefix, next), { replace: true, preventScrollReset: true });
    },
    [prefix, setParams],
  );
  return [view, change] as const;
}

function fromAddress(params: URLSearchParams, prefix: string, start: TableView): TableView {
  const sort = params.get(`${prefix}sort`);
  return {
    sort: sort === null ? start.sort : sort.replace(/^-/, ''),
    descending: sort === null ? start.descending : sort.startsWith('-'),
    filter: params.get(`${prefix}find`) ?? start.filter,
  };
}

function intoAddress(before: URLSearchParams, prefix: string, view: TableView): URLSearchParams {
  const next = new URLSearchParams(before);
  if (view.sort) next.set(`${prefix}sort`, (view.descending ? '-' : '') + view.sort);
  else next.delete(`${prefix}sort`);
  if (view.filter) next.set(`${prefix}find`, view.filter);
  else next.delete(`${prefix}find`);
  return next;
}
