import type { MailSummary } from '@siltlight/common/wire/mailbox';
import { Button } from '@fluentui/react-components';
import { useInfiniteQuery, useQuery, type QueryClient } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { MailText } from '../features/mailbox/mail-text';
import { mailboxQuery, mailQuery } from '../features/mailbox/queries';
import { useHasRole } from '../shared/api/session';
import { EmptyState } from '../shared/feedback/empty-state';
import { ErrorState } from '../shared/feedback/error-state';
import { LoadingRows } from '../shared/feedback/loading';
import { formatAgo, formatDateTime } from '../shared/number/time';
import { Page } from '../shared/page/page';
import type { DataColumn } from '../shared/table/column';
import { DataTable } from '../shared/table/data-table';
import '../features/mailbox/mailbox.css';

export const loader = (client: QueryClient) => () => client.ensureInfiniteQueryData(mailboxQuery);

const columns: DataColumn<MailSummary>[] = [
  { id: 'subject', header: 'Subject', value: (mail) => mail.subject, cell: (mail) => <b>{mail.subject}</b> },
  { id: 'to', header: 'To', value: (mail) => mail.to, wideOnly: true },
  {
    id: 'at',
    header: 'Received',
    align: 'right',
    value: (mail) => mail.receivedAt,
    cell: (mail) => formatAgo(mail.receivedAt),
  },
];

export default function Mailbox() {
  const [params, setParams] = useSearchParams();
  const all = useHasRole('administrator');
  const { data, hasNextPage, fetchNextPage, isFetchingNextPage } = useInfiniteQuery(mailboxQuery);
  const mails = data?.pages.flatMap((page) => page.items) ?? [];
  const picked = params.get('mail') ?? mails[0]?.id ?? null;
  const pick = (mail: MailSummary) => {
    const next = new URLSearchParams(params);
    next.set('mail', mail.id);
    setParams(next, { preventScrollReset: true });
  };
  return (
    <Page
      title="Mailbox"
      crumbs={[{ label: 'Mailbox' }]}
      sub={
        all
          ? 'all mail of this demo; none of it leaves the machine'
          : 'mail to you; none of it leaves the machine'
      }
    >
      <div className="mailbox">
        <div>
          <DataTable
            roomy
            filterable
            caption="Mail"
            address="mail-"
            columns={columns}
            rows={mails}
            rowKey={(mail) => mail.id}
            selectedKey={picked}
            onSelect={pick}
            empty={
              <EmptyState title="No mail yet.">
                Submitting, deciding, inviting and signing off send mail; it arrives here.
              </EmptyState>
            }
          />
          {hasNextPage && (
            <Button size="small" disabled={isFetchingNextPage} onClick={() => void fetchNextPage()}>
              Older mail
            </Button>
          )}
        </div>
        {picked && <OpenMail id={picked} />}
      </div>
    </Page>
  );
}

function OpenMail({ id }: { id: string }) {
  const { data: mail, error, refetch } = useQuery(mailQuery(id));
  if (error) return <ErrorState error={error} retry={() => void refetch()} />;
  if (!mail) return <LoadingRows label="Loading the mail" />;
  return (
    <article aria-label={mail.subject}>
      <header className="mail-head">
        <h2>{mail.subject}</h2>
        <p className="sl-small sl-muted">
          from {mail.from} to {mail.to}, {formatDateTime(mail.receivedAt)}
        </p>
      </header>
      <MailText text={mail.text} />
    </article>
  );
}
