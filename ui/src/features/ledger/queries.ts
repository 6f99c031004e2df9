import type { LedgerCheck, LedgerEntryView } from '@siltlight/common/wire/ledger';
import type { Page } from '@siltlight/common/wire/shared';
import { infiniteQueryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';

export type LedgerFilter = { objectKind?: string; objectId?: string; personId?: string; verb?: string };

export const ledgerFilterOf = (params: URLSearchParams): LedgerFilter => {
  const filter: LedgerFilter = {};
  for (const name of ['objectKind', 'objectId', 'personId', 'verb'] as const) {
    const value = params.get(name)?.trim();
    if (value) filter[name] = value;
  }
  return filter;
};

export const ledgerQuery = (filter: LedgerFilter) =>
  infiniteQueryOptions({
    queryKey: ['ledger', filter],
    queryFn: ({ pageParam }) =>
      api.get<Page<LedgerEntryView>>('/ledger', {
        params: { ...filter, limit: 100, cursor: pageParam ?? undefined },
      }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
  });

export const verifyLedger = () => api.get<LedgerCheck>('/ledger/verify');
