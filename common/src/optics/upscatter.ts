import { requireWithin } from '../physical/domain-error';

/**
 * Largest |g| served. Beyond it the series needs tens of thousands of terms, and a layer scatters so nearly straight
 * ahead that no upscatter fraction describes it; aerosol stays below 0.95.
 */
export const MAX_ASYMMETRY = 0.999;

/** Terms below this do not move a fraction of order one in double precision. */
const NEGLIGIBLE = 1e-17;

/**
 * Coefficients of the upscatter fraction of a Henyey–Greenstein layer in odd Legendre polynomials:
 *
 *   β(μ₀) = ½ − ½ Σ_{n odd} k_n P_n(μ₀),  k_n = (2n+1) gⁿ c_n,  c₁ = ½,  c_{n+2} = −c_n n/(n+3)
 *
 * so that any mean of β over sun angles follows from the same mean of P_n.
 *
 * @param asymmetry g, −0.999 to 0.999
 * @param order highest n wanted, odd
 * @returns k₁, k₃, …, k_order: (order + 1)/2 values
 *
 * Source: Wiscombe & Grams (1976), J. Atmos. Sci. 33, 2440–2451 (from memory); checks/optics/FORMULAS.md §4.
 */
export function hgUpscatterCoefficients(asymmetry: number, order: number): Float64Array {
  const g = checkedAsymmetry(asymmetry);
  const coefficients = new Float64Array((order + 1) / 2);
  let moment = g;
  let c = 0.5;
  for (let i = 0; i < coefficients.length; i += 1) {
    const n = 2 * i + 1;
    coefficients[i] = (2 * n + 1) * moment * c;
    moment *= g * g;
    c *= -n / (n + 3);
  }
  return coefficients;
}

/**
 * Highest odd n whose term may still exceed `tolerance`, by |gⁿ| alone (the other factors fall with n).
 *
 * @param tolerance absolute, of the upscatter fraction
 */
export function upscatterOrder(asymmetry: number, tolerance = NEGLIGIBLE): number {
  const size = Math.abs(checkedAsymmetry(asymmetry));
  if (size < tolerance) return 1;
  const n = Math.ceil(Math.log(tolerance) / Math.log(size));
  return Math.max(1, n % 2 === 1 ? n : n + 1);
}

/**
 * Upscatter fraction at one sun angle: the share of singly scattered sunlight that leaves upwards, for the
 * Henyey–Greenstein phase function, exact (no approximation beside double precision).
 *
 * @param asymmetry g, −0.999 to 0.999
 * @param cosSolarZenith μ₀, 0 (sun on the horizon: ½ for any g) to 1
 *
 * Limits: Henyey–Greenstein is not the phase function of dust; see `upscatterMean`.
 * Source: as `hgUpscatterCoefficients`. Checked against: checks/optics/upscatter_mu0.csv.
 */
export function upscatterAt(asymmetry: number, cosSolarZenith: number): number {
  const g = checkedAsymmetry(asymmetry);
  const mu = requireWithin('cosSolarZenith', cosSolarZenith, '', 0, 1);
  let sum = 0;
  let moment = g;
  let c = 0.5;
  let even = 1; // P_{n−1}
  let odd = mu; // P_n
  for (let n = 1; Math.abs((2 * n + 1) * moment * c) > NEGLIGIBLE; n += 2) {
    sum += (2 * n + 1) * moment * c * odd;
    moment *= g * g;
    c *= -n / (n + 3);
    even = ((2 * n + 1) * mu * odd - n * even) / (n + 1);
    odd = ((2 * n + 3) * mu * even - (n + 1) * odd) / (n + 2);
  }
  return 0.5 - 0.5 * sum;
}

/**
 * Hemispheric mean β̄ = ∫₀¹ β(μ₀) dμ₀, the one the thin-layer formula needs, for Henyey–Greenstein:
 *
 *   β̄ = (1−g)/(2g) · [ (1+g) / AGM(1, √(1−g²)) − 1 ],  ½ at g = 0
 *
 * (AGM: arithmetic–geometric mean). The flux-weighted mean 2∫βμ₀dμ₀ = (1−g)/2 is another number.
 *
 * @param asymmetry g, −0.999 to 0.999
 *
 * Limits: against the Mie phase function at 550 nm it is 5 to 12 % too high for coarse dust and 1 to 2 % too low for
 * fine modes (checks/optics/FORMULAS.md §4).
 * Source: as `hgUpscatterCoefficients`. Checked against: checks/optics/upscatter_mean.csv.
 */
export function upscatterMean(asymmetry: number): number {
  const g = checkedAsymmetry(asymmetry);
  if (Math.abs(g) < 0.05) return meanBySeries(g); // the closed form divides a small difference by g
  let arithmetic = 1;
  let geometric = Math.sqrt(1 - g * g);
  // Nine steps reach the last bit from any start here; equality may never come, so the count decides.
  for (let step = 0; step < 9; step += 1) {
    [arithmetic, geometric] = [(arithmetic + geometric) / 2, Math.sqrt(arithmetic * geometric)];
  }
  return ((1 - g) / (2 * g)) * ((1 + g) / arithmetic - 1);
}

/**
 * β̄ ≈ (1 − 7g/8)/2, the linear approximation of the literature, for comparison: 7 to 9 % too low at g = 0.6 to 0.8.
 *
 * Source: Wiscombe & Grams (1976) (from memory). Checked against: checks/optics/upscatter_mean.csv.
 */
export function upscatterMeanLinear(asymmetry: number): number {
  return (1 - (7 / 8) * checkedAsymmetry(asymmetry)) / 2;
}

function meanBySeries(g: number): number {
  let sum = 0;
  let moment = g;
  let c = 0.5;
  for (let n = 1; n <= 15; n += 2) {
    sum += (2 * n + 1) * moment * c * c;
    moment *= g * g;
    c *= -n / (n + 3);
  }
  return 0.5 - 0.5 * sum;
}

function checkedAsymmetry(asymmetry: number): number {
  return requireWithin('asymmetry', asymmetry, '', -MAX_ASYMMETRY, MAX_ASYMMETRY);
}
