import type {
  EstimateDetail,
  EstimateRegionResult,
  EstimateResult,
  ForcingTriple,
} from '@siltlight/common/wire/estimates';
import type { FieldSite } from '@siltlight/common/wire/slices';

const amount = (value: number, low: number | null, high: number | null) => ({ value, low, high });

const triple = (net: number, low: number | null, high: number | null): ForcingTriple => ({
  shortwaveWm2: amount(net * 1.5, low, high),
  longwaveWm2: amount(net * -0.5, low, high),
  netWm2: amount(net, low, high),
});

const region = (code: string, name: string, net: number, hatched: boolean): EstimateRegionResult => ({
  code,
  name,
  areaShare: 0.02,
  siteCount: hatched ? 1 : 4,
  hatched,
  status: hatched ? 'shrunk' : 'sites',
  opticalDepthSlice: 0.08,
  opticalDepthReference: 0.03,
  surfaceAlbedo: 0.2,
  cloudFraction: 0.5,
  forcing: triple(net, net - 0.4, net + 0.4),
  directEffect: triple(net * 1.8, net * 1.8 - 0.6, net * 1.8 + 0.6),
  cautions: [],
});

/** A made-up result: its numbers serve the drawing only. */
export const inventedResult: EstimateResult = {
  label: {
    level: 'top of atmosphere',
    sky: 'all sky',
    kind: 'instantaneous, no rapid adjustments',
    sliceName: 'Last Glacial Maximum',
    referenceName: 'Pre-industrial',
    processes: 'dust alone, shortwave and longwave',
  },
  global: {
    forcing: {
      shortwaveWm2: amount(-0.61, -1.02, -0.25),
      longwaveWm2: amount(0.19, 0.08, 0.31),
      netWm2: amount(-0.42, -0.81, -0.12),
    },
    forcingClearSky: { shortwaveWm2: amount(-1.1, -1.9, -0.4), longwaveWm2: null, netWm2: null },
    directEffect: triple(-0.74, -1.25, -0.3),
    directEffectReference: triple(-0.32, -0.5, -0.1),
    burdenSliceTg: 46,
    burdenReferenceTg: 19,
    opticalDepthSlice: 0.06,
    opticalDepthReference: 0.02,
  },
  outcomes: Array.from({ length: 50 }, (_, at) => -0.9 + at * 0.019),
  monthly: null,
  criticalSingleScatteringAlbedo: 0.9,
  regions: [
    region('SAH', 'Sahara', 0.51, false),
    region('SSA', 'Southern South America', -1.72, true),
    region('ARS', 'Arabian Sea', -1.16, false),
  ],
  outside: { areaShare: 0.001, forcing: triple(-0.02, -0.05, 0.01) },
  varied: [],
  cautions: [{ code: 'interval-covers-varied-inputs', message: 'The interval covers 7 varied inputs.' }],
};

export const inventedSite = (site: string, regionCode: string, unusedReason: string | null): FieldSite => ({
  site,
  datasetSlug: 'southern-cores',
  datasetTitle: 'Southern cores',
  versionId: 'd1',
  latitudeDeg: -50,
  longitudeDeg: -70,
  regionCode,
  sliceFluxGM2Yr: 12.4,
  sliceSigmaGM2Yr: 1,
  sliceSamples: 9,
  sliceCoverage: 0.8,
  referenceFluxGM2Yr: unusedReason ? null : 3.1,
  referenceSigmaGM2Yr: null,
  referenceSamples: unusedReason ? 0 : 4,
  ratio: unusedReason ? null : 4,
  lnRatioSe: unusedReason ? null : 0.2,
  unusedReason,
});

const person = { id: 'p1', name: 'Ada Loess', initials: 'AL' };

export const inventedEstimate: EstimateDetail = {
  id: 'e1',
  runNumber: 12,
  title: 'Last Glacial Maximum, daily form',
  state: 'computed',
  sliceSlug: 'lgm',
  sliceName: 'Last Glacial Maximum',
  referenceName: 'Pre-industrial',
  method: 'thin-layer-daily',
  netWm2: inventedResult.global.forcing.netWm2,
  stale: false,
  staleReason: null,
  invented: true,
  createdBy: person,
  createdAt: '2026-01-05T08:00:00Z',
  publishedBy: null,
  publishedAt: null,
  jobId: null,
  checksum: 'ab'.repeat(32),
  request: {
    fieldVersionId: 'f1',
    opticalSetVersionId: 'o1',
    backdropVersionId: 'b1',
    method: 'thin-layer-daily',
    transmittance: 0.76,
    longwave: { on: true, efficiencyWm2: 8 },
    members: 1024,
    seed: 20417,
  },
  fieldTitle: 'LGM by regional scaling',
  opticalSetTitle: 'Mineral dust, mean of 19 soils, version 1',
  backdropTitle: 'Zonal table, version 1',
  result: inventedResult,
  context: {
    greenhouse: { valueWm2: -2.8, formula: 'Meinshausen et al. 2020', source: 'Meinshausen et al. (2020)' },
    published: [
      {
        id: 'x1',
        source: 'Sherwood et al. 2020',
        quantity: 'assessed forcing term',
        valueWm2: -1,
        lowWm2: -2,
        highWm2: 0,
        evidence: 'from memory',
        otherKind: 'of all aerosols',
        note: '',
      },
    ],
  },
  rights: { maySignOff: false, mayWithdraw: false, whyNot: 'Run 12 is yours; somebody else signs it off.' },
};
