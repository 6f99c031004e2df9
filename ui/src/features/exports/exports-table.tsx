import type { ExportSummary } from '@siltlight/common/wire/exports';
import { Link } from 'react-router-dom';
import { EmptyState } from '../../shared/feedback/empty-state';
import { formatBytes } from '../../shared/number/format';
import { formatDateTime } from '../../shared/number/time';
import { StateTag } from '../../shared/page/state-tag';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import { exportFileAddress, exportFormats } from './queries';

const columns: DataColumn<ExportSummary>[] = [
  {
    id: 'file',
    header: 'File',
    value: (row) => row.fileName ?? row.title,
    cell: (row) =>
      row.state === 'done' ? (
        <a href={exportFileAddress(row.id)} download={row.fileName ?? undefined}>
          {row.fileName ?? row.title}
        </a>
      ) : (
        <b>{row.title}</b>
      ),
  },
  { id: 'format', header: 'Format', value: (row) => exportFormats[row.format].name, wideOnly: true },
  {
    id: 'estimate',
    header: 'Estimate',
    value: (row) => row.estimateTitle,
    cell: (row) => <Link to={`/estimates/${row.estimateId}`}>{row.estimateTitle}</Link>,
    wideOnly: true,
  },
  {
    id: 'size',
    header: 'Size',
    value: (row) => row.bytes,
    cell: (row) => (row.bytes === null ? '–' : <span className="sl-unit">{formatBytes(row.bytes)}</span>),
    align: 'right',
  },
  {
    id: 'sha',
    header: 'SHA-256',
    value: (row) => row.sha256,
    cell: (row) =>
      row.sha256 ? (
        <code className="export-sum" title={row.sha256}>
          {row.sha256.slice(0, 12)}…
        </code>
      ) : (
        '–'
      ),
    wideOnly: true,
  },
  { id: 'state', header: 'State', value: (row) => row.state, cell: (row) => <StateTag state={row.state} /> },
  {
    id: 'when',
    header: 'Asked for',
    value: (row) => row.createdAt,
    cell: (row) => (
      <span className="sl-unit" title={row.createdBy.name}>
        {formatDateTime(row.createdAt)}, {row.createdBy.initials}
      </span>
    ),
    wideOnly: true,
  },
];

type Props = { files: ExportSummary[]; selected: string | null; onSelect: (file: ExportSummary) => void };

/** Files that were asked for, newest first; a row picks the file the snippet fetches. */
export const ExportsTable = ({ files, selected, onSelect }: Props) => (
  <DataTable
    roomy
    filterable
    caption="Files"
    sub="a row shows how to fetch it from a script"
    address="files-"
    columns={columns}
    rows={files}
    rowKey={(row) => row.id}
    selectedKey={selected}
    onSelect={onSelect}
    empty={
      <EmptyState
        title="Nothing exported yet."
        action={<Link to="/estimates">Open the estimates</Link>}
        after={
          <>
            Or fetch from a script: <Link to="/profile">make a token</Link>
          </>
        }
      >
        Pick an estimate, then “Export”. The file is made as a job and kept with its checksum.
      </EmptyState>
    }
  />
);
