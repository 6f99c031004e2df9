import { useQuery, useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { slicesQuery } from '../features/slices/queries';
import { SlicesTable } from '../features/slices/slices-table';
import '../features/slices/slices.css';
import { columnQuery } from '../features/strata/queries';
import { Page } from '../shared/page/page';

export const loader = (client: QueryClient) => () => client.ensureQueryData(slicesQuery);

export default function Slices() {
  const { data: slices } = useSuspenseQuery(slicesQuery);
  const { data: column = [] } = useQuery(columnQuery);
  return (
    <Page title="Time slices" crumbs={[{ label: 'Slices' }]} sub="youngest first">
      <p className="slice-times">
        A slice has two times that are easily taken for one: an evidence window, within which samples of
        records count, and a single age for orbit and gases.
      </p>
      <SlicesTable slices={slices} column={column} />
    </Page>
  );
}
