import type { BySurface } from '@siltlight/common/fields/base-field';
import type { Caution } from '@siltlight/common/physical/domain-error';

export const FIELD = 'field';

/** A record's mean in one window, with the samples it rests on. */
export interface WindowMean {
  meanFluxGM2Yr: number;
  sigmaGM2Yr: number | null;
  coverage: number;
  samples: { id: string; weight: number }[];
}

export interface FieldSiteContent {
  key: string;
  site: string;
  versionId: string;
  latitudeDeg: number;
  longitudeDeg: number;
  regionCode: string | null;
  slice: WindowMean | null;
  reference: WindowMean | null;
  ratio: number | null;
  lnRatioSe: number | null;
  unusedReason: string | null;
}

export interface FieldRegionContent {
  code: string;
  name: string;
  siteCount: number;
  ratio: number;
  lnRatio: number;
  lnRatioSe: number;
  low: number;
  high: number;
  status: 'sites' | 'shrunk' | 'global';
  hatched: boolean;
  sharedLoad: number;
  ownSe: number;
  opticalDepthSlice: number;
  opticalDepthReference: number;
}

/** Content of a field version: what is hashed. Everything an estimate needs of it is in here. */
export interface FieldContent {
  way: 'regional-scaling';
  title: string;
  invented: boolean;
  slice: { slug: string; name: string; versionId: string; checksum: string };
  reference: { slug: string; name: string; versionId: string; checksum: string };
  sizeCutoff: string | null;
  datasetVersions: { versionId: string; checksum: string }[];
  baseField: { title: string; source: string; opticalDepth: BySurface; cautions: Caution[] };
  regions: FieldRegionContent[];
  global: { ratio: number; lnRatio: number; lnRatioSe: number; low: number; high: number };
  /** standard error of the global mean of ln R alone */
  sharedSe: number;
  sites: FieldSiteContent[];
  diagnostics: {
    tauSquared: number;
    q: number;
    iSquared: number;
    usedSites: number;
    regionsWithSites: number;
    areaByGlobalRatioShare: number;
  };
  globalOpticalDepthSlice: number;
  globalOpticalDepthReference: number;
  cautions: Caution[];
}
