import type { DeskView } from '@siltlight/common/wire/desk';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';

export const deskQuery = queryOptions({
  queryKey: ['desk'],
  queryFn: () => api.get<DeskView>('/desk'),
  staleTime: 20_000,
});
