import { Button } from '@fluentui/react-components';
import { useInfiniteQuery, useQuery, type QueryClient } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { ExportsTable } from '../features/exports/exports-table';
import { exportsQuery } from '../features/exports/queries';
import { Snippet } from '../features/exports/snippet';
import '../features/exports/exports.css';
import { ErrorState } from '../shared/feedback/error-state';
import { LoadingRows } from '../shared/feedback/loading';
import { JobCard } from '../shared/jobs/job-card';
import { jobQuery } from '../shared/jobs/queries';
import { Page } from '../shared/page/page';

export const loader = (client: QueryClient) => () => client.ensureInfiniteQueryData(exportsQuery);

export default function Exports() {
  const [params, setParams] = useSearchParams();
  const list = useInfiniteQuery(exportsQuery);
  const files = list.data?.pages.flatMap((page) => page.items) ?? [];
  const slice = params.get('slice');
  const picked =
    files.find((file) => file.id === params.get('file')) ?? files.find((file) => file.state === 'done');
  const waiting = files.filter((file) => file.state === 'queued' || file.state === 'running');
  const select = (id: string) =>
    setParams(
      (before) => {
        const next = new URLSearchParams(before);
        next.set('file', id);
        return next;
      },
      { replace: true, preventScrollReset: true },
    );
  return (
    <Page
      title="Exports"
      crumbs={[{ label: 'Exports' }]}
      sub={slice ? 'of all slices' : 'kept with their checksums'}
    >
      <div className="exports">
        {waiting.map((file) => (
          <FileJob key={file.id} jobId={file.jobId} />
        ))}
        {list.isError && <ErrorState error={list.error} retry={() => void list.refetch()} />}
        {list.isLoading ? (
          <LoadingRows />
        ) : (
          <ExportsTable files={files} selected={picked?.id ?? null} onSelect={(file) => select(file.id)} />
        )}
        {list.hasNextPage && (
          <div>
            <Button size="small" disabled={list.isFetchingNextPage} onClick={() => void list.fetchNextPage()}>
              Older files
            </Button>
          </div>
        )}
        {picked?.state === 'done' && <Snippet file={picked} />}
      </div>
    </Page>
  );
}

function FileJob({ jobId }: { jobId: string }) {
  const job = useQuery(jobQuery(jobId));
  return job.data ? <JobCard job={job.data} hint="You may leave this page; the file waits here." /> : null;
}
