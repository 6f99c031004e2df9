import type { EstimateSummary } from '@siltlight/common/wire/estimates';
import { Link } from 'react-router-dom';
import { EmptyState } from '../../shared/feedback/empty-state';
import { Amount } from '../../shared/number/amount';
import { formatDate } from '../../shared/number/time';
import { ForcingUnit } from '../../shared/number/unit';
import { sliceWithin } from '../../shared/page/slice-name';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import { EstimateState } from './estimate-state';
import { methodName } from './method-words';

const columns: DataColumn<EstimateSummary>[] = [
  {
    id: 'slice',
    header: 'Slice',
    value: (row) => row.sliceName,
    cell: (row) => (
      <Link to={`/estimates/${row.id}`} className="estimate-name">
        {row.sliceName} against {sliceWithin(row.referenceName)}
      </Link>
    ),
  },
  { id: 'run', header: 'Run', value: (row) => row.runNumber, align: 'right', wideOnly: true },
  { id: 'title', header: 'Title', value: (row) => row.title, wideOnly: true },
  { id: 'method', header: 'Method', value: (row) => methodName(row.method), wideOnly: true },
  {
    id: 'net',
    header: 'Net',
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
  { id: 'state', header: 'State', value: (row) => row.state, cell: (row) => <EstimateState of={row} /> },
  {
    id: 'by',
    header: 'By',
    value: (row) => row.createdBy.name,
    wideOnly: true,
  },
  {
    id: 'when',
    header: 'Asked for',
    value: (row) => row.createdAt,
    cell: (row) => <span className="sl-unit">{formatDate(row.createdAt)}</span>,
    wideOnly: true,
  },
];

/** Estimates that fit the filter, newest first. */
export function EstimatesTable({ estimates, filtered }: { estimates: EstimateSummary[]; filtered: boolean }) {
  return (
    <DataTable
      roomy
      filterable
      caption="Estimates"
      sub="direct forcing, top of atmosphere, all sky, slice minus reference"
      address="estimates-"
      columns={columns}
      rows={estimates}
      rowKey={(row) => row.id}
      empty={
        filtered ? (
          <EmptyState title="No estimate fits.">Choose another slice or state above.</EmptyState>
        ) : (
          <EmptyState title="No estimate yet." action={<Link to="/slices">Open the slices</Link>}>
            Pick a slice, build a field from its records, then start an estimate from the field.
          </EmptyState>
        )
      }
    />
  );
}
