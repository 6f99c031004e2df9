import { requireWithin } from '../physical/domain-error';
import { gaussLegendre } from './gauss-legendre';

/** Temperature of a black body that sends what the Sun sends [K] (IAU 2015 Resolution B3, from memory). */
export const SUN_TEMPERATURE_K = 5772;
/** The shortwave band [µm]: 99 % of the Sun's light. */
export const SHORTWAVE_UM = [0.2, 4] as const;
/** The longwave band [µm] of a layer in the air. */
export const LONGWAVE_UM = [4, 50] as const;

/** hc/k [µm K], exact since the SI of 2019, rounded. */
const SECOND_RADIATION_CONSTANT_UM_K = 14387.76877;

export interface BandWeights {
  readonly wavelengthsUm: Float64Array;
  /** share of the band's energy that each wavelength stands for; they add up to 1 */
  readonly weights: Float64Array;
  /** how the weights came about, to stand beside every broadband value */
  readonly basis: string;
}

/**
 * Wavelengths and weights of a band under Planck's law, Gauss–Legendre in ln λ.
 *
 * @param temperatureK 100 to 10000 K
 * @param band lower and upper wavelength [µm]
 * @param count wavelengths, 4 to 200
 *
 * Limits: a black body, not the Sun's spectrum, which has 2 to 3 % less below 0.4 µm and Fraunhofer lines (from memory);
 * no gas absorption.
 * Source: Planck (1901), Ann. Phys. 309, 553–563.
 */
export function planckWeights(
  temperatureK: number,
  band: readonly [number, number],
  count: number,
): BandWeights {
  requireWithin('temperatureK', temperatureK, 'K', 100, 10_000);
  requireWithin('lowUm', band[0], 'µm', 0.1, 199);
  requireWithin('highUm', band[1], 'µm', band[0] * 1.0001, 200);
  requireWithin('count', count, '', 4, 200);
  const { nodes, weights } = gaussLegendre(count);
  const [low, high] = band.map(Math.log) as [number, number];
  const wavelengthsUm = nodes.map((node) => Math.exp(low + ((high - low) * (node + 1)) / 2));
  const energies = wavelengthsUm.map(
    (wavelength, i) => weights[i]! * wavelength * planck(wavelength, temperatureK),
  );
  const total = energies.reduce((sum, energy) => sum + energy, 0);
  return {
    wavelengthsUm,
    weights: energies.map((energy) => energy / total),
    basis: `Planck function at ${temperatureK} K, cut to ${band[0]}–${band[1]} µm`,
  };
}

/** Shortwave weights: Planck at 5772 K, 0.2 to 4 µm. */
export const shortwaveWeights = (count = 24): BandWeights =>
  planckWeights(SUN_TEMPERATURE_K, SHORTWAVE_UM, count);

/** Longwave weights of a layer at its temperature, 4 to 50 µm. */
export const longwaveWeights = (layerTemperatureK: number, count = 32): BandWeights =>
  planckWeights(layerTemperatureK, LONGWAVE_UM, count);

/** What a band mean needs to know at one wavelength. */
export interface OpticsAtWavelength {
  readonly massExtinctionM2PerG: number;
  readonly singleScatteringAlbedo: number;
  readonly asymmetry: number;
}

export interface BandOptics extends OpticsAtWavelength {
  readonly massAbsorptionM2PerG: number;
  readonly basis: string;
}

/**
 * Band means for a thin layer: extinction weighted by energy, ω by the energy extinguished, g by the energy scattered.
 *
 * Limits: thin layers; in a thick one the wavelengths that are absorbed most no longer get their light.
 */
export function bandOptics(
  opticsAt: (wavelengthUm: number) => OpticsAtWavelength,
  { wavelengthsUm, weights, basis }: BandWeights,
): BandOptics {
  let extinguished = 0;
  let scattered = 0;
  let forward = 0;
  wavelengthsUm.forEach((wavelength, i) => {
    const optics = opticsAt(wavelength);
    const extinction = weights[i]! * optics.massExtinctionM2PerG;
    extinguished += extinction;
    scattered += extinction * optics.singleScatteringAlbedo;
    forward += extinction * optics.singleScatteringAlbedo * optics.asymmetry;
  });
  return {
    massExtinctionM2PerG: extinguished,
    singleScatteringAlbedo: extinguished > 0 ? scattered / extinguished : 1,
    asymmetry: scattered > 0 ? forward / scattered : 0,
    massAbsorptionM2PerG: extinguished - scattered,
    basis,
  };
}

/** Planck's law over wavelength, without its constant factor. */
function planck(wavelengthUm: number, temperatureK: number): number {
  return wavelengthUm ** -5 / Math.expm1(SECOND_RADIATION_CONSTANT_UM_K / (wavelengthUm * temperatureK));
}
