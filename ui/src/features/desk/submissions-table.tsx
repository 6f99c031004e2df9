import type { DeskView } from '@siltlight/common/wire/desk';
import { Link } from 'react-router-dom';
import { EmptyState } from '../../shared/feedback/empty-state';
import { Figure } from '../../shared/figure/figure';
import { formatAgo } from '../../shared/number/time';
import { StateTag } from '../../shared/page/state-tag';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import { FindingCount } from './counts';

type Own = DeskView['mySubmissions'][number];

const columns: DataColumn<Own>[] = [
  {
    id: 'number',
    header: 'No.',
    value: (row) => row.number,
    cell: (row) => <span className="sl-muted">{row.number}</span>,
    wideOnly: true,
  },
  {
    id: 'title',
    header: 'Submission',
    value: (row) => row.title,
    cell: (row) => (
      <Link to={`/intake/${row.id}`} className="desk-name">
        {row.title}
      </Link>
    ),
  },
  {
    id: 'errors',
    header: 'Errors',
    align: 'right',
    value: (row) => row.counts.errors,
    cell: (row) => <FindingCount severity="error" count={row.counts.errors} />,
  },
  {
    id: 'warnings',
    header: 'Warnings',
    align: 'right',
    value: (row) => row.counts.warnings,
    cell: (row) => <FindingCount severity="warning" count={row.counts.warnings} />,
    wideOnly: true,
  },
  { id: 'state', header: 'State', value: (row) => row.state, cell: (row) => <StateTag state={row.state} /> },
  {
    id: 'when',
    header: 'Last step',
    align: 'right',
    value: (row) => lastStep(row),
    cell: (row) => formatAgo(lastStep(row)),
    wideOnly: true,
  },
];

const lastStep = (row: Own) => row.decidedAt ?? row.submittedAt ?? row.createdAt;

export function SubmissionsTable({ submissions }: { submissions: Own[] }) {
  return (
    <Figure plain title="Your submissions" sub="newest step first">
      <DataTable
        bare
        roomy
        caption="Your submissions"
        columns={columns}
        rows={submissions}
        rowKey={(row) => row.id}
        startSort="when"
        startDescending
        empty={
          <EmptyState
            title="You have not submitted anything yet."
            action={<Link to="/intake">Open Intake</Link>}
          >
            Drop a spreadsheet there; Siltlight proposes what its columns mean.
          </EmptyState>
        }
      />
    </Figure>
  );
}
