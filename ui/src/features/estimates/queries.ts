import type {
  BackdropView,
  EstimateDetail,
  EstimateRequest,
  EstimateResult,
  EstimateSummary,
  OpticalSetView,
} from '@siltlight/common/wire/estimates';
import type { FieldDetail } from '@siltlight/common/wire/slices';
import type { Page } from '@siltlight/common/wire/shared';
import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';
import { readableEstimate, readableResult } from './readable-result';

export const opticalSetsQuery = queryOptions({
  queryKey: ['optical-sets'],
  queryFn: async () => (await api.get<{ items: OpticalSetView[] }>('/optical-sets')).items,
  staleTime: 300_000,
});

export const backdropsQuery = queryOptions({
  queryKey: ['backdrops'],
  queryFn: async () => (await api.get<{ items: BackdropView[] }>('/backdrops')).items,
  staleTime: 300_000,
});

/** Fields an estimate may start from, newest first. */
export const fieldsQuery = (slice: string | null) =>
  queryOptions({
    queryKey: ['fields', 'list', slice],
    queryFn: async () =>
      (await api.get<{ items: FieldDetail[] }>('/fields', { params: slice ? { slice } : {} })).items,
  });

export type EstimateFilter = { slice?: string; state?: string };

export const filterOf = (params: URLSearchParams): EstimateFilter => ({
  slice: params.get('slice') ?? undefined,
  state: params.get('state') ?? undefined,
});

export const estimatesQuery = (filter: EstimateFilter) =>
  infiniteQueryOptions({
    queryKey: ['estimates', 'list', filter],
    queryFn: ({ pageParam }) =>
      api.get<Page<EstimateSummary>>('/estimates', {
        params: { ...filter, limit: 100, cursor: pageParam ?? undefined },
      }),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.nextCursor,
  });

const POLL_MS = 2000;
const isWaiting = (state: string | undefined) => state === 'queued' || state === 'running';

/** One estimate, followed while its job is under way. */
export const estimateQuery = (id: string) =>
  queryOptions({
    queryKey: ['estimates', 'one', id],
    queryFn: async () => readableEstimate(await api.get<EstimateDetail>(`/estimates/${id}`)),
    refetchInterval: (query) => (isWaiting(query.state.data?.state) ? POLL_MS : false),
  });

/** The result as it would be from few members; a change stops the question before it. */
export const estimatePreviewQuery = (request: EstimateRequest | null) =>
  queryOptions({
    queryKey: ['estimates', 'preview', request],
    queryFn: async ({ signal }) =>
      readableResult(await api.post<EstimateResult>('/estimates/preview', request, { signal })),
    enabled: request !== null,
    placeholderData: keepPreviousData,
    staleTime: Infinity,
    retry: false,
  });

type Accepted = { id: string; jobId: string; jobPath: string };

export const requestEstimate = (request: EstimateRequest) => api.post<Accepted>('/estimates', request);
export const runAgain = (id: string) => api.post<Accepted>(`/estimates/${id}/run-again`);
export const signOff = (id: string) => api.post<EstimateDetail>(`/estimates/${id}/sign-off`);
export const withdraw = (id: string, reason: string) =>
  api.post<EstimateDetail>(`/estimates/${id}/withdraw`, { reason });
export const runRecordAddress = (id: string) => `/api/v1/estimates/${id}/run-record`;
