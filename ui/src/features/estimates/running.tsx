import { Button } from '@fluentui/react-components';
import type { EstimateDetail } from '@siltlight/common/wire/estimates';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { EmptyState } from '../../shared/feedback/empty-state';
import { ErrorState } from '../../shared/feedback/error-state';
import { LoadingRows } from '../../shared/feedback/loading';
import { JobCard } from '../../shared/jobs/job-card';
import { isOver, jobQuery } from '../../shared/jobs/queries';
import { runAgain } from './queries';

/** An estimate without a result: under way, failed or cancelled. The job lives in the service and outlives a reload. */
export function Running({ estimate }: { estimate: EstimateDetail }) {
  const { jobId, state } = estimate;
  return (
    <div className="running">
      {jobId && <FollowedJob jobId={jobId} estimateId={estimate.id} />}
      {(state === 'failed' || state === 'cancelled') && <Ended estimate={estimate} />}
    </div>
  );
}

function FollowedJob({ jobId, estimateId }: { jobId: string; estimateId: string }) {
  const job = useQuery(jobQuery(jobId));
  const client = useQueryClient();
  const over = job.data ? isOver(job.data) : false;
  useEffect(() => {
    if (over) void client.invalidateQueries({ queryKey: ['estimates', 'one', estimateId] });
  }, [over, client, estimateId]);
  if (job.isError) return <ErrorState error={job.error} retry={() => void job.refetch()} />;
  if (!job.data) return <LoadingRows rows={2} label="Loading the job" />;
  return (
    <JobCard job={job.data} hint="You may leave this page: the top bar keeps count, and the run goes on." />
  );
}

function Ended({ estimate: { id, request, state } }: { estimate: EstimateDetail }) {
  const navigate = useNavigate();
  const client = useQueryClient();
  const again = useMutation({
    mutationFn: () => runAgain(id),
    onSuccess: async (accepted) => {
      await client.invalidateQueries({ queryKey: ['jobs'] });
      await navigate(`/estimates/${accepted.id}`);
    },
  });
  return (
    <>
      <EmptyState
        title={
          state === 'failed'
            ? 'This run failed; it has no result.'
            : 'This run was cancelled; it has no result.'
        }
        action={
          <Button appearance="primary" disabled={again.isPending} onClick={() => again.mutate()}>
            Run again
          </Button>
        }
        after={
          <Link to={`/estimates/new?field=${request.fieldVersionId}&method=${request.method}`}>
            Change the set-up first
          </Link>
        }
      >
        Its set-up is kept: the same run can be asked for again.
      </EmptyState>
      {again.error && <ErrorState error={again.error} />}
    </>
  );
}
