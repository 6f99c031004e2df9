import type { SliceDetail } from '@siltlight/common/wire/slices';
import { Link } from 'react-router-dom';
import { Figure } from '../../shared/figure/figure';
import { Amount } from '../../shared/number/amount';
import { formatDate } from '../../shared/number/time';
import { ForcingUnit } from '../../shared/number/unit';
import { StateTag } from '../../shared/page/state-tag';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';

type EstimateRow = SliceDetail['estimates'][number];

const columns: DataColumn<EstimateRow>[] = [
  {
    id: 'title',
    header: 'Estimate',
    value: (row) => row.title,
    cell: (row) => (
      <Link to={`/estimates/${row.id}`} className="slice-name">
        {row.title}
      </Link>
    ),
  },
  {
    id: 'net',
    header: 'Net, 5–95 %',
    unit: 'W m-2',
    heading: (
      <>
        Net, 5–95 %, <ForcingUnit />
      </>
    ),
    value: (row) => row.netWm2?.value,
    cell: (row) => <Amount of={row.netWm2} bare />,
    align: 'right',
  },
  {
    id: 'state',
    header: 'State',
    value: (row) => row.state,
    cell: (row) => (
      <StateTag state={row.stale ? 'stale' : row.state} word={row.stale ? undefined : wordOf(row.state)} />
    ),
  },
  {
    id: 'when',
    header: 'Asked for',
    value: (row) => row.createdAt,
    cell: (row) => <span className="sl-unit">{formatDate(row.createdAt)}</span>,
    wideOnly: true,
  },
];

const wordOf = (state: string) => (state === 'computed' ? 'Awaits sign-off' : undefined);

/** Estimates that rest on fields of the slice. */
export function SliceEstimates({ estimates }: { estimates: EstimateRow[] }) {
  return (
    <Figure plain title="Estimates" sub="against its reference">
      <DataTable
        bare
        caption="Estimates"
        columns={columns}
        rows={estimates}
        rowKey={(row) => row.id}
        startSort="when"
        startDescending
        empty={
          <p className="sl-13 sl-muted">None yet. Build a field, then start an estimate from its page.</p>
        }
      />
    </Figure>
  );
}
