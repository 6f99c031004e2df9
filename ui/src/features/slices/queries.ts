import type { SliceContent, SliceDetail } from '@siltlight/common/wire/slices';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';

export type ListedSlice = SliceContent & { versionId: string };

/** Published slices, youngest first. */
export const slicesQuery = queryOptions({
  queryKey: ['slices', 'list'],
  queryFn: async () => (await api.get<{ items: ListedSlice[] }>('/slices')).items,
  staleTime: 60_000,
});

export const sliceQuery = (slug: string) =>
  queryOptions({
    queryKey: ['slices', 'one', slug],
    queryFn: () => api.get<SliceDetail>(`/slices/${encodeURIComponent(slug)}`),
  });
