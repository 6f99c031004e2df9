import type { AccessTokenView } from '@siltlight/common/wire/auth';
import { Button } from '@fluentui/react-components';
import { useMutation, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { ConfirmDialog } from '../../shared/feedback/confirm-dialog';
import { EmptyState } from '../../shared/feedback/empty-state';
import { ErrorState } from '../../shared/feedback/error-state';
import { formatAgo, formatDate } from '../../shared/number/time';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import { revokeToken, tokensQuery } from './queries';

export function TokensTable() {
  const client = useQueryClient();
  const { data: tokens } = useSuspenseQuery(tokensQuery);
  const [asked, setAsked] = useState<AccessTokenView | null>(null);
  const revoke = useMutation({
    mutationFn: revokeToken,
    onSettled: () => client.invalidateQueries({ queryKey: tokensQuery.queryKey }),
  });
  const columns: DataColumn<AccessTokenView>[] = [
    { id: 'name', header: 'Name', value: (row) => row.name, cell: (row) => <b>{row.name}</b> },
    { id: 'scopes', header: 'Scopes', value: (row) => row.scopes.join(', ') },
    {
      id: 'expires',
      header: 'Ends',
      value: (row) => row.expiresAt,
      cell: (row) => formatDate(row.expiresAt),
    },
    {
      id: 'used',
      header: 'Last used',
      value: (row) => row.lastUsedAt,
      cell: (row) => (row.lastUsedAt ? formatAgo(row.lastUsedAt) : 'never'),
      wideOnly: true,
    },
    {
      id: 'act',
      header: '',
      align: 'right',
      sortable: false,
      screenOnly: true,
      value: () => null,
      cell: (row) => (
        <Button size="small" aria-label={`Revoke ${row.name}`} onClick={() => setAsked(row)}>
          Revoke
        </Button>
      ),
    },
  ];
  return (
    <>
      {revoke.error && <ErrorState error={revoke.error} />}
      <DataTable
        bare
        caption="Access tokens"
        columns={columns}
        rows={tokens}
        rowKey={(row) => row.id}
        empty={
          <EmptyState title="No token yet.">
            A token lets a script read or write in your name, without your password.
          </EmptyState>
        }
      />
      <ConfirmDialog
        open={asked !== null}
        title={`Revoke ${asked?.name ?? ''}?`}
        act="Revoke"
        onClose={() => setAsked(null)}
        onAct={() => {
          if (asked) revoke.mutate(asked.id);
          setAsked(null);
        }}
      >
        Scripts that use it are refused at once. It cannot be brought back; you can make a new one.
      </ConfirmDialog>
    </>
  );
}
