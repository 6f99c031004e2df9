import { upscatterAt } from '../optics/upscatter';
import type { LayerFluxes, LayerScheme } from './layer-scheme';
import { solverByAngles } from './solver-by-angles';

/**
 * Layer over a black surface at one sun angle, first solution of Coakley & Chylek: diffuse light travels at the sun's
 * slant, so that beam and diffuse light obey the same pair of equations and the whole is a homogeneous two-stream.
 *
 *   γ₁ = (1 − ω(1−β))/μ₀, γ₂ = ωβ/μ₀, k² = γ₁² − γ₂²
 *   R = γ₂ sinh kτ / (k cosh kτ + γ₁ sinh kτ),  T = k / (k cosh kτ + γ₁ sinh kτ)
 *
 * @param opticalDepth τ, 0 or more
 * @param singleScatteringAlbedo ω, 0 to 1; exact at 1, where k = 0
 * @param upscatter β(μ₀), 0 to 1
 * @param cosSolarZenith μ₀, above 0, to 1
 *
 * Limits: exact to first order in τ at every angle. The mean over the sunlit hemisphere stays within 1.6 % of the
 * sum of the thin-layer terms up to τ 0.1 and 6 % at τ 3; a single high sun over a thick layer is off by up to 24 %
 * at τ 1 and 40 % at τ 3 (checks/optics/error_summary.csv).
 * Source: Coakley & Chylek (1975), J. Atmos. Sci. 32, 409–418 (from memory).
 * Checked against: checks/optics/rt_twostream.csv.
 */
export function coakleyChylekLayer(
  opticalDepth: number,
  singleScatteringAlbedo: number,
  upscatter: number,
  cosSolarZenith: number,
): LayerFluxes {
  const absorbed = (1 - singleScatteringAlbedo) / cosSolarZenith;
  const gamma2 = (singleScatteringAlbedo * upscatter) / cosSolarZenith;
  const gamma1 = absorbed + gamma2;
  const k = Math.sqrt(absorbed * (absorbed + 2 * gamma2));
  const decay = Math.exp(-k * opticalDepth);
  // (1 − e^(−2kτ))/k, which is 2τ where nothing is absorbed.
  const path = k > 0 ? -Math.expm1(-2 * k * opticalDepth) / k : 2 * opticalDepth;
  const bottom = 1 + decay * decay + gamma1 * path;
  return { reflectance: (gamma2 * path) / bottom, transmittance: (2 * decay) / bottom };
}

/** At every sun angle its exact Henyey–Greenstein upscatter. */
export const coakleyChylek: LayerScheme = {
  title: 'Slanted layer (Coakley & Chylek, first solution)',
  source:
    'Coakley & Chylek (1975), J. Atmos. Sci. 32, 409–418, with exact Henyey–Greenstein upscatter per sun angle',
  prepare: (asymmetry, cosSolarZeniths) =>
    solverByAngles(cosSolarZeniths, (mu) => {
      const upscatter = upscatterAt(asymmetry, mu);
      return (opticalDepth, singleScatteringAlbedo) =>
        coakleyChylekLayer(opticalDepth, singleScatteringAlbedo, upscatter, mu);
    }),
};
