import type { LedgerEntryView } from '@siltlight/common/wire/ledger';
import { Button, Input } from '@fluentui/react-components';
import { useInfiniteQuery, type QueryClient } from '@tanstack/react-query';
import type { LoaderFunctionArgs } from 'react-router-dom';
import { useSearchParams } from 'react-router-dom';
import { EntryDetail } from '../features/ledger/entry-detail';
import { useLedgerCheck } from '../features/ledger/ledger-check';
import { ledgerFilterOf, ledgerQuery, type LedgerFilter } from '../features/ledger/queries';
import { EmptyState } from '../shared/feedback/empty-state';
import { FormField } from '../shared/form/form-field';
import { formatDateTime } from '../shared/number/time';
import { Page } from '../shared/page/page';
import type { DataColumn } from '../shared/table/column';
import { DataTable } from '../shared/table/data-table';
import '../features/ledger/ledger.css';

export const loader =
  (client: QueryClient) =>
  ({ request }: LoaderFunctionArgs) =>
    client.ensureInfiniteQueryData(ledgerQuery(ledgerFilterOf(new URL(request.url).searchParams)));

const columns: DataColumn<LedgerEntryView>[] = [
  { id: 'position', header: 'Row', align: 'right', value: (row) => row.position },
  {
    id: 'at',
    header: 'When',
    value: (row) => row.at,
    cell: (row) => <span className="sl-unit">{formatDateTime(row.at)}</span>,
    wideOnly: true,
  },
  { id: 'who', header: 'Who', value: (row) => row.actor?.name ?? 'the service' },
  { id: 'verb', header: 'Act', value: (row) => row.verb, wideOnly: true },
  { id: 'object', header: 'Object', value: (row) => row.objectTitle ?? row.objectKind, wideOnly: true },
  { id: 'summary', header: 'What', value: (row) => row.summary },
];

const fields: [keyof LedgerFilter, string][] = [
  ['verb', 'Act'],
  ['objectKind', 'Kind of object'],
  ['objectId', 'Object'],
];

export default function Ledger() {
  const [params, setParams] = useSearchParams();
  const filter = ledgerFilterOf(params);
  const { data, hasNextPage, fetchNextPage, isFetchingNextPage } = useInfiniteQuery(ledgerQuery(filter));
  const { button, outcome } = useLedgerCheck();
  const rows = data?.pages.flatMap((page) => page.items) ?? [];
  const picked = rows.find((row) => String(row.position) === params.get('row')) ?? rows[0];
  const set = (name: string, value: string) =>
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
      title="Ledger"
      crumbs={[{ label: 'Ledger' }]}
      sub={`who did what to which object, ${data?.pages[0]?.total ?? 0} rows`}
      actions={button}
    >
      {outcome}
      <div className="ledger-bar">
        {fields.map(([name, label]) => (
          <FormField key={name} name={name} label={label}>
            <Input
              size="small"
              value={params.get(name) ?? ''}
              onChange={(_, change) => set(name, change.value)}
            />
          </FormField>
        ))}
      </div>
      <div className="ledger">
        <div>
          <DataTable
            filterable
            caption="Acts"
            address="acts-"
            heightPx={640}
            columns={columns}
            rows={rows}
            rowKey={(row) => String(row.position)}
            selectedKey={picked ? String(picked.position) : null}
            onSelect={(row) => set('row', String(row.position))}
            empty={
              <EmptyState title="No act fits.">Clear a field above to see more of the ledger.</EmptyState>
            }
          />
          {hasNextPage && (
            <Button size="small" disabled={isFetchingNextPage} onClick={() => void fetchNextPage()}>
              Older acts
            </Button>
          )}
        </div>
        {picked && <EntryDetail entry={picked} />}
      </div>
    </Page>
  );
}
