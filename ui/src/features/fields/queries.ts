import type { DatasetSummary } from '@siltlight/common/wire/datasets';
import type { FieldDetail } from '@siltlight/common/wire/slices';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';
import { regionTitle } from '../../shared/map/region-name';

/** What is sent to build a field; mirrors the schema `fieldRequest`. */
export type FieldChoice = {
  sliceSlug: string;
  way: 'regional-scaling';
  datasetVersionIds: string[];
  title?: string;
  sizeCutoff?: string;
};

/** Regions by the names people read. */
const readable = (field: FieldDetail): FieldDetail => ({
  ...field,
  regions: field.regions.map((region) => ({ ...region, name: regionTitle(region.name) })),
});

export const fieldQuery = (versionId: string) =>
  queryOptions({
    queryKey: ['fields', versionId],
    queryFn: async () => readable(await api.get<FieldDetail>(`/fields/${versionId}`)),
    staleTime: 60_000,
  });

export const datasetsQuery = queryOptions({
  queryKey: ['datasets', 'list'],
  queryFn: async () => (await api.get<{ items: DatasetSummary[] }>('/datasets')).items,
});

/** The field as it would be, asked for anew with each change; a change stops the question before it. */
export const fieldPreviewQuery = (choice: FieldChoice) =>
  queryOptions({
    queryKey: ['fields', 'preview', choice],
    queryFn: async ({ signal }) =>
      readable(await api.post<FieldDetail>('/fields/preview', choice, { signal })),
    enabled: choice.datasetVersionIds.length > 0,
    placeholderData: keepPreviousData,
    staleTime: Infinity,
    retry: false,
  });

export const buildField = (choice: FieldChoice) => api.post<FieldDetail>('/fields', choice);
