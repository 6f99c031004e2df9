import { Button } from '@fluentui/react-components';
import { Add20Regular, Open20Regular } from '@fluentui/react-icons';
import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { EstimatesTable } from '../features/desk/estimates-table';
import { deskHeadline } from '../features/desk/headline';
import { Lately } from '../features/desk/lately';
import { deskQuery } from '../features/desk/queries';
import { QueueTable } from '../features/desk/queue-table';
import { SubmissionsTable } from '../features/desk/submissions-table';
import { useHasRole } from '../shared/api/session';
import { Page } from '../shared/page/page';
import '../features/desk/desk.css';

export const loader = (client: QueryClient) => () => client.ensureQueryData(deskQuery);

const today = () =>
  new Intl.DateTimeFormat('en-GB', { weekday: 'long', day: 'numeric', month: 'long' }).format(new Date());

export default function Desk() {
  const { data: desk } = useSuspenseQuery(deskQuery);
  const navigate = useNavigate();
  const isSteward = useHasRole('steward');
  const isScientist = useHasRole('scientist');
  const oldest = desk.queue.find((submission) => !submission.own);
  const action = oldest ? (
    <Button
      appearance="primary"
      icon={<Open20Regular />}
      onClick={() => void navigate(`/intake/${oldest.id}`)}
    >
      Open the oldest
    </Button>
  ) : (
    isScientist && (
      <Button appearance="primary" icon={<Add20Regular />} onClick={() => void navigate('/intake')}>
        Submit a spreadsheet
      </Button>
    )
  );
  return (
    <Page title={deskHeadline(desk)} crumbs={[{ label: 'Desk' }]} sub={today()} actions={action}>
      <div className="desk">
        <div>
          {isSteward && <QueueTable queue={desk.queue} />}
          {(isScientist || desk.mySubmissions.length > 0) && (
            <SubmissionsTable submissions={desk.mySubmissions} />
          )}
          {desk.awaitingSignOff.length > 0 && (
            <EstimatesTable
              title="Awaiting a second person"
              sub="computed by others, not yet published"
              estimates={desk.awaitingSignOff}
              empty={null}
            />
          )}
          {desk.stale.length > 0 && (
            <EstimatesTable
              title="Made stale by newer versions"
              sub="estimates to run again"
              estimates={desk.stale}
              note={(row) => row.staleReason}
              empty={null}
            />
          )}
          <EstimatesTable
            title="Latest published"
            sub="each against its reference"
            estimates={desk.latestPublished}
            empty={
              <p className="sl-13 sl-muted">
                No estimate is published yet: a second person signs off a computed one.
              </p>
            }
          />
        </div>
        <aside aria-label="Lately">
          <Lately acts={desk.lately} />
        </aside>
      </div>
    </Page>
  );
}
