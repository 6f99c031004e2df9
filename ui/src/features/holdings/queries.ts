import type { DatasetSummary, DatasetVersionDetail, samplesPage } from '@siltlight/common/wire/datasets';
import type { sourceCells } from '@siltlight/common/wire/slices';
import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { api } from '../../shared/api/client';
import { listOf, type Listed } from '../../shared/jobs/queries';

export type SamplesPage = z.infer<typeof samplesPage>;
export type SourceCells = z.infer<typeof sourceCells>;

const SAMPLES_PER_PAGE = 500;
/** Enough for the age–flux plot of one site; a longer series is drawn as far as it is loaded, and says so. */
export const PLOTTED = 1000;

export const datasetsQuery = queryOptions({
  queryKey: ['datasets', 'summaries'],
  queryFn: () => listOf(api.get<Listed<DatasetSummary>>('/datasets')),
});

/** A version of a dataset; without a number the one in force. */
export const datasetQuery = (slug: string, number: number | null) =>
  queryOptions({
    queryKey: ['datasets', 'version', slug, number],
    queryFn: () =>
      api.get<DatasetVersionDetail>(`/datasets/${slug}${number === null ? '' : `/versions/${number}`}`),
  });

export const samplesQuery = (slug: string, number: number, site: string) =>
  infiniteQueryOptions({
    queryKey: ['datasets', 'samples', slug, number, site],
    queryFn: ({ pageParam }) =>
      api.get<SamplesPage>(`/datasets/${slug}/versions/${number}/samples`, {
        params: { site: site || undefined, offset: pageParam, limit: SAMPLES_PER_PAGE },
      }),
    initialPageParam: 0,
    getNextPageParam: (last, pages) => {
      const loaded = pages.reduce((sum, page) => sum + page.items.length, 0);
      return loaded < last.total && last.items.length > 0 ? loaded : undefined;
    },
    staleTime: Infinity, // a version never changes
  });

export const plotQuery = (slug: string, number: number, site: string) =>
  queryOptions({
    queryKey: ['datasets', 'plot', slug, number, site],
    queryFn: () =>
      api.get<SamplesPage>(`/datasets/${slug}/versions/${number}/samples`, {
        params: { site: site || undefined, offset: 0, limit: PLOTTED },
      }),
    staleTime: Infinity,
  });

export const cellsQuery = (slug: string, number: number, sheet: string, row: number) =>
  queryOptions({
    queryKey: ['datasets', 'cells', slug, number, sheet, row],
    queryFn: () =>
      api.get<SourceCells>(`/datasets/${slug}/versions/${number}/cells`, { params: { sheet, row } }),
    staleTime: Infinity,
  });

export const withdrawVersion = (slug: string, number: number, reason: string) =>
  api.post<DatasetVersionDetail>(`/datasets/${slug}/versions/${number}/withdraw`, { reason });

/** Address of a file of a version, for links that download. */
export const versionFile = (slug: string, number: number, part: 'file' | 'content' | 'provenance') =>
  `/api/v1/datasets/${slug}/versions/${number}/${part}`;

export const pathOfVersion = (slug: string, number: number) => `/holdings/${slug}/versions/${number}`;

/** "a41b…90ac": enough of a checksum to tell two apart on screen; the whole one stands in the title. */
export const shortSum = (checksum: string) => `${checksum.slice(0, 4)}…${checksum.slice(-4)}`;
