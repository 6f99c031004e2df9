import type { JobSummary } from '@siltlight/common/wire/jobs';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../api/client';

export const isOver = (job: Pick<JobSummary, 'state'>) => job.state !== 'queued' && job.state !== 'running';

const POLL_MS = 1500;

/** Own jobs in progress, asked for often while there are any and now and then when there are none. */
export const activeJobsQuery = queryOptions({
  queryKey: ['jobs', 'active'],
  queryFn: async () => {
    const jobs = await listOf(api.get<Listed<JobSummary>>('/jobs', { params: { active: 1, limit: 50 } }));
    return jobs.filter((job) => !isOver(job));
  },
  refetchInterval: (query) => ((query.state.data?.length ?? 0) > 0 ? POLL_MS : 15_000),
  staleTime: 0,
});

/** One job, followed until it is over. */
export const jobQuery = (id: string) =>
  queryOptions({
    queryKey: ['jobs', id],
    queryFn: () => api.get<JobSummary>(`/jobs/${id}`),
    refetchInterval: (query) => (query.state.data && isOver(query.state.data) ? false : POLL_MS),
    staleTime: 0,
  });

export const cancelJob = (id: string) => api.post<JobSummary>(`/jobs/${id}/cancel`);

/** Lists come either bare or as a page with a cursor. */
export type Listed<T> = T[] | { items: T[] };

export async function listOf<T>(answer: Promise<Listed<T>>): Promise<T[]> {
  const list = await answer;
  return Array.isArray(list) ? list : list.items;
}
