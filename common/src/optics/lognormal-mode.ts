import { DomainError, requireWithin } from '../physical/domain-error';
import { normalCdf } from '../statistics/special-functions';

/**
 * Number-lognormal size mode, cut at two radii:
 *
 *   dN/dln r = N/(√(2π) L) exp(−ln²(r/r_g)/(2L²)),  L = ln σ_g,  r_min ≤ r ≤ r_max
 *
 * The cut removes particles; it does not scale the rest up.
 */
export interface LognormalMode {
  /** r_g, median radius by number (neither the mean nor the mode) [µm] */
  readonly medianRadiusUm: number;
  /** σ_g, above 1 */
  readonly geometricStdDev: number;
  readonly minRadiusUm: number;
  readonly maxRadiusUm: number;
}

export const MODE_LIMITS = {
  medianRadiusUm: [1e-4, 100],
  geometricStdDev: [1.01, 5],
  radiusUm: [1e-6, 1e4],
} as const;

/** Half width of a mode without stated limits, and of the range integrated over, in units of ln σ_g. */
export const HALF_WIDTH = 4.5;

/** Limits of a mode that states none: ±4.5 ln σ_g about the median radius by surface, r_g exp(2L²). */
export function unstatedLimits(medianRadiusUm: number, geometricStdDev: number): [number, number] {
  const spread = Math.log(geometricStdDev);
  const centre = medianRadiusUm * Math.exp(2 * spread * spread);
  return [centre * Math.exp(-HALF_WIDTH * spread), centre * Math.exp(HALF_WIDTH * spread)];
}

/** @throws DomainError naming the field, also when the limits leave (nearly) nothing of the mode */
export function requireMode(mode: LognormalMode, prefix = ''): void {
  requireWithin(`${prefix}medianRadiusUm`, mode.medianRadiusUm, 'µm', ...MODE_LIMITS.medianRadiusUm);
  requireWithin(`${prefix}geometricStdDev`, mode.geometricStdDev, '', ...MODE_LIMITS.geometricStdDev);
  requireWithin(`${prefix}minRadiusUm`, mode.minRadiusUm, 'µm', ...MODE_LIMITS.radiusUm);
  requireWithin(`${prefix}maxRadiusUm`, mode.maxRadiusUm, 'µm', ...MODE_LIMITS.radiusUm);
  if (mode.maxRadiusUm <= mode.minRadiusUm) {
    throw new DomainError('contradictory-input', {
      field: `${prefix}maxRadiusUm`,
      value: mode.maxRadiusUm,
      unit: 'µm',
      allowed: `above ${prefix}minRadiusUm (${mode.minRadiusUm} µm)`,
    });
  }
  const whole = mode.medianRadiusUm ** 3 * Math.exp(4.5 * Math.log(mode.geometricStdDev) ** 2);
  if (radiusMoment(mode, 3) < 1e-9 * whole) {
    throw new DomainError('empty-mode', {
      field: `${prefix}minRadiusUm`,
      value: mode.minRadiusUm,
      unit: 'µm',
      allowed: `such that the limits hold more than a billionth of the mode's volume`,
      remedy: 'Move the limits to where the mode has particles.',
    });
  }
}

/**
 * ∫ rᵖ dN between the limits, per particle of the uncut mode [µmᵖ], in closed form.
 *
 * @param power p; 0 gives the number fraction inside the limits
 */
export function radiusMoment(mode: LognormalMode, power: number): number {
  const spread = Math.log(mode.geometricStdDev);
  const low = Math.log(mode.minRadiusUm / mode.medianRadiusUm) / spread - power * spread;
  const high = Math.log(mode.maxRadiusUm / mode.medianRadiusUm) / spread - power * spread;
  const whole = mode.medianRadiusUm ** power * Math.exp((power * power * spread * spread) / 2);
  // Above the centre the two probabilities are near 1; their complements keep the digits.
  return whole * (low > 0 ? normalCdf(-low) - normalCdf(-high) : normalCdf(high) - normalCdf(low));
}

/** r_eff = ∫ r³ dN / ∫ r² dN [µm]. */
export function effectiveRadius(mode: LognormalMode): number {
  return radiusMoment(mode, 3) / radiusMoment(mode, 2);
}

/** Share of the mode's mass in particles of a diameter below the one given, 0 to 1. */
export function massFractionBelow(mode: LognormalMode, diameterUm: number): number {
  const radius = requireWithin('diameterUm', diameterUm, 'µm', 0, 2e4) / 2;
  if (radius <= mode.minRadiusUm) return 0;
  if (radius >= mode.maxRadiusUm) return 1;
  return radiusMoment({ ...mode, maxRadiusUm: radius }, 3) / radiusMoment(mode, 3);
}

/**
 * r_g of a mode known by its median diameter by mass: r_g = (D/2) exp(−3L²).
 *
 * @param massMedianDiameterUm of the uncut mode [µm]
 */
export function medianRadiusFromMassMedianDiameter(
  massMedianDiameterUm: number,
  geometricStdDev: number,
): number {
  const diameter = requireWithin('massMedianDiameterUm', massMedianDiameterUm, 'µm', 1e-4, 1e3);
  const sigma = requireWithin('geometricStdDev', geometricStdDev, '', ...MODE_LIMITS.geometricStdDev);
  return (diameter / 2) * Math.exp(-3 * Math.log(sigma) ** 2);
}

/**
 * dN/dln r, dS/dln r [µm²] and dV/dln r [µm³] at a radius, per particle of the uncut mode; 0 outside the limits.
 * S is surface 4πr², V volume.
 */
export function sizeDensities(
  mode: LognormalMode,
  radiusUm: number,
): { number: number; surface: number; volume: number } {
  if (radiusUm < mode.minRadiusUm || radiusUm > mode.maxRadiusUm) return { number: 0, surface: 0, volume: 0 };
  const spread = Math.log(mode.geometricStdDev);
  const z = Math.log(radiusUm / mode.medianRadiusUm) / spread;
  const number = Math.exp((-z * z) / 2) / (Math.sqrt(2 * Math.PI) * spread);
  const surface = 4 * Math.PI * radiusUm * radiusUm * number;
  return { number, surface, volume: (surface * radiusUm) / 3 };
}
