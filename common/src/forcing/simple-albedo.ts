import { declare, readInputs } from './inputs';
import { longwaveTerm, type LongwaveInput } from './longwave';
import { result, type ForcingMethod, type ForcingResult } from './method';

export interface SimpleAlbedoInput {
  insolationWm2: number;
  transmittance: number;
  cloudFraction: number;
  albedoChange: number;
  longwave?: LongwaveInput;
}

const NAMES = ['insolationWm2', 'transmittance', 'cloudFraction', 'albedoChange'] as const;

/**
 * Shortwave forcing of a changed albedo, of the surface or of the layer–surface pair [W m⁻²]:
 *
 *   ΔF = −Q T² (1−A_c) Δα
 *
 * Limits: clouds hide the surface completely; no multiple reflection between ground and air; one mean for all sun
 * angles. Source: Charlson et al. (1992), Science 255, 423–430, for the attenuation by T² and 1 − A_c (from memory).
 */
export function simpleAlbedoForcing(
  insolationWm2: number,
  transmittance: number,
  cloudFraction: number,
  albedoChange: number,
): number {
  return -insolationWm2 * transmittance ** 2 * (1 - cloudFraction) * albedoChange;
}

function evaluate(input: SimpleAlbedoInput): ForcingResult {
  const { insolationWm2, transmittance, cloudFraction, albedoChange } = readInputs(input, NAMES, [
    'longwave',
  ]);
  // A changed surface has no longwave term of its own, so its absence is no bias to warn of.
  const longwave =
    input.longwave === undefined ? { longwaveWm2: 0, cautions: [] } : longwaveTerm(input, null);
  const shortwave = simpleAlbedoForcing(insolationWm2, transmittance, cloudFraction, albedoChange);
  return result(shortwave, longwave, null, []);
}

export const simpleAlbedo: ForcingMethod<SimpleAlbedoInput> = {
  id: 'simple-albedo',
  title: 'Simple albedo change',
  formula: '\\Delta F = -Q\\,T^2\\,(1-A_c)\\,\\Delta\\alpha',
  source: 'Charlson et al. (1992), Science 255, 423–430, for the attenuation',
  inputs: declare(NAMES),
  otherInputs: ['longwave'],
  evaluate,
};
