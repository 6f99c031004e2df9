import { Popover, PopoverSurface, PopoverTrigger } from '@fluentui/react-components';
import type { JobSummary } from '@siltlight/common/wire/jobs';
import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { Link } from 'react-router-dom';
import { useSay } from '../shared/feedback/toasts';
import { JobCard } from '../shared/jobs/job-card';
import { activeJobsQuery, isOver, jobQuery } from '../shared/jobs/queries';
import { counted } from '../shared/number/format';

const RADIUS = 9;
const ROUND = 2 * Math.PI * RADIUS;

/** Jobs in progress: how many, how far, and the list behind it; says so when one is over. */
export function JobsRing() {
  const jobs = useQuery(activeJobsQuery).data ?? [];
  useAnnounceFinished(jobs);
  const share = jobs.length === 0 ? 0 : jobs.reduce((sum, job) => sum + job.progress, 0) / jobs.length;
  const name =
    jobs.length === 0
      ? 'No job in progress'
      : `${counted(jobs.length, 'job')} in progress, ${Math.round(share * 100)} %`;
  return (
    <Popover positioning="below-end" trapFocus>
      <PopoverTrigger disableButtonEnhancement>
        <button type="button" className="jobs-ring" aria-label={name} title={name}>
          <svg width="24" height="24" viewBox="0 0 24 24" aria-hidden="true">
            <circle cx="12" cy="12" r={RADIUS} />
            <circle
              cx="12"
              cy="12"
              r={RADIUS}
              strokeDasharray={`${ROUND * share} ${ROUND}`}
              transform="rotate(-90 12 12)"
            />
          </svg>
          {jobs.length > 0 && <span aria-hidden="true">{jobs.length}</span>}
        </button>
      </PopoverTrigger>
      <PopoverSurface className="jobs-list" aria-label="Jobs in progress">
        <b>Jobs in progress</b>
        {jobs.length === 0 && (
          <p className="sl-13 sl-muted">Nothing runs. Long work shows here with its progress.</p>
        )}
        {jobs.map((job) => (
          <JobCard key={job.id} job={job} />
        ))}
      </PopoverSurface>
    </Popover>
  );
}

/** A job that left the list of active ones has ended: ask how, and say so. */
function useAnnounceFinished(jobs: readonly JobSummary[]): void {
  const client = useQueryClient();
  const say = useSay();
  const before = useRef<ReadonlySet<string>>(new Set());
  const ids = jobs.map((job) => job.id).join(' ');
  useEffect(() => {
    const now = new Set(ids.split(' ').filter(Boolean));
    const gone = [...before.current].filter((id) => !now.has(id));
    before.current = now;
    for (const id of gone) {
      client.fetchQuery({ ...jobQuery(id), staleTime: 0 }).then(
        async (job) => {
          if (!isOver(job)) return;
          if (job.state === 'failed') say(`${job.title} failed`, job.error, 'error');
          else
            say(
              `${job.title} is ${job.state}`,
              job.resultPath && <Link to={job.resultPath}>Open the result</Link>,
            );
          await client.invalidateQueries({ predicate: (query) => query.queryKey[0] !== 'session' });
        },
        (error: unknown) => say('A job ended, but its outcome could not be read', String(error), 'warning'),
      );
    }
  }, [ids, client, say]);
}
