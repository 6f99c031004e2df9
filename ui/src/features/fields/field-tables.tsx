import type { FieldDetail, FieldRegion, FieldSite } from '@siltlight/common/wire/slices';
import { Link } from 'react-router-dom';
import { HatchSign } from '../../shared/map/forcing-map';
import { rangeText } from '../../shared/number/amount';
import { formatNumber, formatPercent } from '../../shared/number/format';
import { Unit } from '../../shared/number/unit';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import { statusText, tracePath, unusedSites, usedSites } from './field-words';

const siteKey = (site: FieldSite) => `${site.versionId} ${site.site}`;

const regionColumns: DataColumn<FieldRegion>[] = [
  {
    id: 'name',
    header: 'Region',
    value: (row) => row.name,
    cell: (row) => (
      <>
        {row.name}
        {row.hatched && <HatchSign meaning="few sites, or the interval holds 1" />}
      </>
    ),
  },
  {
    id: 'ratio',
    header: 'Ratio',
    value: (row) => row.ratio.value,
    cell: (row) => <b>{formatNumber(row.ratio.value, { figures: 2 })}</b>,
    align: 'right',
  },
  {
    id: 'range',
    header: '5–95 %',
    value: (row) => ratioRange(row) ?? '',
    cell: (row) => <span className="sl-muted">{ratioRange(row) ?? '–'}</span>,
    align: 'right',
  },
  { id: 'sites', header: 'Sites', value: (row) => row.siteCount, align: 'right' },
  { id: 'status', header: 'Rests on', value: statusText, wideOnly: true },
];

const ratioRange = ({ ratio: { low, high } }: FieldRegion) =>
  low === null || high === null
    ? null
    : `${formatNumber(low, { figures: 2 })} to ${formatNumber(high, { figures: 2 })}`;

type RegionProps = {
  regions: FieldRegion[];
  selected: string | null;
  onSelect: (code: string) => void;
  onHover: (code: string | null) => void;
};

/** Regions with their ratios, in step with the map. */
export const FieldRegionTable = ({ regions, selected, onSelect, onHover }: RegionProps) => (
  <DataTable
    caption={`${regions.length} regions`}
    sub="slice over reference; a row or a region: one follows the other"
    columns={regionColumns}
    rows={regions}
    rowKey={(row) => row.code}
    startSort="sites"
    startDescending
    heightPx={336}
    selectedKey={selected}
    onSelect={(row) => onSelect(row.code)}
    onHover={(row) => onHover(row?.code ?? null)}
    empty={<p className="sl-13 sl-muted">No region.</p>}
  />
);

const flux = (header: string, of: (row: FieldSite) => number | null): DataColumn<FieldSite> => ({
  id: header,
  header,
  unit: 'g m-2 yr-1',
  value: of,
  align: 'right',
  wideOnly: true,
});

const datasetColumn: DataColumn<FieldSite> = {
  id: 'dataset',
  header: 'Dataset',
  value: (row) => row.datasetTitle,
  wideOnly: true,
};

const usedColumns = (field: FieldDetail): DataColumn<FieldSite>[] => [
  {
    id: 'site',
    header: 'Site',
    value: (row) => row.site,
    cell: (row) => (
      <span className="sl-unit">
        {field.versionId ? <Link to={tracePath(field.versionId, row)}>{row.site}</Link> : <b>{row.site}</b>}
      </span>
    ),
  },
  datasetColumn,
  flux(`Flux, ${field.sliceName}`, (row) => row.sliceFluxGM2Yr),
  flux(`Flux, ${field.referenceName}`, (row) => row.referenceFluxGM2Yr),
  {
    id: 'ratio',
    header: 'Ratio',
    value: (row) => row.ratio,
    cell: (row) => <RatioOfSite site={row} />,
    align: 'right',
  },
  {
    id: 'samples',
    header: 'Samples',
    value: (row) => row.sliceSamples + row.referenceSamples,
    cell: (row) => `${row.sliceSamples} and ${row.referenceSamples}`,
    align: 'right',
  },
  {
    id: 'coverage',
    header: 'Window covered',
    value: (row) => row.sliceCoverage,
    cell: (row) => formatPercent(row.sliceCoverage),
    align: 'right',
    wideOnly: true,
  },
];

const Z90 = 1.6449; // 5 and 95 % points of the normal distribution, in standard errors

function RatioOfSite({ site: { ratio, lnRatioSe } }: { site: FieldSite }) {
  if (ratio === null) return <span className="sl-muted">–</span>;
  const range =
    lnRatioSe === null
      ? null
      : rangeText(
          { value: ratio, low: ratio * Math.exp(-Z90 * lnRatioSe), high: ratio * Math.exp(Z90 * lnRatioSe) },
          false,
          1,
        );
  return (
    <>
      <b>{formatNumber(ratio, { figures: 2 })}</b> {range && <span className="sl-muted">{range}</span>}
    </>
  );
}

/** Sites whose ratio enters the field. */
export function UsedSites({ field }: { field: FieldDetail }) {
  return (
    <DataTable
      filterable
      caption="Sites used"
      sub={
        <>
          fluxes in <Unit of="g m-2 yr-1" />, ratio with 5–95 %
        </>
      }
      columns={usedColumns(field)}
      rows={usedSites(field.sites)}
      rowKey={siteKey}
      startSort="ratio"
      startDescending
      heightPx={360}
      empty={<p className="sl-13 sl-muted">No site has a flux in both windows.</p>}
    />
  );
}

const unusedColumns: DataColumn<FieldSite>[] = [
  { id: 'site', header: 'Site', value: (row) => row.site },
  { ...datasetColumn, wideOnly: false },
  { id: 'why', header: 'Why not', value: (row) => row.unusedReason },
];

/** Sites that were looked at and left aside, each with its reason. */
export const UnusedSites = ({ field }: { field: FieldDetail }) => (
  <DataTable
    caption="Sites not used"
    sub="each with its reason"
    columns={unusedColumns}
    rows={unusedSites(field.sites)}
    rowKey={siteKey}
    heightPx={360}
    empty={<p className="sl-13 sl-muted">All sites of the chosen versions are used.</p>}
  />
);
