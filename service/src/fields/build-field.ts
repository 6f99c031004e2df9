import { coarseBaseField } from '@siltlight/common/fields/base-field';
import { regionalScaling, type RegionalScaling } from '@siltlight/common/fields/regional-scaling';
import type { Caution } from '@siltlight/common/physical/domain-error';
import { regionAt } from '@siltlight/common/sphere/region-set';
import type { FieldContent, FieldRegionContent, FieldSiteContent } from './field-content';
import { areaMeans, areaShares, opticalDepthGrid } from './region-optical-depths';
import {
  commonestSizeCutoff,
  siteFluxOf,
  siteWindows,
  type SiteWindows,
  type StoredSample,
} from './site-windows';
import type { SliceVersion } from '../slices/slices.service';

export interface FieldIngredients {
  title: string;
  slice: SliceVersion;
  reference: SliceVersion;
  datasetVersions: { versionId: string; checksum: string; invented: boolean }[];
  samples: StoredSample[];
  sizeCutoff?: string | undefined;
}

/** A larger share of the sphere than this without a site of its own is said. */
const MUCH_AREA = 0.3;

const UNUSED = { 'no-reference-flux': 'no reference flux', 'no-slice-flux': 'no slice flux' } as const;

/** Regional scaling of the coarse base field by the records of some dataset versions. */
export function buildField(given: FieldIngredients): FieldContent {
  const sizeCutoff = given.sizeCutoff ?? commonestSizeCutoff(given.samples);
  const records = siteWindows(given.samples, given.slice.content, given.reference.content, sizeCutoff);
  const scaling = regionalScaling(
    records.filter(({ notComparable }) => notComparable === null).map(siteFluxOf),
  );
  const base = coarseBaseField();
  const lnRatios = new Map(scaling.regions.map(({ code, lnRatio }) => [code, lnRatio]));
  const grid = opticalDepthGrid(base, lnRatios, scaling.global.lnRatio);
  const slice = areaMeans(grid.opticalDepthSlice);
  const reference = areaMeans(grid.opticalDepthReference);
  const byGlobal = areaByGlobalRatio(scaling);
  return {
    way: 'regional-scaling',
    title: given.title,
    invented: given.datasetVersions.some(({ invented }) => invented),
    slice: pin(given.slice),
    reference: pin(given.reference),
    sizeCutoff,
    datasetVersions: given.datasetVersions.map(({ versionId, checksum }) => ({ versionId, checksum })),
    baseField: {
      title: base.title,
      source: base.source,
      opticalDepth: base.opticalDepth,
      cautions: base.cautions,
    },
    regions: scaling.regions.map((region) => regionOf(region, slice.byRegion, reference.byRegion)),
    global: scaling.global,
    sharedSe: scaling.sharedSe,
    sites: records.map((record) => siteOf(record, scaling)),
    diagnostics: { ...scaling.diagnostics, areaByGlobalRatioShare: byGlobal },
    globalOpticalDepthSlice: slice.global,
    globalOpticalDepthReference: reference.global,
    cautions: [
      ...scaling.cautions,
      ...records.flatMap(({ cautions }) => cautions),
      ...sameSiteTwice(records),
      ...mostlyFilled(byGlobal),
      ...base.cautions,
    ],
  };
}

const pin = ({ id, checksum, content }: SliceVersion) => ({
  slug: content.slug,
  name: content.name,
  versionId: id,
  checksum,
});

function regionOf(
  region: RegionalScaling['regions'][number],
  slice: Map<string, number>,
  reference: Map<string, number>,
): FieldRegionContent {
  const { code, name, siteCount, ratio, lnRatio, lnRatioSe, low, high, status, hatched, sharedLoad, ownSe } =
    region;
  const depths = { opticalDepthSlice: slice.get(code) ?? 0, opticalDepthReference: reference.get(code) ?? 0 };
  return {
    code,
    name,
    siteCount,
    ratio,
    lnRatio,
    lnRatioSe,
    low,
    high,
    status,
    hatched,
    sharedLoad,
    ownSe,
    ...depths,
  };
}

function siteOf(record: SiteWindows, scaling: RegionalScaling): FieldSiteContent {
  const { key, site, versionId, latitudeDeg, longitudeDeg, slice, reference, notComparable } = record;
  const used = scaling.regions.flatMap((region) => region.sites).find((entry) => entry.key === key);
  const unused = scaling.unused.find((entry) => entry.key === key);
  return {
    key,
    site,
    versionId,
    latitudeDeg,
    longitudeDeg,
    regionCode: regionAt(longitudeDeg, latitudeDeg),
    slice,
    reference,
    ratio:
      used?.ratio ??
      (slice && reference && !notComparable ? slice.meanFluxGM2Yr / reference.meanFluxGM2Yr : null),
    lnRatioSe: used?.lnRatioSe ?? null,
    unusedReason: notComparable ?? (unused ? UNUSED[unused.reason] : null),
  };
}

function areaByGlobalRatio({ regions }: RegionalScaling): number {
  const shares = areaShares();
  const covered = regions
    .filter(({ status }) => status !== 'global')
    .reduce((sum, { code }) => sum + (shares.get(code) ?? 0), 0);
  return 1 - covered;
}

function mostlyFilled(share: number): Caution[] {
  if (share <= MUCH_AREA) return [];
  const percent = Math.round(share * 100);
  return [
    {
      code: 'area-filled-by-global-ratio',
      message: `${percent} % of the Earth has no site of its own and takes the global ratio.`,
    },
  ];
}

/** The same core in two compilations counts twice: near-match on place (0.05°), told and left to a person. */
function sameSiteTwice(records: readonly SiteWindows[]): Caution[] {
  const used = records.filter(({ slice, reference }) => slice && reference);
  return used.flatMap((a, i) =>
    used.slice(i + 1).flatMap((b) => {
      const near =
        Math.abs(a.latitudeDeg - b.latitudeDeg) <= 0.05 && Math.abs(a.longitudeDeg - b.longitudeDeg) <= 0.05;
      if (!near) return [];
      return [
        {
          code: 'same-site-twice',
          message: `${a.site} and ${b.site} lie at one place: if they are one core, it counts twice. Leave one dataset out.`,
        },
      ];
    }),
  );
}
