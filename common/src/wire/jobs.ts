import { z } from 'zod';
import { isoTime } from './shared';

export const jobState = z.enum(['queued', 'running', 'done', 'failed', 'cancelled']);

export const jobSummary = z.object({
  id: z.string(),
  kind: z.string(),
  title: z.string(),
  state: jobState,
  /** 0 to 1, never falls */
  progress: z.number(),
  stage: z.string().nullable(),
  error: z.string().nullable(),
  /** where the result is to be seen in the client, e.g. /estimates/… */
  resultPath: z.string().nullable(),
  createdAt: isoTime,
  finishedAt: isoTime.nullable(),
});
export type JobSummary = z.infer<typeof jobSummary>;
