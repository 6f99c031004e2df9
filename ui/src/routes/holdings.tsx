import { Button } from '@fluentui/react-components';
import type { DatasetSummary } from '@siltlight/common/wire/datasets';
import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { Link, useNavigate } from 'react-router-dom';
import { datasetsQuery, shortSum } from '../features/holdings/queries';
import { archiveTitle, kindTitle } from '../features/holdings/wording';
import { useHasRole } from '../shared/api/session';
import { EmptyState } from '../shared/feedback/empty-state';
import { counted } from '../shared/number/format';
import { formatDate } from '../shared/number/time';
import { Page } from '../shared/page/page';
import { StateTag } from '../shared/page/state-tag';
import type { DataColumn } from '../shared/table/column';
import { DataTable } from '../shared/table/data-table';
import '../features/holdings/holdings.css';

export const loader = (client: QueryClient) => () => client.ensureQueryData(datasetsQuery);

const columns: DataColumn<DatasetSummary>[] = [
  {
    id: 'title',
    header: 'Dataset',
    value: (row) => row.title,
    cell: (row) => (
      <Link to={`/holdings/${row.slug}`} className="holdings-name">
        {row.title}
      </Link>
    ),
  },
  { id: 'kind', header: 'Holds', value: (row) => kindTitle(row.kind), wideOnly: true },
  { id: 'archive', header: 'Archive', value: (row) => archiveTitle(row.archive), wideOnly: true },
  { id: 'sites', header: 'Sites', align: 'right', value: (row) => row.siteCount },
  { id: 'samples', header: 'Samples', align: 'right', value: (row) => row.sampleCount },
  { id: 'licence', header: 'Licence', value: (row) => row.licence, wideOnly: true },
  {
    id: 'version',
    header: 'Version',
    align: 'right',
    value: (row) => row.latest.number,
    wideOnly: true,
  },
  {
    id: 'published',
    header: 'Published',
    align: 'right',
    value: (row) => row.latest.publishedAt,
    cell: (row) => (row.latest.publishedAt ? formatDate(row.latest.publishedAt) : '–'),
    wideOnly: true,
  },
  {
    id: 'checksum',
    header: 'sha-256',
    value: (row) => row.latest.checksum,
    cell: (row) => <span title={row.latest.checksum}>{shortSum(row.latest.checksum)}</span>,
    wideOnly: true,
  },
  {
    id: 'state',
    header: 'State',
    value: (row) => row.latest.state,
    cell: (row) => <StateTag state={row.latest.state} />,
  },
];

export default function Holdings() {
  const { data: datasets } = useSuspenseQuery(datasetsQuery);
  const navigate = useNavigate();
  const maySubmit = useHasRole('scientist', 'steward');
  const samples = datasets.reduce((sum, dataset) => sum + dataset.sampleCount, 0);
  return (
    <Page
      title="Holdings"
      crumbs={[{ label: 'Holdings' }]}
      sub={`${counted(datasets.length, 'dataset')}, ${counted(samples, 'sample')}, each version with its checksum`}
    >
      <DataTable
        roomy
        filterable={datasets.length > 0}
        caption="Datasets"
        address="data-"
        startSort="title"
        columns={columns}
        rows={datasets}
        rowKey={(row) => row.slug}
        empty={
          <EmptyState
            title="Nothing is held yet."
            action={
              maySubmit && (
                <Button appearance="primary" onClick={() => void navigate('/intake')}>
                  Open Intake
                </Button>
              )
            }
          >
            A submission that a steward approves becomes the first version of a dataset.
          </EmptyState>
        }
      />
    </Page>
  );
}
