import type { BaseField } from '../fields/base-field';
import type { Orbit } from '../orbit/orbit';
import type { Distribution } from '../statistics/distributions';

export type EstimateMethod = 'thin-layer-daily' | 'thin-layer' | 'simple-albedo' | 'efficiency';

/** Orbit and sun of a slice or of its reference. */
export interface SliceLight {
  name: string;
  orbit: Orbit;
  solarConstantWm2: number;
}

/** Annual means of one band of latitude. */
export interface BackdropBand {
  southDeg: number;
  northDeg: number;
  surfaceAlbedo: number;
  cloudFraction: number;
  /** null where the band has no land */
  cloudFractionLand: number | null;
  /** null where the band has no sea */
  cloudFractionOcean: number | null;
}

/** What a region's optical depth is multiplied by, in ln, and how its error is shared. */
export interface EstimateRatio {
  code: string;
  lnRatio: number;
  /** share of the error of the global mean that this region carries, 0 to 1 */
  sharedLoad: number;
  /** standard error of ln R that is this region's own */
  ownSe: number;
  siteCount: number;
  status: 'sites' | 'shrunk' | 'global';
  hatched: boolean;
}

/** Names under which an ensemble may vary an input; the rest stays at its central value. */
export const VARIED_INPUTS = [
  'singleScatteringAlbedo',
  'asymmetry',
  'transmittance',
  'opticalDepthFactor',
  'surfaceAlbedoFactor',
  'cloudFractionFactor',
  'shortwaveEfficiencyWm2',
  'longwaveEfficiencyWm2',
] as const;
export type VariedInput = (typeof VARIED_INPUTS)[number];

export interface VariedParameter {
  name: VariedInput;
  distribution: Distribution;
  unit: string;
  source: string;
}

/** Everything an estimate depends on, resolved: no identifiers to look up, no clock, no defaults from elsewhere. */
export interface EstimateInputs {
  slice: SliceLight;
  reference: SliceLight;
  field: {
    base: Pick<BaseField, 'title' | 'opticalDepth' | 'cautions'>;
    regions: EstimateRatio[];
    /** for places in no region */
    global: { lnRatio: number; sharedLoad: number; ownSe: number };
    /** standard error of the global mean of ln R, which `sharedLoad` multiplies */
    sharedSe: number;
  };
  optics: { singleScatteringAlbedo: number; asymmetry: number; massExtinctionM2PerG: number };
  /** one backdrop for slice and reference: the forcing is that of the dust alone */
  backdrop: BackdropBand[];
  /** one way, of the air above the layer */
  transmittance: number;
  method: EstimateMethod;
  /** needed by the method "efficiency" alone */
  shortwaveEfficiency?: { efficiencyWm2: number; sky: 'clear' | 'all' };
  longwave:
    | { efficiencyWm2: number; sky: 'all' }
    | { efficiencyWm2: number; sky: 'clear'; highCloudFraction: number }
    | null;
  ensemble: { members: number; seed: number; parameters: VariedParameter[]; varyRatios: boolean };
  /** 2 by default */
  stepDeg?: number;
}
