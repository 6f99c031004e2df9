import type { Page, PersonMark } from '@siltlight/common/wire/shared';
import type {
  FindingView,
  GridWindow,
  SubmissionDetail,
  SubmissionSummary,
} from '@siltlight/common/wire/submissions';
import type { ruleEntry } from '@siltlight/common/wire/submissions';
import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { api } from '../../shared/api/client';
import { listOf, type Listed } from '../../shared/jobs/queries';

export type RuleEntry = z.infer<typeof ruleEntry>;
export type HistoryEntry = { at: string; who: PersonMark | null; summary: string };
export type ListView = { view: 'mine' | 'queue' | 'all'; state: string };

const PAGE_SIZE = 50;
export const GRID_CHUNK = 200;
const FINDINGS_CHUNK = 1000;
/** More findings than this cannot be worked through one by one: the drawer says how many are left. */
export const FINDINGS_SHOWN = 5000;

export const listKey = ['submissions', 'list'] as const;
export const submissionKey = (id: string) => ['submissions', id] as const;

export const listQuery = ({ view, state }: ListView) =>
  infiniteQueryOptions({
    queryKey: [...listKey, view, state],
    queryFn: ({ pageParam }) =>
      api.get<Page<SubmissionSummary>>('/submissions', {
        params: {
          limit: PAGE_SIZE,
          cursor: pageParam,
          mine: view === 'mine' ? 'true' : undefined,
          queue: view === 'queue' ? 'true' : undefined,
          state: state || undefined,
        },
      }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last) => last.nextCursor ?? undefined,
  });

export const submissionQuery = (id: string) =>
  queryOptions({
    queryKey: [...submissionKey(id), 'detail'],
    queryFn: () => api.get<SubmissionDetail>(`/submissions/${id}`),
  });

/** Rows of a sheet in chunks that start at 1, 201, 401 …; a mend refreshes them in place. */
export const gridQuery = (id: string, sheet: string, chunk: number) =>
  queryOptions({
    queryKey: [...submissionKey(id), 'grid', sheet, chunk],
    queryFn: () =>
      api.get<GridWindow>(`/submissions/${id}/grid`, {
        params: { sheet, fromRow: chunk * GRID_CHUNK + 1, limit: GRID_CHUNK },
      }),
  });

type FindingsPage = { total: number; items: FindingView[] };

export const findingsQuery = (id: string) =>
  queryOptions({
    queryKey: [...submissionKey(id), 'findings'],
    queryFn: async (): Promise<FindingsPage> => {
      const items: FindingView[] = [];
      for (;;) {
        const page = await api.get<FindingsPage>(`/submissions/${id}/findings`, {
          params: { limit: FINDINGS_CHUNK, offset: items.length },
        });
        items.push(...page.items);
        if (items.length >= Math.min(page.total, FINDINGS_SHOWN) || page.items.length === 0) {
          return { total: page.total, items };
        }
      }
    },
  });

export const historyQuery = (id: string) =>
  queryOptions({
    queryKey: [...submissionKey(id), 'history'],
    queryFn: () => listOf(api.get<Listed<HistoryEntry>>(`/submissions/${id}/history`)),
  });

export const rulesQuery = queryOptions({
  queryKey: ['rules'],
  queryFn: () => listOf(api.get<Listed<RuleEntry>>('/rules')),
  staleTime: Infinity,
});

/** Datasets of which an approval can become a new version. */
export const datasetChoicesQuery = queryOptions({
  queryKey: ['datasets', 'choices'],
  queryFn: () => listOf(api.get<Listed<{ slug: string; title: string; kind: string }>>('/datasets')),
});

export const templateAddress = (kind: string) => `/api/v1/submissions/template?kind=${kind}&format=csv`;
export const fileAddress = (id: string) => `/api/v1/submissions/${id}/file`;

export function uploadFile(
  { file, kind, title }: { file: File; kind: string; title: string },
  report: (progress01: number) => void,
  signal: AbortSignal,
): Promise<SubmissionDetail> {
  const form = new FormData();
  form.append('kind', kind);
  if (title.trim()) form.append('title', title.trim());
  form.append('file', file);
  return api.upload<SubmissionDetail>('/submissions', form, report, signal);
}
