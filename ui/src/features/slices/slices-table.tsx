import type { ColumnSlice } from '@siltlight/common/wire/slices';
import { Link } from 'react-router-dom';
import { EmptyState } from '../../shared/feedback/empty-state';
import { formatForcing } from '../../shared/number/format';
import { ForcingUnit } from '../../shared/number/unit';
import { StateTag } from '../../shared/page/state-tag';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import type { ListedSlice } from './queries';
import { orbitalAgeText, windowText } from './slice-words';

type Row = ListedSlice & { latest: ColumnSlice | undefined; referenceName: string | null };

const columns: DataColumn<Row>[] = [
  {
    id: 'name',
    header: 'Slice',
    value: (row) => row.name,
    cell: (row) => (
      <Link to={`/slices/${row.slug}`} className="slice-name">
        {row.name}
      </Link>
    ),
  },
  { id: 'label', header: 'Short', value: (row) => row.label, wideOnly: true },
  {
    id: 'window',
    header: 'Evidence window',
    value: (row) => row.windowYoungKa,
    cell: (row) => <span className="sl-unit">{windowText(row)}</span>,
    align: 'right',
  },
  {
    id: 'orbit',
    header: 'Orbit and gases at',
    value: (row) => row.orbitalAgeKa,
    cell: (row) => <span className="sl-unit">{orbitalAgeText(row)}</span>,
    align: 'right',
    wideOnly: true,
  },
  { id: 'reference', header: 'Against', value: (row) => row.referenceName, wideOnly: true },
  {
    id: 'kind',
    header: 'Rests on',
    value: (row) => (row.kind === 'scenario' ? 'scenario, no records' : 'from records'),
    wideOnly: true,
  },
  {
    id: 'net',
    header: 'Latest net forcing',
    unit: 'W m-2',
    heading: (
      <>
        Latest net, <ForcingUnit />
      </>
    ),
    value: (row) => row.latest?.latestNetWm2,
    cell: (row) => <Latest of={row.latest} />,
    align: 'right',
  },
];

function Latest({ of }: { of: ColumnSlice | undefined }) {
  if (!of || of.latestNetWm2 === null) return <span className="sl-muted">no estimate yet</span>;
  return (
    <>
      {of.stale && <StateTag state="stale" />} <b>{formatForcing(of.latestNetWm2)}</b>
    </>
  );
}

/** All slices, youngest first, each with its window, its orbital age and its latest published estimate. */
export function SlicesTable({ slices, column }: { slices: ListedSlice[]; column: ColumnSlice[] }) {
  const names = new Map(slices.map((slice) => [slice.slug, slice.name]));
  const latest = new Map(column.map((slice) => [slice.slug, slice]));
  const rows = slices.map((slice) => ({
    ...slice,
    latest: latest.get(slice.slug),
    referenceName: slice.referenceSlug && (names.get(slice.referenceSlug) ?? slice.referenceSlug),
  }));
  return (
    <DataTable
      roomy
      filterable
      caption="Time slices"
      sub="ages in ka before 1950 CE"
      address="slices-"
      columns={columns}
      rows={rows}
      rowKey={(row) => row.slug}
      empty={<EmptyState title="No slice is published yet.">Slices come with the service.</EmptyState>}
    />
  );
}
