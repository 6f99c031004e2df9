import { Button } from '@fluentui/react-components';
import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { Link, useParams, useSearchParams, type LoaderFunctionArgs } from 'react-router-dom';
import { BenchView } from '../features/intake/bench-view';
import { submissionQuery } from '../features/intake/queries';
import { usePerson } from '../shared/api/session';
import { formatDate } from '../shared/number/time';
import { Page } from '../shared/page/page';
import { StateTag } from '../shared/page/state-tag';
import '../features/intake/intake.css';
import '../features/intake/bench.css';
import '../features/intake/panels.css';

export const loader =
  (client: QueryClient) =>
  ({ params }: LoaderFunctionArgs) =>
    client.ensureQueryData(submissionQuery(params.id!));

const panels = { metadata: 'Metadata', mapping: 'Mapping', history: 'History' } as const;
const rounds = ['', '', 'second round', 'third round'];

export default function IntakeBench() {
  const { id } = useParams();
  const person = usePerson();
  const { data: detail } = useSuspenseQuery(submissionQuery(id!));
  const own = detail.contributor.id === person.id;
  const back = own
    ? { label: 'My submissions', to: '/intake?view=mine' }
    : { label: 'Queue', to: '/intake?view=queue' };
  const returns = detail.decisions.filter(({ decision }) => decision === 'return').length;
  const sub = [
    own ? null : `from ${detail.contributor.name}`,
    detail.submittedAt
      ? `submitted ${formatDate(detail.submittedAt)}`
      : `uploaded ${formatDate(detail.createdAt)}`,
    returns > 0 ? (rounds[returns + 1] ?? `round ${returns + 1}`) : null,
  ].filter(Boolean);
  return (
    <Page
      title={detail.title}
      crumbs={[{ label: 'Intake', to: '/intake' }, back, { label: detail.number }]}
      state={<StateTag state={detail.state} />}
      sub={
        <>
          {sub.join(' · ')}
          {detail.sameFileAs && (
            <>
              {' · the same file as '}
              <Link to={`/intake/${detail.sameFileAs.id}`}>{detail.sameFileAs.number}</Link>
            </>
          )}
        </>
      }
      actions={<PanelButtons />}
    >
      <BenchView key={detail.id} detail={detail} />
    </Page>
  );
}

/** Each opens its panel beside the grid, and closes it again. */
function PanelButtons() {
  const [params, setParams] = useSearchParams();
  const open = params.get('panel');
  const flip = (panel: string) => {
    const next = new URLSearchParams(params);
    next.delete('field');
    if (open === panel) next.delete('panel');
    else next.set('panel', panel);
    setParams(next, { preventScrollReset: true });
  };
  return Object.entries(panels).map(([panel, label]) => (
    <Button
      key={panel}
      appearance={open === panel ? 'outline' : 'subtle'}
      aria-pressed={open === panel}
      onClick={() => flip(panel)}
    >
      {label}
    </Button>
  ));
}
