import type { MemberValues } from './member-values';
import type { PreparedEstimate } from './prepared-estimate';
import { dotMoments, type MomentSums } from './region-moments';
import { shortwaveCoefficients } from './shortwave-coefficients';

/**
 * Fluxes of one member and region, area share × W m⁻², so that regions add up. Order of the eight numbers:
 * shortwave all sky, shortwave clear sky, longwave all sky, longwave clear sky, each for slice and reference.
 */
export const FLUXES = 8;
export const FLUX = {
  'all sky': { shortwave: { slice: 0, reference: 1 }, longwave: { slice: 4, reference: 5 } },
  'clear sky': { shortwave: { slice: 2, reference: 3 }, longwave: { slice: 6, reference: 7 } },
} as const;

/** What of a member is the same in every region. */
export interface MemberCoefficients {
  values: MemberValues;
  slice: Float64Array;
  reference: Float64Array;
}

export function memberCoefficients({ inputs }: PreparedEstimate, values: MemberValues): MemberCoefficients {
  const slice = shortwaveCoefficients(inputs.method, values, inputs.slice.solarConstantWm2);
  const same = inputs.slice.solarConstantWm2 === inputs.reference.solarConstantWm2;
  const reference = same
    ? slice
    : shortwaveCoefficients(inputs.method, values, inputs.reference.solarConstantWm2);
  return { values, slice, reference };
}

/**
 * Writes the eight fluxes of a region at `at` in `out`. Where a sky has no number (an efficiency that belongs to all
 * sky says nothing of clear sky) the slot holds zero; `hasSky` tells.
 */
export function memberFluxesInto(
  out: Float64Array,
  at: number,
  { inputs }: PreparedEstimate,
  { values, ...coefficients }: MemberCoefficients,
  sums: Record<'slice' | 'reference', MomentSums>,
  region: number,
  ratio: number,
): void {
  const allSkyEfficiency = inputs.method === 'efficiency' && inputs.shortwaveEfficiency!.sky === 'all';
  const lowCloudShare = inputs.longwave?.sky === 'clear' ? 1 - inputs.longwave.highCloudFraction : 1;
  for (const state of ['slice', 'reference'] as const) {
    const depthFactor = values.opticalDepthFactor * (state === 'slice' ? ratio : 1);
    const clear = depthFactor * dotMoments(coefficients[state], sums[state].clear, region);
    const cloudy = depthFactor * dotMoments(coefficients[state], sums[state].cloudy, region);
    const opticalDepth = depthFactor * sums[state].clear[region * coefficients[state].length]!;
    const longwave = values.longwaveEfficiencyWm2 * opticalDepth;
    const clouds = allSkyEfficiency ? 0 : values.cloudFractionFactor * cloudy;
    out[at + FLUX['all sky'].shortwave[state]] = clear - clouds;
    out[at + FLUX['clear sky'].shortwave[state]] = allSkyEfficiency ? 0 : clear;
    out[at + FLUX['all sky'].longwave[state]] = longwave * lowCloudShare;
    out[at + FLUX['clear sky'].longwave[state]] = inputs.longwave?.sky === 'clear' ? longwave : 0;
  }
}

export type Sky = keyof typeof FLUX;

/** Whether a part of the spectrum has a number under a sky. Without longwave that part is nought, under any sky. */
export function hasSky({ inputs }: PreparedEstimate, sky: Sky, part: 'shortwave' | 'longwave'): boolean {
  if (sky === 'all sky') return true;
  if (part === 'shortwave')
    return inputs.method !== 'efficiency' || inputs.shortwaveEfficiency!.sky === 'clear';
  return inputs.longwave === null || inputs.longwave.sky === 'clear';
}
