import type { SubmissionSummary } from '@siltlight/common/wire/submissions';
import { PeopleSwap16Regular } from '@fluentui/react-icons';
import { Link } from 'react-router-dom';
import { formatAgo } from '../../shared/number/time';
import { StateTag } from '../../shared/page/state-tag';
import type { DataColumn } from '../../shared/table/column';
import { SeverityIcon, type Severity } from './severity';

type Row = SubmissionSummary;
const lastStep = (row: Row) => row.decidedAt ?? row.submittedAt ?? row.createdAt;

function Count({ severity, count }: { severity: Severity; count: number }) {
  if (count === 0) return <span className="sl-muted">0</span>;
  return (
    <span className={`finding-count ${severity}`}>
      <SeverityIcon severity={severity} />
      {count}
    </span>
  );
}

const number: DataColumn<Row> = {
  id: 'number',
  header: 'No.',
  value: (row) => row.number,
  cell: (row) => <span className="sl-muted">{row.number}</span>,
  wideOnly: true,
};
const title: DataColumn<Row> = {
  id: 'title',
  header: 'Submission',
  value: (row) => row.title,
  cell: (row) => (
    <>
      <Link to={`/intake/${row.id}`} className="intake-name">
        {row.title}
      </Link>
      <span className="sl-small sl-muted intake-file">{row.fileName}</span>
    </>
  ),
};
const from: DataColumn<Row> = {
  id: 'from',
  header: 'From',
  value: (row) => row.contributor.name,
  wideOnly: true,
};
const counts: DataColumn<Row>[] = [
  { id: 'rows', header: 'Rows', align: 'right', value: (row) => row.counts.usableRows, wideOnly: true },
  {
    id: 'errors',
    header: 'Errors',
    align: 'right',
    value: (row) => row.counts.errors,
    cell: (row) => <Count severity="error" count={row.counts.errors} />,
  },
  {
    id: 'warnings',
    header: 'Warnings',
    align: 'right',
    value: (row) => row.counts.openWarnings,
    cell: (row) => <Count severity="warning" count={row.counts.openWarnings} />,
    wideOnly: true,
  },
];
const state: DataColumn<Row> = {
  id: 'state',
  header: 'State',
  value: (row) => row.state,
  cell: (row) => <StateTag state={row.state} />,
};
const when: DataColumn<Row> = {
  id: 'when',
  header: 'Last step',
  align: 'right',
  value: lastStep,
  cell: (row) => formatAgo(lastStep(row)),
  wideOnly: true,
};

export const ownColumns = [number, title, ...counts, state, when];

/** The queue names its reviewer, and says of one's own that another steward decides. */
export const stewardColumns = (personId: string): DataColumn<Row>[] => [
  number,
  title,
  from,
  ...counts,
  state,
  {
    id: 'reviewer',
    header: 'With',
    value: (row) => (row.contributor.id === personId ? 'yours' : (row.reviewer?.name ?? '')),
    cell: (row) =>
      row.contributor.id === personId ? (
        <span className="intake-yours">
          <PeopleSwap16Regular aria-hidden />
          yours: another steward decides
        </span>
      ) : (
        (row.reviewer?.name ?? <span className="sl-muted">nobody yet</span>)
      ),
    wideOnly: true,
  },
  when,
];
