import type { JobSummary } from '@siltlight/common/wire/jobs';
import { Button, ProgressBar } from '@fluentui/react-components';
import { Dismiss16Regular } from '@fluentui/react-icons';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import '../feedback/feedback.css';
import { ErrorState } from '../feedback/error-state';
import { formatPercent } from '../number/format';
import { StateTag } from '../page/state-tag';
import { cancelJob, isOver } from './queries';
import { timeLeft } from './time-left';

/** Long work: progress, stage, time left, cancel. The job itself lives in the service and survives a reload. */
export function JobCard({ job, hint }: { job: JobSummary; hint?: string }) {
  const client = useQueryClient();
  const cancel = useMutation({
    mutationFn: () => cancelJob(job.id),
    onSettled: () => client.invalidateQueries({ queryKey: ['jobs'] }),
  });
  const left = timeLeft(job.createdAt, job.progress);
  return (
    <section className="job-card" aria-label={job.title}>
      <header>
        <b className="sl-13">{job.title}</b>
        <StateTag state={job.state} />
        <span className="sl-grow" />
        {!isOver(job) && (
          <Button
            size="small"
            icon={<Dismiss16Regular />}
            disabled={cancel.isPending}
            onClick={() => cancel.mutate()}
          >
            Cancel
          </Button>
        )}
      </header>
      {!isOver(job) && <ProgressBar value={job.progress} max={1} aria-label={`Progress of ${job.title}`} />}
      <p className="sl-13 sl-second" aria-live="polite">
        {!isOver(job) && <b>{formatPercent(job.progress)} </b>}
        {job.error ?? [job.stage, !isOver(job) && left].filter(Boolean).join(', ')}
        {job.resultPath && job.state === 'done' && <Link to={job.resultPath}>Open the result</Link>}
      </p>
      {hint && !isOver(job) && <p className="sl-small sl-muted">{hint}</p>}
      {cancel.error && <ErrorState error={cancel.error} />}
    </section>
  );
}
