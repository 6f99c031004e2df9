import { hgUpscatterCoefficients, upscatterMean } from '../optics/upscatter';
import type { EstimateMethod } from './estimate-inputs';
import {
  LIGHT_CONSTANT,
  LIGHT_HIGHEST_ORDER,
  LIGHT_INSOLATION,
  LIGHT_LIT,
  LIGHTS,
  lightOfOrder,
} from './light-moments';
import { ALBEDO_POWERS } from './region-moments';

/** Values of one member (or of the central case) that the shortwave depends on. */
export interface ShortwaveValues {
  singleScatteringAlbedo: number;
  asymmetry: number;
  transmittance: number;
  surfaceAlbedoFactor: number;
  shortwaveEfficiencyWm2: number;
}

/**
 * Coefficients of a method over the moments of `regionMoments`: ΔF = Σ coefficient · Z [W m⁻²].
 *
 * - thin-layer: −½ S₀ T² [ω β̄ (1−R)² − 2(1−ω)R], Haywood & Shine (1995), Geophys. Res. Lett. 22, 603;
 * - thin-layer-daily: −T² (S₀/ρ²) f ⟨ω(1−R)[β(μ₀) − 2β̄Rμ₀] − (1−ω)R(1+2μ₀)⟩, first order of Coakley & Chylek
 *   (1975), J. Atmos. Sci. 32, 409;
 * - simple-albedo: −Q T² Δα with Δα = 2[ω β̄ (1−R)² − 2(1−ω)R] per unit τ, that of the thin layer and its surface
 *   averaged over the sunlit hemisphere, Q the daily mean insolation of the place and month;
 * - efficiency: E per unit τ.
 *
 * Clouds and τ are in the moments. β(μ₀) is that of Henyey and Greenstein, exact up to the order kept.
 */
export function shortwaveCoefficients(
  method: EstimateMethod,
  values: ShortwaveValues,
  solarConstantWm2: number,
): Float64Array {
  const coefficients = new Float64Array(LIGHTS * ALBEDO_POWERS);
  const { transmittance: t, shortwaveEfficiencyWm2 } = values;
  if (method === 'efficiency') coefficients[0] = shortwaveEfficiencyWm2;
  if (method === 'thin-layer')
    addBracket(coefficients, LIGHT_CONSTANT, -0.5 * solarConstantWm2 * t * t, values);
  if (method === 'simple-albedo') addBracket(coefficients, LIGHT_INSOLATION, -2 * t * t, values);
  if (method === 'thin-layer-daily') addDaily(coefficients, values);
  scaleAlbedo(coefficients, values.surfaceAlbedoFactor);
  return coefficients;
}

/** strength · [ω β̄ (1−R)² − 2(1−ω)R] on one light. */
function addBracket(
  coefficients: Float64Array,
  light: number,
  strength: number,
  values: ShortwaveValues,
): void {
  const { singleScatteringAlbedo: omega, asymmetry } = values;
  const scattered = omega * upscatterMean(asymmetry);
  const at = light * ALBEDO_POWERS;
  coefficients[at]! += strength * scattered;
  coefficients[at + 1]! -= strength * 2 * (scattered + 1 - omega);
  coefficients[at + 2]! += strength * scattered;
}

function addDaily(coefficients: Float64Array, values: ShortwaveValues): void {
  const { singleScatteringAlbedo: omega, asymmetry, transmittance: t } = values;
  const strength = -t * t;
  const add = (light: number, power: number, value: number) => {
    coefficients[light * ALBEDO_POWERS + power]! += strength * value;
  };
  // ω (1−R) β(μ₀), β = ½ − ½ Σ k_n P_n
  add(LIGHT_LIT, 0, omega / 2);
  add(LIGHT_LIT, 1, -omega / 2);
  hgUpscatterCoefficients(asymmetry, LIGHT_HIGHEST_ORDER).forEach((k, i) => {
    add(lightOfOrder(2 * i + 1), 0, (-omega * k) / 2);
    add(lightOfOrder(2 * i + 1), 1, (omega * k) / 2);
  });
  // −2 ω β̄ R (1−R) μ₀
  const returned = 2 * omega * upscatterMean(asymmetry);
  add(LIGHT_INSOLATION, 1, -returned);
  add(LIGHT_INSOLATION, 2, returned);
  // −(1−ω) R (1 + 2 μ₀)
  add(LIGHT_LIT, 1, -(1 - omega));
  add(LIGHT_INSOLATION, 1, -2 * (1 - omega));
}

function scaleAlbedo(coefficients: Float64Array, factor: number): void {
  if (factor === 1) return;
  for (let i = 0; i < coefficients.length; i++) coefficients[i]! *= factor ** (i % ALBEDO_POWERS);
}
