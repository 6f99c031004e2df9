import { useQuery } from '@tanstack/react-query';
import { ErrorState } from '../../shared/feedback/error-state';
import { LoadingRows } from '../../shared/feedback/loading';
import { formatDateTime } from '../../shared/number/time';
import { PanelHead } from './panel-head';
import { historyQuery } from './queries';

/** What happened to the submission, newest first, as the ledger has it. */
export function HistoryPanel({ id, onClose }: { id: string; onClose: () => void }) {
  const { data, error, refetch } = useQuery(historyQuery(id));
  return (
    <aside className="bench-panel" aria-label="History">
      <PanelHead title="History" sub="newest first" onClose={onClose} />
      <div className="panel-body">
        {error && !data && <ErrorState error={error} retry={() => void refetch()} />}
        {!error && !data && <LoadingRows label="Loading the history" />}
        <ol className="history">
          {data?.map((entry, at) => (
            <li key={at}>
              <time dateTime={entry.at}>{formatDateTime(entry.at)}</time>
              <span>
                <b>{entry.who?.name ?? 'The service'}</b> {entry.summary}
              </span>
            </li>
          ))}
        </ol>
      </div>
    </aside>
  );
}
