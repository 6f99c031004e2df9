import { gaussLegendre, type GaussRule } from '../optics/gauss-legendre';
import { sunCourse } from '../orbit/daily-insolation';
import type { Orbit } from '../orbit/orbit';
import { requireWithin } from '../physical/domain-error';

/** Means over the lit hours of one day at one latitude, all that a first-order layer needs to know of the sun. */
export interface DailyMoments {
  /** S₀/ρ² · f_day [W m⁻²]: normal-incidence sunlight spread over the day; 0 in polar night */
  incidentWm2: number;
  /** ⟨μ₀⟩ */
  meanMu: number;
  /** ⟨P_n(μ₀)⟩ for n = 1, 3, 5, … */
  legendre: Float64Array;
}

/**
 * Lit-hour means of the odd Legendre polynomials of μ₀ = a + b cos H, H even over the lit part of the day.
 * With `hgUpscatterCoefficients(g, order)` the daily mean upscatter of any g follows without a further integral:
 * ⟨β⟩ = ½ − ½ Σ k_n ⟨P_n⟩.
 *
 * @param latitudeDeg φ [°]
 * @param solarLongitudeDeg λ [°]
 * @param solarConstantWm2 S₀ at the semi-major axis [W m⁻²]
 * @param order highest odd n; `upscatterOrder(g)` tells how many a g needs
 *
 * @param rule made once by `litHoursRule(order)` where many rows and months are wanted
 */
export function dailyMoments(
  latitudeDeg: number,
  solarLongitudeDeg: number,
  orbit: Orbit,
  solarConstantWm2: number,
  order: number,
  rule: GaussRule = litHoursRule(order),
): DailyMoments {
  requireWithin('solarConstantWm2', solarConstantWm2, 'W m⁻²', 0, 10_000);
  const { a, b, h0, sunDistanceAu } = sunCourse(latitudeDeg, solarLongitudeDeg, orbit);
  const legendre = new Float64Array((order + 1) / 2);
  if (h0 === 0) return { incidentWm2: 0, meanMu: 0, legendre };
  const { nodes, weights } = rule;
  for (let i = 0; i < nodes.length; i += 1) {
    // Rounding may put μ₀ a hair below the horizon at H₀ itself.
    const mu = Math.max(0, a + b * Math.cos((h0 * (1 + nodes[i]!)) / 2));
    addOddLegendre(legendre, mu, weights[i]! / 2);
  }
  return {
    incidentWm2: ((solarConstantWm2 / (sunDistanceAu * sunDistanceAu)) * h0) / Math.PI,
    meanMu: (a * h0 + b * Math.sin(h0)) / h0,
    legendre,
  };
}

/** P_n(μ₀) is a polynomial of degree n in cos H: a Gauss rule in H of order/2 + 24 points leaves less than 1e-12. */
export function litHoursRule(order: number): GaussRule {
  return gaussLegendre(Math.ceil(order / 2) + 24);
}

/** ⟨β⟩ over the lit hours. */
export function dailyMeanUpscatter(coefficients: Float64Array, legendre: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < coefficients.length; i += 1) sum += coefficients[i]! * legendre[i]!;
  return 0.5 - 0.5 * sum;
}

function addOddLegendre(sums: Float64Array, mu: number, weight: number): void {
  let even = 1;
  let odd = mu;
  for (let i = 0; i < sums.length; i += 1) {
    sums[i]! += weight * odd;
    const n = 2 * i + 1;
    even = ((2 * n + 1) * mu * odd - n * even) / (n + 1);
    odd = ((2 * n + 3) * mu * even - (n + 1) * odd) / (n + 2);
  }
}
