import { z } from 'zod';
import { isoTime, personMark, versionState } from './shared';
import { datasetKindId, submissionMetadata } from './submissions';

export const versionSummary = z.object({
  versionId: z.string(),
  number: z.number().int(),
  state: versionState,
  checksum: z.string(),
  publishedAt: isoTime.nullable(),
  publishedBy: personMark.nullable(),
  note: z.string().nullable(),
  withdrawnReason: z.string().nullable(),
});

export const datasetSummary = z.object({
  slug: z.string(),
  title: z.string(),
  kind: datasetKindId,
  archive: z.string().nullable(),
  licence: z.string().nullable(),
  siteCount: z.number().int(),
  sampleCount: z.number().int(),
  invented: z.boolean(),
  latest: versionSummary,
});
export type DatasetSummary = z.infer<typeof datasetSummary>;

export const datasetSite = z.object({
  site: z.string(),
  latitudeDeg: z.number(),
  longitudeDeg: z.number(),
  regionCode: z.string().nullable(),
  regionName: z.string().nullable(),
  sampleCount: z.number().int(),
  youngestKaBp: z.number().nullable(),
  oldestKaBp: z.number().nullable(),
});

export const datasetVersionDetail = z.object({
  slug: z.string(),
  title: z.string(),
  kind: datasetKindId,
  invented: z.boolean(),
  version: versionSummary,
  versions: z.array(versionSummary),
  citation: z.string(),
  metadata: submissionMetadata,
  grade: z.string().nullable(),
  sites: z.array(datasetSite),
  sampleCount: z.number().int(),
  submission: z.object({ id: z.string(), number: z.string() }).nullable(),
  file: z.object({ fileName: z.string(), sha256: z.string(), bytes: z.number().int() }),
  usedBy: z.array(
    z.object({ kind: z.enum(['field', 'estimate']), id: z.string(), title: z.string(), stale: z.boolean() }),
  ),
  rights: z.object({ mayWithdraw: z.boolean() }),
});
export type DatasetVersionDetail = z.infer<typeof datasetVersionDetail>;

export const sampleView = z.object({
  id: z.string(),
  site: z.string(),
  latitudeDeg: z.number(),
  longitudeDeg: z.number(),
  ageKaBp: z.number(),
  ageYoungKaBp: z.number().nullable(),
  ageOldKaBp: z.number().nullable(),
  ageSigmaKa: z.number().nullable(),
  depthM: z.number().nullable(),
  quantity: z.string(),
  fluxGM2Yr: z.number(),
  fluxSigmaGM2Yr: z.number().nullable(),
  sizeCutoff: z.string().nullable(),
  /** where it came from */
  sheet: z.string(),
  row: z.number().int(),
  cells: z.record(z.string(), z.object({ cell: z.string().nullable(), raw: z.string(), rule: z.string() })),
});
export type SampleView = z.infer<typeof sampleView>;

export const samplesQuery = z.object({
  site: z.string().max(300).optional(),
  offset: z.coerce.number().int().min(0).default(0),
  limit: z.coerce.number().int().min(1).max(1000).default(200),
});
export const samplesPage = z.object({ total: z.number().int(), items: z.array(sampleView) });
