import { z } from 'zod';
import { estimateSummary } from './estimates';
import { isoTime } from './shared';
import { submissionSummary } from './submissions';

export const deskView = z.object({
  /** stewards: submitted and in review, oldest first */
  queue: z.array(submissionSummary.extend({ own: z.boolean(), waitsSince: isoTime })),
  mySubmissions: z.array(submissionSummary),
  /** computed estimates of others that wait for a second person */
  awaitingSignOff: z.array(estimateSummary),
  stale: z.array(estimateSummary),
  latestPublished: z.array(estimateSummary),
  lately: z.array(z.object({ at: isoTime, summary: z.string(), path: z.string().nullable() })),
});
export type DeskView = z.infer<typeof deskView>;

export const searchHit = z.object({
  kind: z.enum(['slice', 'dataset', 'site', 'estimate', 'submission']),
  title: z.string(),
  detail: z.string(),
  path: z.string(),
});
export type SearchHit = z.infer<typeof searchHit>;
