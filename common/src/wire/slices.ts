import { z } from 'zod';
import { caution, interval, isoTime, personMark, versionState } from './shared';

export const columnSlice = z.object({
  slug: z.string(),
  name: z.string(),
  /** short label on the closed column: LGM, PI, MIS 3 */
  label: z.string(),
  youngKa: z.number(),
  oldKa: z.number(),
  /** a slice that lies inside a Stage is a lens in the second lane */
  parentSlug: z.string().nullable(),
  kind: z.enum(['evidence', 'scenario']),
  /** latest published net forcing [W m-2], null = no estimate yet */
  latestNetWm2: z.number().nullable(),
  stale: z.boolean(),
});
export type ColumnSlice = z.infer<typeof columnSlice>;

export const orbitElements = z.object({
  eccentricity: z.number(),
  obliquityDeg: z.number(),
  perihelionLongitudeDeg: z.number(),
});

/** Content of a slice version: what is hashed. */
export const sliceContent = z.object({
  slug: z.string(),
  name: z.string(),
  label: z.string(),
  kind: z.enum(['evidence', 'scenario']),
  /** evidence window, ka before 1950 CE */
  windowYoungKa: z.number(),
  windowOldKa: z.number(),
  /** age for orbit and gases, apart from the window */
  orbitalAgeKa: z.number(),
  orbit: orbitElements,
  orbitSource: z.string(),
  solarConstantWm2: z.number(),
  gases: z
    .object({ co2Ppm: z.number(), ch4Ppb: z.number(), n2oPpb: z.number(), source: z.string() })
    .nullable(),
  referenceSlug: z.string().nullable(),
  stage: z.boolean(),
  noteOnUse: z.string(),
  source: z.string(),
});
export type SliceContent = z.infer<typeof sliceContent>;

export const sliceRecord = z.object({
  datasetSlug: z.string(),
  datasetTitle: z.string(),
  versionId: z.string(),
  versionNumber: z.number().int(),
  site: z.string(),
  latitudeDeg: z.number(),
  longitudeDeg: z.number(),
  regionCode: z.string().nullable(),
  sampleCount: z.number().int(),
  /** share of the window covered, 0 to 1 */
  coverage: z.number(),
  meanFluxGM2Yr: z.number().nullable(),
});

export const sliceDetail = z.object({
  versionId: z.string(),
  versionNumber: z.number().int(),
  state: versionState,
  checksum: z.string(),
  content: sliceContent,
  reference: sliceContent.nullable(),
  records: z.array(sliceRecord),
  fields: z.array(
    z.object({
      versionId: z.string(),
      title: z.string(),
      way: z.string(),
      siteCount: z.number().int(),
      stale: z.boolean(),
      createdAt: isoTime,
      createdBy: personMark,
    }),
  ),
  estimates: z.array(
    z.object({
      id: z.string(),
      title: z.string(),
      state: z.string(),
      netWm2: interval.nullable(),
      stale: z.boolean(),
      createdAt: isoTime,
    }),
  ),
});
export type SliceDetail = z.infer<typeof sliceDetail>;

export const fieldRequest = z.strictObject({
  sliceSlug: z.string().max(80),
  way: z.literal('regional-scaling'),
  datasetVersionIds: z.array(z.string().max(64)).min(1, 'Pick at least one dataset version.').max(200),
  title: z.string().trim().min(1).max(200).optional(),
  /** one size fraction only; "bulk", "<10 um" … absent = the commonest of the chosen versions, the rest is listed as left aside */
  sizeCutoff: z.string().max(60).optional(),
});

export const fieldSite = z.object({
  site: z.string(),
  datasetSlug: z.string(),
  datasetTitle: z.string(),
  versionId: z.string(),
  latitudeDeg: z.number(),
  longitudeDeg: z.number(),
  regionCode: z.string().nullable(),
  sliceFluxGM2Yr: z.number().nullable(),
  sliceSigmaGM2Yr: z.number().nullable(),
  sliceSamples: z.number().int(),
  sliceCoverage: z.number(),
  referenceFluxGM2Yr: z.number().nullable(),
  referenceSigmaGM2Yr: z.number().nullable(),
  referenceSamples: z.number().int(),
  ratio: z.number().nullable(),
  lnRatioSe: z.number().nullable(),
  /** null: used. Else why not: "no reference flux", "no slice flux", "other size fraction" … */
  unusedReason: z.string().nullable(),
});
export type FieldSite = z.infer<typeof fieldSite>;

export const fieldRegion = z.object({
  code: z.string(),
  name: z.string(),
  siteCount: z.number().int(),
  /** slice over reference, with 5–95 % */
  ratio: interval,
  lnRatioSe: z.number(),
  status: z.enum(['sites', 'shrunk', 'global']),
  hatched: z.boolean(),
  opticalDepthSlice: z.number(),
  opticalDepthReference: z.number(),
});
export type FieldRegion = z.infer<typeof fieldRegion>;

export const fieldDetail = z.object({
  versionId: z.string(),
  title: z.string(),
  way: z.literal('regional-scaling'),
  state: versionState,
  checksum: z.string(),
  sliceSlug: z.string(),
  sliceName: z.string(),
  sliceVersionId: z.string(),
  referenceSlug: z.string(),
  referenceName: z.string(),
  referenceVersionId: z.string(),
  sizeCutoff: z.string().nullable(),
  baseField: z.object({ title: z.string(), source: z.string() }),
  datasetVersions: z.array(
    z.object({
      versionId: z.string(),
      slug: z.string(),
      title: z.string(),
      number: z.number().int(),
      checksum: z.string(),
      state: versionState,
    }),
  ),
  regions: z.array(fieldRegion),
  sites: z.array(fieldSite),
  diagnostics: z.object({
    globalRatio: interval,
    tauSquared: z.number(),
    q: z.number(),
    iSquared: z.number(),
    usedSites: z.number().int(),
    regionsWithSites: z.number().int(),
    areaByGlobalRatioShare: z.number(),
  }),
  globalOpticalDepthSlice: z.number(),
  globalOpticalDepthReference: z.number(),
  cautions: z.array(caution),
  stale: z.boolean(),
  staleReason: z.string().nullable(),
  invented: z.boolean(),
  createdBy: personMark,
  createdAt: isoTime,
});
export type FieldDetail = z.infer<typeof fieldDetail>;

/** From a region's number to the spreadsheet cells: the samples behind a site's flux in one window. */
export const siteTrace = z.object({
  site: z.string(),
  datasetSlug: z.string(),
  datasetTitle: z.string(),
  versionNumber: z.number().int(),
  checksum: z.string(),
  submissionId: z.string().nullable(),
  fileName: z.string(),
  windows: z.array(
    z.object({
      sliceSlug: z.string(),
      sliceName: z.string(),
      youngKa: z.number(),
      oldKa: z.number(),
      meanFluxGM2Yr: z.number().nullable(),
      samples: z.array(
        z.object({
          sampleId: z.string(),
          sheet: z.string(),
          row: z.number().int(),
          ageCell: z.string().nullable(),
          ageRaw: z.string(),
          ageKaBp: z.number(),
          fluxCell: z.string().nullable(),
          fluxRaw: z.string(),
          fluxRule: z.string(),
          fluxGM2Yr: z.number(),
          weight: z.number(),
        }),
      ),
    }),
  ),
});
export type SiteTrace = z.infer<typeof siteTrace>;

/** The spreadsheet cells round a place, as the file holds them. */
export const sourceCells = z.object({
  datasetSlug: z.string(),
  versionNumber: z.number().int(),
  fileName: z.string(),
  sha256: z.string(),
  sheet: z.string(),
  columns: z.array(z.string()),
  rows: z.array(z.object({ row: z.number().int(), cells: z.record(z.string(), z.string()) })),
});
