import type { SliceDetail } from '@siltlight/common/wire/slices';
import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { Link } from 'react-router-dom';
import { EmptyState } from '../../shared/feedback/empty-state';
import { ErrorState } from '../../shared/feedback/error-state';
import { LoadingFigure } from '../../shared/feedback/loading';
import { Figure } from '../../shared/figure/figure';
import { ForcingMap, mapPicture } from '../../shared/map/forcing-map';
import type { MapData } from '../../shared/map/map-data';
import { regionsQuery } from '../../shared/map/regions-query';
import { counted, formatPercent } from '../../shared/number/format';
import { Unit } from '../../shared/number/unit';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';

export type SliceRecord = SliceDetail['records'][number];

const keyOf = (record: SliceRecord) => `${record.versionId} ${record.site}`;

const columns: DataColumn<SliceRecord>[] = [
  { id: 'site', header: 'Site', value: (row) => row.site, cell: (row) => <b>{row.site}</b> },
  {
    id: 'dataset',
    header: 'Dataset',
    value: (row) => `${row.datasetTitle}, version ${row.versionNumber}`,
    cell: (row) => (
      <Link to={`/holdings/${row.datasetSlug}/versions/${row.versionNumber}`}>
        {row.datasetTitle}, version {row.versionNumber}
      </Link>
    ),
    wideOnly: true,
  },
  { id: 'samples', header: 'Samples', value: (row) => row.sampleCount, align: 'right' },
  {
    id: 'coverage',
    header: 'Window covered',
    value: (row) => row.coverage,
    cell: (row) => formatPercent(row.coverage),
    align: 'right',
  },
  {
    id: 'flux',
    header: 'Mean flux',
    unit: 'g m-2 yr-1',
    heading: (
      <>
        Mean flux, <Unit of="g m-2 yr-1" />
      </>
    ),
    value: (row) => row.meanFluxGM2Yr,
    align: 'right',
  },
];

/** Records with samples inside the window: a list and their places, in step. */
export function Records({ records, sliceName }: { records: SliceRecord[]; sliceName: string }) {
  const regions = useQuery(regionsQuery);
  const [hovered, setHovered] = useState<SliceRecord | null>(null);
  const data = useMemo<MapData>(() => {
    const sites = (hovered ? [hovered] : records).map((record) => ({
      longitudeDeg: record.longitudeDeg,
      latitudeDeg: record.latitudeDeg,
      sampleCount: Math.max(1, record.sampleCount),
      name: record.site,
    }));
    return { regions: regions.data ?? [], limit: 1, sites, hovered: hovered?.regionCode ?? null };
  }, [regions.data, records, hovered]);
  if (records.length === 0) {
    return (
      <Figure plain title="Records" sub="covering the slice">
        <EmptyState title="No record reaches into this window yet.">
          Records appear here once a dataset version with samples of this age is approved.
        </EmptyState>
      </Figure>
    );
  }
  return (
    <div className="slice-records">
      <div className="slice-ruled">
        <DataTable
          filterable
          address="records-"
          caption="Records"
          sub={`${counted(records.length, 'site')} with samples inside the window`}
          columns={columns}
          rows={records}
          rowKey={keyOf}
          startSort="samples"
          startDescending
          heightPx={336}
          onHover={setHovered}
          empty={null}
        />
      </div>
      <Figure
        title="Where they lie"
        sub={hovered ? hovered.site : 'point at a row to find its site'}
        picture={mapPicture(data)}
      >
        {regions.isError && <ErrorState error={regions.error} retry={() => void regions.refetch()} />}
        {regions.data ? (
          <ForcingMap {...data} label={`Sites with records of ${sliceName}`} />
        ) : (
          !regions.isError && <LoadingFigure height={250} />
        )}
      </Figure>
    </div>
  );
}
