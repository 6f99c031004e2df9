import type { ColumnSlice } from '@siltlight/common/wire/slices';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';

export const columnQuery = queryOptions({
  queryKey: ['slices', 'column'],
  queryFn: () => api.get<ColumnSlice[]>('/slices/column'),
  staleTime: 30_000,
});
