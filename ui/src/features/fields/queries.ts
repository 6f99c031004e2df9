import type { DatasetSummary } from '@siltlight/common/wire/datasets';
import type { FieldDetail } from '@siltlight/common/wire/slices';
import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';

/** What is sent to build a field; mirrors the schema `fieldRequest`. */
export type FieldChoice = {
  sliceSlug: string;
  way: 'regional-scaling';
  datasetVersionIds: string[];
  title?: string;
  sizeCutoff?: string;
};

export const fieldQuery = (versionId: string) =>
  queryOptions({
    queryKey: ['fields', versionId],
    queryFn: () => api.get<FieldDetail>(`/fields/${versionId}`),
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
    queryFn: ({ signal }) => api.post<FieldDetail>('/fields/preview', choice, { signal }),
    enabled: choice.datasetVersionIds.length > 0,
    placeholderData: keepPreviousData,
    staleTime: Infinity,
    retry: false,
  });

export const buildField = (choice: FieldChoice) => api.post<FieldDetail>('/fields', choice);
