import type { SliceDetail } from '@siltlight/common/wire/slices';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Figure } from '../../shared/figure/figure';
import { formatDate } from '../../shared/number/time';
import { StateTag } from '../../shared/page/state-tag';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';

type FieldRow = SliceDetail['fields'][number];

const ways: Record<string, string> = { 'regional-scaling': 'regional scaling' };

const columns: DataColumn<FieldRow>[] = [
  {
    id: 'title',
    header: 'Field',
    value: (row) => row.title,
    cell: (row) => (
      <Link to={`/fields/${row.versionId}`} className="slice-name">
        {row.title}
      </Link>
    ),
  },
  { id: 'way', header: 'How', value: (row) => ways[row.way] ?? row.way, wideOnly: true },
  { id: 'sites', header: 'Sites', value: (row) => row.siteCount, align: 'right' },
  {
    id: 'when',
    header: 'Built',
    value: (row) => row.createdAt,
    cell: (row) => (
      <span className="sl-unit" title={row.createdBy.name}>
        {formatDate(row.createdAt)}, {row.createdBy.initials}
      </span>
    ),
    wideOnly: true,
  },
  {
    id: 'state',
    header: 'State',
    value: (row) => (row.stale ? 'inputs superseded' : 'current'),
    cell: (row) => (row.stale ? <StateTag state="stale" /> : <StateTag state="published" word="Current" />),
  },
];

/** Fields built for a slice. */
export function FieldsTable({ fields, empty }: { fields: FieldRow[]; empty: ReactNode }) {
  return (
    <Figure plain title="Fields" sub="dust in the air of the slice, by region">
      <DataTable
        bare
        caption="Fields"
        columns={columns}
        rows={fields}
        rowKey={(row) => row.versionId}
        startSort="when"
        startDescending
        empty={empty}
      />
    </Figure>
  );
}
