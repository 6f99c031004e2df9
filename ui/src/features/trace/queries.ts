import type { SiteTrace } from '@siltlight/common/wire/slices';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';

export const traceQuery = (fieldVersionId: string, site: string, dataset: string) =>
  queryOptions({
    queryKey: ['fields', fieldVersionId, 'trace', site, dataset],
    queryFn: () => api.get<SiteTrace>(`/fields/${fieldVersionId}/trace`, { params: { site, dataset } }),
    staleTime: 60_000,
  });
