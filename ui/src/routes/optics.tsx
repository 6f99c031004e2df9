import { Button } from '@fluentui/react-components';
import { Add20Regular } from '@fluentui/react-icons';
import { useSuspenseQueries, type QueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import '../features/optics/optics.css';
import { listedSetsQuery } from '../features/optics/queries';
import { SetsTable } from '../features/optics/sets-table';
import { useHasRole } from '../shared/api/session';
import { Page } from '../shared/page/page';

export const loader = (client: QueryClient) => () =>
  Promise.all(
    (['draft', 'published'] as const).map((state) => client.ensureQueryData(listedSetsQuery(state))),
  );

export default function Optics() {
  const [drafts, published] = useSuspenseQueries({
    queries: [listedSetsQuery('draft'), listedSetsQuery('published')],
  });
  const navigate = useNavigate();
  const mayMake = useHasRole('scientist');
  return (
    <Page
      title="Optical sets"
      crumbs={[{ label: 'Optics' }]}
      actions={
        mayMake && (
          <Button appearance="primary" icon={<Add20Regular />} onClick={() => void navigate('/optics/new')}>
            New optical set
          </Button>
        )
      }
    >
      <p className="optics-lead">
        A set says how a gram of particles treats light: how much of it is taken, which share is scattered,
        and how far ahead. Open one to see its particles and curves; change it to begin a set of your own.
      </p>
      <SetsTable sets={[...drafts.data, ...published.data]} />
    </Page>
  );
}
