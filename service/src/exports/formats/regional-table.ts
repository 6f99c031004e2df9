import type { EstimateRegionResult, EstimateResult, ForcingTriple } from '@siltlight/common/wire/estimates';
import { type CsvCell, csvTable } from '../../http/csv';
import type { ExportSubject } from '../export-subject';

interface Column {
  name: string;
  title: string;
  type: 'string' | 'number' | 'integer' | 'boolean';
  unit?: string;
}

const PARTS = [
  ['shortwaveWm2', 'sw'],
  ['longwaveWm2', 'lw'],
  ['netWm2', 'net'],
] as const;

const KINDS = [
  ['forcing', 'forcing, slice minus reference'],
  ['direct_effect', 'direct radiative effect of the slice, against no dust'],
] as const;

const forcingColumns: Column[] = KINDS.flatMap(([kind, kindTitle]) =>
  PARTS.flatMap(([, part]) =>
    ['central', 'p05', 'p95'].map((bound) => ({
      name: `${kind}_${part}_${bound}_W_m2`,
      title: `${kindTitle}; ${part.toUpperCase()}, all sky, top of atmosphere; ${bound === 'central' ? 'central inputs' : bound === 'p05' ? '5th percentile' : '95th percentile'}`,
      type: 'number' as const,
      unit: 'W m-2',
    })),
  ),
);

/** One declaration drives the table and its descriptor. */
export const REGIONAL_COLUMNS: readonly Column[] = [
  { name: 'slice', title: 'time slice', type: 'string' },
  { name: 'reference', title: 'reference slice', type: 'string' },
  {
    name: 'region_code',
    title: 'AR6 reference region; GLOBAL for the global mean, NONE for places in no region',
    type: 'string',
  },
  { name: 'region_name', title: 'name of the region', type: 'string' },
  { name: 'area_share', title: 'share of the sphere', type: 'number', unit: '1' },
  { name: 'site_count', title: 'sites with a flux in both windows', type: 'integer' },
  { name: 'ratio_from', title: 'sites, shrunk towards the global mean, or the global ratio', type: 'string' },
  { name: 'few_sites', title: 'fewer than three sites', type: 'boolean' },
  {
    name: 'dust_optical_depth_550nm_slice',
    title: 'dust optical depth at 550 nm, slice',
    type: 'number',
    unit: '1',
  },
  {
    name: 'dust_optical_depth_550nm_reference',
    title: 'dust optical depth at 550 nm, reference',
    type: 'number',
    unit: '1',
  },
  ...forcingColumns,
];

/**
 * Regional time-slice table: a heading row, the globe, the regions in table order, and last what lies in no region,
 * so that the area-weighted forcings of all rows but the first add up to the first.
 */
export function regionalTableCsv({ content }: ExportSubject): string {
  const { global, regions, outside, label } = content.result;
  const head: CsvCell[] = [label.sliceName, label.referenceName];
  const globe = [
    ...head,
    'GLOBAL',
    'Global mean',
    1,
    null,
    '',
    '',
    global.opticalDepthSlice,
    global.opticalDepthReference,
    ...triple(global.forcing),
    ...triple(global.directEffect),
  ];
  return csvTable([
    REGIONAL_COLUMNS.map(({ name }) => name),
    globe,
    ...regions.map((region) => [...head, ...regionCells(region)]),
    [...head, ...outsideCells(outside)],
  ]);
}

function regionCells(region: EstimateRegionResult): CsvCell[] {
  const { code, name, areaShare, siteCount, status, hatched } = region;
  const ratioFrom = { sites: 'sites', shrunk: 'shrunk', global: 'global ratio' }[status];
  return [
    code,
    name,
    areaShare,
    siteCount,
    ratioFrom,
    hatched ? 'true' : 'false',
    region.opticalDepthSlice,
    region.opticalDepthReference,
    ...triple(region.forcing),
    ...triple(region.directEffect),
  ];
}

/** Its share is below a thousandth of a percent: only what the sum needs. */
function outsideCells({ areaShare, forcing }: EstimateResult['outside']): CsvCell[] {
  const unknown = (count: number): CsvCell[] => Array.from({ length: count }, () => null);
  const name = 'Places in no region';
  return ['NONE', name, areaShare, null, '', '', ...unknown(2), ...triple(forcing), ...unknown(9)];
}

function triple(values: ForcingTriple): CsvCell[] {
  return PARTS.flatMap(([part]) => {
    const { value, low, high } = values[part];
    return [value, low, high];
  });
}
