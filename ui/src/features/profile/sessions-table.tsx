import type { SessionView } from '@siltlight/common/wire/auth';
import { Button } from '@fluentui/react-components';
import { useMutation, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { ErrorState } from '../../shared/feedback/error-state';
import { formatAgo, formatDateTime } from '../../shared/number/time';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import { browserWords } from './browser-words';
import { endOtherSession, sessionsQuery } from './queries';

/** Where one is signed in; any other session can be ended from here. */
export function SessionsTable() {
  const client = useQueryClient();
  const { data: sessions } = useSuspenseQuery(sessionsQuery);
  const end = useMutation({
    mutationFn: endOtherSession,
    onSettled: () => client.invalidateQueries({ queryKey: sessionsQuery.queryKey }),
  });
  const columns: DataColumn<SessionView>[] = [
    {
      id: 'browser',
      header: 'Browser',
      value: (row) => browserWords(row.browser),
      cell: (row) => <span title={row.browser}>{browserWords(row.browser)}</span>,
    },
    {
      id: 'address',
      header: 'Address',
      value: (row) => row.address,
      cell: (row) => <span className="sl-unit">{row.address}</span>,
      wideOnly: true,
    },
    {
      id: 'since',
      header: 'Signed in',
      value: (row) => row.createdAt,
      cell: (row) => <span className="sl-unit">{formatDateTime(row.createdAt)}</span>,
      wideOnly: true,
    },
    {
      id: 'seen',
      header: 'Last seen',
      value: (row) => row.lastSeenAt,
      cell: (row) => formatAgo(row.lastSeenAt),
    },
    {
      id: 'act',
      header: '',
      align: 'right',
      sortable: false,
      screenOnly: true,
      value: () => null,
      cell: (row) =>
        row.current ? (
          <span className="sl-small sl-muted">this one</span>
        ) : (
          <Button
            size="small"
            disabled={end.isPending}
            aria-label={`End the session of ${browserWords(row.browser)}`}
            onClick={() => end.mutate(row.id)}
          >
            End
          </Button>
        ),
    },
  ];
  return (
    <>
      {end.error && <ErrorState error={end.error} />}
      <DataTable
        bare
        caption="Sessions"
        columns={columns}
        rows={sessions}
        rowKey={(row) => row.id}
        empty={null}
      />
    </>
  );
}
