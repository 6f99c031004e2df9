import type { DeskView } from '@siltlight/common/wire/desk';
import { Button } from '@fluentui/react-components';
import { PeopleSwap16Regular } from '@fluentui/react-icons';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { usePerson } from '../../shared/api/session';
import { EmptyState } from '../../shared/feedback/empty-state';
import { Figure } from '../../shared/figure/figure';
import { formatWaits } from '../../shared/number/time';
import { StateTag } from '../../shared/page/state-tag';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import { FindingCount } from './counts';

type Queued = DeskView['queue'][number];
const filters = { all: 'All', mine: 'Mine', errors: 'With errors' } as const;
type FilterName = keyof typeof filters;

const tests: Record<FilterName, (row: Queued, personId: string) => boolean> = {
  all: () => true,
  mine: (row, personId) => row.reviewer?.id === personId,
  errors: (row) => row.counts.errors > 0,
};

/** Submissions to vet, oldest first; one's own are decided by another steward. */
export function QueueTable({ queue }: { queue: DeskView['queue'] }) {
  const person = usePerson();
  const [filter, setFilter] = useState<FilterName>('all');
  const shown = queue.filter((row) => tests[filter](row, person.id));
  return (
    <Figure
      plain
      title="To vet"
      sub="oldest first"
      controls={
        <div className="sl-chips" role="group" aria-label="Show">
          {(Object.keys(filters) as FilterName[]).map((name) => (
            <Button
              key={name}
              size="small"
              shape="circular"
              appearance={filter === name ? 'primary' : 'outline'}
              aria-pressed={filter === name}
              onClick={() => setFilter(name)}
            >
              {filters[name]} {queue.filter((row) => tests[name](row, person.id)).length}
            </Button>
          ))}
        </div>
      }
    >
      <DataTable
        bare
        roomy
        caption="Submissions to vet"
        columns={columnsFor(person.id)}
        rows={shown}
        rowKey={(row) => row.id}
        startSort="waits"
        startDescending
        empty={
          <EmptyState title="Nothing to vet.">
            Submissions appear here as soon as somebody sends one.
          </EmptyState>
        }
      />
    </Figure>
  );
}

const hoursSince = (iso: string) => (Date.now() - Date.parse(iso)) / 3_600_000;

const columnsFor = (personId: string): DataColumn<Queued>[] => [
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
    id: 'from',
    header: 'From',
    value: (row) => row.contributor.initials,
    cell: (row) => <span title={row.contributor.name}>{row.contributor.initials}</span>,
  },
  {
    id: 'waits',
    header: 'Waits',
    align: 'right',
    value: (row) => hoursSince(row.waitsSince),
    cell: (row) => formatWaits(row.waitsSince),
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
  },
  {
    id: 'state',
    header: 'State',
    value: (row) => row.state,
    cell: (row) => <StateTag state={row.state} />,
    wideOnly: true,
  },
  {
    id: 'act',
    header: '',
    align: 'right',
    sortable: false,
    screenOnly: true,
    wideOnly: true,
    value: () => null,
    cell: (row) =>
      row.own ? (
        <span className="desk-hint">
          <PeopleSwap16Regular aria-hidden />
          yours: another steward decides
        </span>
      ) : row.reviewer?.id === personId ? (
        <span className="sl-small sl-muted">on your desk</span>
      ) : (
        <Link to={`/intake/${row.id}`} aria-label={`Open ${row.number}`} className="sl-small">
          Open
        </Link>
      ),
  },
];
