import type { ColumnSlice } from '@siltlight/common/wire/slices';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';
import { listOf, type Listed } from '../../shared/jobs/queries';

export const columnQuery = queryOptions({
  queryKey: ['slices', 'column'],
  queryFn: () => listOf(api.get<Listed<ColumnSlice>>('/slices/column')),
  staleTime: 30_000,
});
