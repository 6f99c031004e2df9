import { Button, Select } from '@fluentui/react-components';
import { Add20Regular } from '@fluentui/react-icons';
import { useInfiniteQuery, useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useNavigate, useSearchParams, type LoaderFunctionArgs } from 'react-router-dom';
import { estimateStates } from '../features/estimates/estimate-state';
import { EstimatesTable } from '../features/estimates/estimates-table';
import { estimatesQuery, filterOf } from '../features/estimates/queries';
import '../features/estimates/estimates.css';
import { slicesQuery } from '../features/slices/queries';
import { useHasRole } from '../shared/api/session';
import { ErrorState } from '../shared/feedback/error-state';
import { LoadingRows } from '../shared/feedback/loading';
import { FormField } from '../shared/form/form-field';
import { counted } from '../shared/number/format';
import { Page } from '../shared/page/page';

export const loader =
  (client: QueryClient) =>
  ({ request }: LoaderFunctionArgs) =>
    Promise.all([
      client.ensureInfiniteQueryData(estimatesQuery(filterOf(new URL(request.url).searchParams))),
      client.ensureQueryData(slicesQuery),
    ]);

export default function Estimates() {
  const [params, setParams] = useSearchParams();
  const filter = filterOf(params);
  const list = useInfiniteQuery(estimatesQuery(filter));
  const { data: slices } = useSuspenseQuery(slicesQuery);
  const navigate = useNavigate();
  const isScientist = useHasRole('scientist');
  const rows = list.data?.pages.flatMap((page) => page.items) ?? [];
  const set = (name: 'slice' | 'state', value: string) =>
    setParams(
      (before) => {
        const next = new URLSearchParams(before);
        if (value) next.set(name, value);
        else next.delete(name);
        return next;
      },
      { replace: true, preventScrollReset: true },
    );
  return (
    <Page
      title="Estimates"
      crumbs={[{ label: 'Estimates' }]}
      sub={counted(list.data?.pages[0]?.total ?? 0, 'estimate')}
      actions={
        isScientist && (
          <Button
            appearance="primary"
            icon={<Add20Regular />}
            onClick={() => void navigate('/estimates/new')}
          >
            New estimate
          </Button>
        )
      }
    >
      <div className="estimate-bar">
        <FormField name="slice" label="Slice">
          <Select size="small" value={filter.slice ?? ''} onChange={(_, data) => set('slice', data.value)}>
            <option value="">All slices</option>
            {slices.map((slice) => (
              <option key={slice.slug} value={slice.slug}>
                {slice.name}
              </option>
            ))}
          </Select>
        </FormField>
        <FormField name="state" label="State">
          <Select size="small" value={filter.state ?? ''} onChange={(_, data) => set('state', data.value)}>
            <option value="">All states</option>
            {Object.entries(estimateStates).map(([state, word]) => (
              <option key={state} value={state}>
                {word}
              </option>
            ))}
          </Select>
        </FormField>
      </div>
      {list.isError && <ErrorState error={list.error} retry={() => void list.refetch()} />}
      {list.isLoading ? (
        <LoadingRows />
      ) : (
        !list.isError && <EstimatesTable estimates={rows} filtered={Boolean(filter.slice ?? filter.state)} />
      )}
      {list.hasNextPage && (
        <Button size="small" disabled={list.isFetchingNextPage} onClick={() => void list.fetchNextPage()}>
          Older estimates
        </Button>
      )}
    </Page>
  );
}
