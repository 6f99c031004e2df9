import { hgUpscatterCoefficients, upscatterMean, upscatterOrder } from '../optics/upscatter';
import { readOrbitOrAge } from '../orbit/calculate-insolation';
import type { Orbit } from '../orbit/orbit';
import { dailyMeanUpscatter, dailyMoments, type DailyMoments } from './daily-moments';
import { criticalOfBracket, firstOrderBracket } from './first-order-layer';
import { declare, readInputs } from './inputs';
import { longwaveTerm, type LongwaveInput } from './longwave';
import { result, type ForcingMethod, type ForcingResult } from './method';
import { thinLayerCautions } from './thin-layer-cautions';

export interface ThinLayerDailyInput {
  latitudeDeg: number;
  /** this or `orbit` */
  ageKaBp?: number;
  orbit?: Orbit;
  solarLongitudeDeg: number;
  /** 1361 when absent */
  solarConstantWm2?: number;
  transmittance: number;
  cloudFraction: number;
  surfaceAlbedo: number;
  opticalDepth: number;
  singleScatteringAlbedo: number;
  asymmetry: number;
  longwave?: LongwaveInput;
}

const NAMES = [
  'latitudeDeg',
  'solarLongitudeDeg',
  'solarConstantWm2',
  'transmittance',
  'cloudFraction',
  'surfaceAlbedo',
  'opticalDepth',
  'singleScatteringAlbedo',
  'asymmetry',
] as const;

/** Terms of the upscatter series below this do not show in a forcing. */
const SERIES_TOLERANCE = 1e-14;

/** Optics of a layer and air above it that a row of cells shares. */
export interface LayerOptics {
  singleScatteringAlbedo: number;
  /** ⟨β⟩ over the lit hours */
  dailyUpscatter: number;
  /** β̄ */
  upscatterMean: number;
  transmittance: number;
}

/**
 * Shortwave forcing of a thin layer in the daily mean at one latitude, per unit optical depth [W m⁻²]:
 *
 *   ΔF/τ = −(S₀/ρ²) f_day T² (1−A_c) ⟨ω(1−R_s)[β(μ₀) − 2β̄ R_s μ₀] − (1−ω) R_s (1 + 2μ₀)⟩
 *
 * the mean over the lit hours, ρ the Earth–Sun distance in AU. All of the sun is in the moments, so the same moments
 * serve every cell of a row and every member of an ensemble.
 *
 * Limits: first order in τ, the errors of the half-day form in τ (see `thinLayerForcing`), useless beyond τ/μ₀ 0.3.
 * Source: first order of Coakley & Chylek (1975), J. Atmos. Sci. 32, 409–418.
 */
export function thinLayerDailySlope(
  moments: DailyMoments,
  optics: LayerOptics,
  surfaceAlbedo: number,
  cloudFraction: number,
): number {
  const bracket = firstOrderBracket(
    optics.singleScatteringAlbedo,
    surfaceAlbedo,
    optics.dailyUpscatter,
    optics.upscatterMean,
    moments.meanMu,
  );
  return -moments.incidentWm2 * optics.transmittance ** 2 * (1 - cloudFraction) * bracket;
}

/** The daily form for the cells of one row and month, into an array of the caller's [W m⁻²]. */
export function thinLayerDailyInto(
  out: Float64Array,
  moments: DailyMoments,
  optics: LayerOptics,
  cells: { opticalDepth: Float64Array; surfaceAlbedo: Float64Array; cloudFraction: Float64Array },
): Float64Array {
  for (let i = 0; i < out.length; i += 1) {
    out[i] =
      cells.opticalDepth[i]! *
      thinLayerDailySlope(moments, optics, cells.surfaceAlbedo[i]!, cells.cloudFraction[i]!);
  }
  return out;
}

function evaluate(input: ThinLayerDailyInput): ForcingResult {
  const given = readInputs(input, NAMES, ['ageKaBp', 'orbit', 'longwave']);
  const { orbit, cautions: orbitCautions } = readOrbitOrAge(input);
  const order = upscatterOrder(given.asymmetry, SERIES_TOLERANCE);
  const moments = dailyMoments(
    given.latitudeDeg,
    given.solarLongitudeDeg,
    orbit,
    given.solarConstantWm2,
    order,
  );
  const optics: LayerOptics = {
    singleScatteringAlbedo: given.singleScatteringAlbedo,
    dailyUpscatter: dailyMeanUpscatter(hgUpscatterCoefficients(given.asymmetry, order), moments.legendre),
    upscatterMean: upscatterMean(given.asymmetry),
    transmittance: given.transmittance,
  };
  const slope = thinLayerDailySlope(moments, optics, given.surfaceAlbedo, given.cloudFraction);
  const lit = moments.incidentWm2 > 0;
  const state = { ...given, upscatterFraction: optics.upscatterMean, cosSolarZenith: moments.meanMu };
  return result(
    lit ? slope * given.opticalDepth : 0,
    longwaveTerm(input, given.opticalDepth),
    lit
      ? criticalOfBracket(given.surfaceAlbedo, optics.dailyUpscatter, optics.upscatterMean, moments.meanMu)
      : null,
    [...orbitCautions, ...(lit ? thinLayerCautions(state) : [])],
  );
}

export const thinLayerDaily: ForcingMethod<ThinLayerDailyInput> = {
  id: 'thin-layer-daily',
  title: 'Thin layer, daily form',
  formula:
    '\\Delta F = -\\frac{S_0}{\\rho^2} T^2 (1-A_c)\\,\\tau f_{day}\\left\\langle \\omega(1-R_s)\\left[\\beta(\\mu_0) - 2\\bar\\beta R_s\\mu_0\\right] - (1-\\omega)R_s(1+2\\mu_0)\\right\\rangle',
  source: 'First order of Coakley & Chylek (1975), J. Atmos. Sci. 32, 409–418, integrated over the lit hours',
  inputs: declare(NAMES),
  otherInputs: ['ageKaBp', 'orbit', 'longwave'],
  evaluate,
};
