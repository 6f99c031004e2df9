import type { ExportFormat, ExportSummary } from '@siltlight/common/wire/exports';
import type { Page } from '@siltlight/common/wire/shared';
import { infiniteQueryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';

export const exportFormats: Record<ExportFormat, { name: string; says: string }> = {
  'regional-table-csv': {
    name: 'Regional table, CSV',
    says: 'one row for each region, units in the headings',
  },
  'slice-fields-netcdf': { name: 'Slice fields, NetCDF', says: 'gridded, CF conventions' },
};

const isWaiting = ({ state }: Pick<ExportSummary, 'state'>) => state === 'queued' || state === 'running';

/** Exports, newest first, followed while any of them is being made. */
export const exportsQuery = infiniteQueryOptions({
  queryKey: ['exports', 'list'],
  queryFn: ({ pageParam }) =>
    api.get<Page<ExportSummary>>('/exports', { params: { limit: 50, cursor: pageParam ?? undefined } }),
  initialPageParam: null as string | null,
  getNextPageParam: (page) => page.nextCursor,
  refetchInterval: (query) =>
    query.state.data?.pages.some((page) => page.items.some(isWaiting)) ? 2000 : false,
});

export const requestExport = (estimateId: string, format: ExportFormat) =>
  api.post<{ id: string; jobId: string }>('/exports', { estimateId, format });

export const exportFileAddress = (id: string) => `/api/v1/exports/${id}/file`;
