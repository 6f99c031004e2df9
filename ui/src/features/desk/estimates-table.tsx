import type { EstimateSummary } from '@siltlight/common/wire/estimates';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Figure } from '../../shared/figure/figure';
import { decimalsForInterval, formatNumber } from '../../shared/number/format';
import { ForcingUnit } from '../../shared/number/unit';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';

type Props = {
  title: string;
  sub: string;
  estimates: EstimateSummary[];
  empty: ReactNode;
  note?: (row: EstimateSummary) => string | null;
};

/** Estimates with their net forcing; the interval is 5 to 95 %. */
export function EstimatesTable({ title, sub, estimates, empty, note }: Props) {
  const columns: DataColumn<EstimateSummary>[] = [
    {
      id: 'slice',
      header: 'Slice',
      value: (row) => row.sliceName,
      cell: (row) => (
        <Link to={`/estimates/${row.id}`} className="desk-name">
          {row.sliceName}
        </Link>
      ),
    },
    { id: 'run', header: 'Estimate', value: (row) => `run ${row.runNumber}`, wideOnly: true },
    note
      ? { id: 'note', header: 'What changed', value: note, wideOnly: true }
      : { id: 'by', header: 'By', value: (row) => row.createdBy.name, wideOnly: true },
    {
      id: 'net',
      header: 'Net, 5–95 %',
      unit: 'W m-2',
      heading: (
        <>
          Net, 5–95 %, <ForcingUnit />
        </>
      ),
      align: 'right',
      value: (row) => row.netWm2?.value,
      cell: (row) => <Net of={row.netWm2} />,
    },
  ];
  return (
    <Figure plain title={title} sub={sub}>
      <DataTable
        bare
        caption={title}
        columns={columns}
        rows={estimates}
        rowKey={(row) => row.id}
        empty={empty}
      />
    </Figure>
  );
}

function Net({ of }: { of: EstimateSummary['netWm2'] }) {
  if (!of) return <span className="sl-muted">–</span>;
  const { value, low, high } = of;
  if (low === null || high === null) return <b>{formatNumber(value, { decimals: 2, signed: true })}</b>;
  const decimals = Math.max(2, decimalsForInterval(low, high));
  const text = (one: number) => formatNumber(one, { decimals, signed: true });
  return (
    <>
      <b>{text(value)}</b>{' '}
      <span className="sl-muted">
        {text(low)} to {text(high)}
      </span>
    </>
  );
}
