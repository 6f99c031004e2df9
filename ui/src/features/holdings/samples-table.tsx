import { Button, Select } from '@fluentui/react-components';
import type { DatasetVersionDetail, SampleView } from '@siltlight/common/wire/datasets';
import { useInfiniteQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { ErrorState } from '../../shared/feedback/error-state';
import { LoadingRows } from '../../shared/feedback/loading';
import { Digits } from '../../shared/number/digits';
import { Unit } from '../../shared/number/unit';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import { pathOfVersion, samplesQuery } from './queries';

type Props = {
  slug: string;
  number: number;
  sites: DatasetVersionDetail['sites'];
  site: string;
  onSite: (site: string) => void;
};

/** Samples of the version in the order of the file; more are fetched as they are wanted. */
export function SamplesTable({ slug, number, sites, site, onSite }: Props) {
  const { data, error, refetch, hasNextPage, fetchNextPage, isFetchingNextPage } = useInfiniteQuery(
    samplesQuery(slug, number, site),
  );
  const rows = data?.pages.flatMap((page) => page.items) ?? [];
  const total = data?.pages[0]?.total ?? 0;
  return (
    <section aria-label="Samples" className="samples">
      <div className="samples-bar">
        <Select
          size="small"
          aria-label="Samples of which site"
          value={site}
          onChange={(_, picked) => onSite(picked.value)}
        >
          <option value="">all sites</option>
          {sites.map((one) => (
            <option key={one.site} value={one.site}>
              {one.site}
            </option>
          ))}
        </Select>
      </div>
      {error && !data && <ErrorState error={error} retry={() => void refetch()} />}
      {!error && !data && <LoadingRows rows={8} label="Loading the samples" />}
      {data && (
        <DataTable
          caption="Samples"
          sub={rows.length < total ? `${rows.length} of ${total}` : `${total}`}
          address="samples-"
          heightPx={340}
          columns={columnsFor(slug, number)}
          rows={rows}
          rowKey={(sample) => sample.id}
          empty={<p className="sl-13 sl-muted">No sample of this site is in the version.</p>}
        />
      )}
      {hasNextPage && (
        <Button size="small" disabled={isFetchingNextPage} onClick={() => void fetchNextPage()}>
          Load more samples
        </Button>
      )}
    </section>
  );
}

/** The cell of the value leads to the spreadsheet; "F12" gives its column. */
const columnOfCell = (cell: string | null | undefined) => /^[A-Z]+/.exec(cell ?? '')?.[0] ?? 'A';

export function sourcePath(
  slug: string,
  number: number,
  sample: Pick<SampleView, 'sheet' | 'row' | 'cells'>,
): string {
  const value = sample.cells.fluxGM2Yr ?? sample.cells.concentrationNgG ?? Object.values(sample.cells)[0];
  const params = new URLSearchParams({
    sheet: sample.sheet,
    row: String(sample.row),
    column: columnOfCell(value?.cell),
  });
  return `${pathOfVersion(slug, number)}/cells?${params}`;
}

const columnsFor = (slug: string, number: number): DataColumn<SampleView>[] => [
  { id: 'site', header: 'Site', value: (sample) => sample.site },
  {
    id: 'depth',
    header: 'Depth',
    unit: 'm',
    heading: 'Depth, m',
    align: 'right',
    value: (sample) => sample.depthM,
    cell: (sample) => <Digits value={sample.depthM} decimals={2} />,
    wideOnly: true,
  },
  {
    id: 'age',
    header: 'Age',
    unit: 'ka BP',
    heading: 'Age, ka BP',
    align: 'right',
    value: (sample) => sample.ageKaBp,
    cell: (sample) => <Digits value={sample.ageKaBp} decimals={3} />,
  },
  {
    id: 'flux',
    header: 'Dust flux',
    unit: 'g m-2 yr-1',
    heading: (
      <>
        Dust flux, <Unit of="g m-2 yr-1" />
      </>
    ),
    align: 'right',
    value: (sample) => sample.fluxGM2Yr,
    cell: (sample) => <Digits value={sample.fluxGM2Yr} figures={4} />,
  },
  {
    id: 'sigma',
    header: 'Standard error',
    unit: 'g m-2 yr-1',
    align: 'right',
    value: (sample) => sample.fluxSigmaGM2Yr,
    cell: (sample) => <Digits value={sample.fluxSigmaGM2Yr} figures={2} />,
    wideOnly: true,
  },
  { id: 'quantity', header: 'Of', value: (sample) => sample.quantity, wideOnly: true },
  { id: 'size', header: 'Size', value: (sample) => sample.sizeCutoff, wideOnly: true },
  {
    id: 'cell',
    header: 'In the file',
    value: (sample) => `${sample.sheet}, row ${sample.row}`,
    cell: (sample) => (
      <Link to={sourcePath(slug, number, sample)} aria-label={`Cells of ${sample.sheet}, row ${sample.row}`}>
        {sample.sheet}, row {sample.row}
      </Link>
    ),
  },
];
