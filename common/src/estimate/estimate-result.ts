import type { Caution } from '../physical/domain-error';
import type { EstimateInputs } from './estimate-inputs';
import type { AllSky, DirectEffect, Forcing } from './forcing-triple';
import type { MonthlyForcing } from './monthly-forcing';
import type { RegionConditions } from './region-conditions';

export interface EstimateRegion extends RegionConditions {
  code: string;
  name: string;
  siteCount: number;
  status: 'sites' | 'shrunk' | 'global';
  hatched: boolean;
  forcing: AllSky<Forcing>;
  directEffect: AllSky<DirectEffect>;
  directEffectReference: AllSky<DirectEffect>;
  cautions: Caution[];
}

export interface EstimateGlobal {
  forcing: AllSky<Forcing>;
  /** a part is null where no number belongs to clear sky */
  forcingClearSky: Forcing;
  directEffect: AllSky<DirectEffect>;
  directEffectClearSky: DirectEffect;
  directEffectReference: AllSky<DirectEffect>;
  opticalDepthSlice: number;
  opticalDepthReference: number;
  /** burden behind the optical depths, by the mass extinction efficiency [Tg] */
  burdenSliceTg: number;
  burdenReferenceTg: number;
}

export interface VariedDescription {
  name: string;
  unit: string;
  /** "triangular", "beta, cut" … */
  distribution: string;
  /** 5 to 95 % */
  low: number;
  central: number;
  high: number;
  source: string;
}

export interface EstimateResult {
  global: EstimateGlobal;
  /** 50 equally likely outcomes of the global net forcing, all sky, ascending [W m⁻²] */
  outcomes: number[];
  /** central case; null where the method has no months */
  monthly: MonthlyForcing[] | null;
  /** of the half-day form over the mean ground under the reference's dust; null for an efficiency */
  criticalSingleScatteringAlbedo: number | null;
  /** in table order */
  regions: EstimateRegion[];
  /** places that no region covers: with them the regions add up to the globe */
  outside: { areaShare: number; forcing: AllSky<Forcing> };
  varied: VariedDescription[];
  cautions: Caution[];
  /** what fixes the run: the same record gives the same bytes */
  record: { inputs: EstimateInputs; stepDeg: number };
}
