import type { LayerFluxes } from './layer-scheme';

/** Coefficients of the two-stream equations, per optical depth. */
export interface TwoStreamCoefficients {
  gamma1: number;
  gamma2: number;
  /** share of the scattered beam that goes up at once */
  gamma3: number;
}

type Closure = (omega: number, g: number, mu: number) => TwoStreamCoefficients;

const ROOT_3 = Math.sqrt(3);

const eddington: Closure = (omega, g, mu) => ({
  gamma1: (7 - omega * (4 + 3 * g)) / 4,
  gamma2: -(1 - omega * (4 - 3 * g)) / 4,
  gamma3: (2 - 3 * g * mu) / 4,
});

const quadrature: Closure = (omega, g, mu) => ({
  gamma1: (ROOT_3 / 2) * (2 - omega * (1 + g)),
  gamma2: (ROOT_3 / 2) * omega * (1 - g),
  gamma3: (1 - ROOT_3 * g * mu) / 2,
});

/** Recommended for the infrared only (Toon et al. 1989, from memory); its solar γ₃ is borrowed from the quadrature. */
const hemisphericMean: Closure = (omega, g, mu) => ({
  gamma1: 2 - omega * (1 + g),
  gamma2: omega * (1 - g),
  gamma3: (1 - ROOT_3 * g * mu) / 2,
});

/** Published closures with delta scaling or without, by the name a request uses. */
export const CLOSURES = {
  'delta-eddington': { title: 'Delta-Eddington', coefficients: eddington, scaled: true },
  'delta-quadrature': { title: 'Delta-quadrature', coefficients: quadrature, scaled: true },
  eddington: { title: 'Eddington', coefficients: eddington, scaled: false },
  quadrature: { title: 'Quadrature', coefficients: quadrature, scaled: false },
  'hemispheric-mean': { title: 'Hemispheric mean', coefficients: hemisphericMean, scaled: false },
} as const;

export type ClosureId = keyof typeof CLOSURES;

export const CLOSURE_IDS = Object.keys(CLOSURES) as ClosureId[];

/** Conservative scattering is approached this closely: a distance of 2e-8 in R and T. */
const NEARLY_CONSERVATIVE = 1 - 1e-9;
const RESONANCE = 1e-6;

/**
 * Reflectance and transmittance of a layer over a black surface by a two-stream closure, the sun at one angle.
 *
 * @param opticalDepth τ, 0 or more, vertical
 * @param singleScatteringAlbedo ω, 0 to 1
 * @param asymmetry g, −1 to 1
 * @param cosSolarZenith μ₀, above 0, to 1
 *
 * Limits: Eddington and quadrature answer negative reflectances for thin layers under a high sun; over dark ground
 * delta-Eddington understates the albedo of a thin layer by 15 to 22 % at τ 0.01.
 * Source: Meador & Weaver (1980), J. Atmos. Sci. 37, 630–643; scaling f = g² by Joseph, Wiscombe & Weinman (1976),
 * J. Atmos. Sci. 33, 2452–2459 (from memory).
 * Checked against: checks/optics/rt_twostream.csv, whose rows solve the equations by matrix exponential.
 */
export function twoStreamLayer(
  closure: ClosureId,
  opticalDepth: number,
  singleScatteringAlbedo: number,
  asymmetry: number,
  cosSolarZenith: number,
): LayerFluxes {
  const { coefficients, scaled } = CLOSURES[closure];
  const f = scaled ? asymmetry * asymmetry : 0;
  const omega = (singleScatteringAlbedo * (1 - f)) / (1 - singleScatteringAlbedo * f);
  const tau = (1 - singleScatteringAlbedo * f) * opticalDepth;
  const g = scaled ? asymmetry / (1 + asymmetry) : asymmetry;
  const held = Math.min(omega, NEARLY_CONSERVATIVE);
  return closedForm(tau, held, coefficients(held, g, cosSolarZenith), cosSolarZenith);
}

/** Written in falling exponentials alone, so that no thickness overflows. */
function closedForm(
  tau: number,
  omega: number,
  { gamma1, gamma2, gamma3 }: TwoStreamCoefficients,
  mu: number,
): LayerFluxes {
  const gamma4 = 1 - gamma3;
  const alpha1 = gamma1 * gamma4 + gamma2 * gamma3;
  const alpha2 = gamma1 * gamma3 + gamma2 * gamma4;
  let k = Math.sqrt(gamma1 * gamma1 - gamma2 * gamma2);
  if (Math.abs(1 - k * mu) < RESONANCE) k *= 1 + RESONANCE; // the solution is smooth there, the form is not
  const decay = Math.exp(-k * tau);
  const beam = Math.exp(-tau / mu);
  const squared = decay * decay;
  const scale = omega / ((1 - k * k * mu * mu) * (k + gamma1 + (k - gamma1) * squared));
  const up =
    (1 - k * mu) * (alpha2 + k * gamma3) -
    (1 + k * mu) * (alpha2 - k * gamma3) * squared -
    2 * k * (gamma3 - alpha2 * mu) * beam * decay;
  const down =
    (1 + k * mu) * (alpha1 + k * gamma4) * beam -
    (1 - k * mu) * (alpha1 - k * gamma4) * squared * beam -
    2 * k * (gamma4 + alpha1 * mu) * decay;
  return { reflectance: scale * up, transmittance: beam - scale * down };
}
