import { Button } from '@fluentui/react-components';
import { ArrowDownload20Regular } from '@fluentui/react-icons';
import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useParams, useSearchParams, type LoaderFunctionArgs } from 'react-router-dom';
import { cellsQuery, datasetQuery, pathOfVersion, versionFile } from '../features/holdings/queries';
import { SourceGrid } from '../features/holdings/source-grid';
import { Page } from '../shared/page/page';
import '../features/holdings/holdings.css';

function askedOf(params: URLSearchParams) {
  const row = Number(params.get('row'));
  return {
    sheet: params.get('sheet') ?? '',
    row: Number.isInteger(row) && row > 0 ? row : 1,
    column: /^[A-Z]{1,3}$/.exec(params.get('column')?.toUpperCase() ?? '')?.[0] ?? 'A',
  };
}

export const loader =
  (client: QueryClient) =>
  ({ params, request }: LoaderFunctionArgs) => {
    const { sheet, row } = askedOf(new URL(request.url).searchParams);
    const number = Number(params.number);
    return Promise.all([
      client.ensureQueryData(datasetQuery(params.slug!, number)),
      client.ensureQueryData(cellsQuery(params.slug!, number, sheet, row)),
    ]);
  };

/** The last step of a trace: the very cells of the file that a number comes from. */
export default function HoldingsCells() {
  const { slug, number } = useParams();
  const [params] = useSearchParams();
  const { sheet, row, column } = askedOf(params);
  const version = Number(number);
  const { data: detail } = useSuspenseQuery(datasetQuery(slug!, version));
  const { data: source } = useSuspenseQuery(cellsQuery(slug!, version, sheet, row));
  return (
    <Page
      title={`${column}${row} of ${source.fileName}`}
      crumbs={[
        { label: 'Holdings', to: '/holdings' },
        { label: detail.title, to: `/holdings/${slug}` },
        { label: `Version ${version}`, to: pathOfVersion(slug!, version) },
        { label: 'Cells of the file' },
      ]}
      sub={<span title={`sha-256 ${source.sha256}`}>sheet “{source.sheet}” · as it was sent</span>}
      actions={
        <Button
          as="a"
          appearance="primary"
          icon={<ArrowDownload20Regular />}
          href={versionFile(slug!, version, 'file')}
          download
        >
          Download the file
        </Button>
      }
    >
      <SourceGrid source={source} row={row} column={column} />
      <p className="sl-small sl-muted source-sum">
        {source.fileName}, sha-256 {source.sha256}
      </p>
    </Page>
  );
}
