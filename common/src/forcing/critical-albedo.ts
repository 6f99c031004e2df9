import { requireWithin } from '../physical/domain-error';

/**
 * Single-scattering albedo at which the thin layer's shortwave effect is zero:
 *
 *   ω_c = 2R_s / (2R_s + β̄ (1−R_s)²);  above it the layer cools, below it it warms
 *
 * @param upscatterFraction β̄, 0 to 1
 * @param surfaceAlbedo R_s, 0 (ω_c = 0: every layer cools) to 1 (ω_c = 1)
 *
 * Limits: first order in optical depth; the value of a real layer shifts with τ. A multi-model study puts the
 * critical surface albedo of dust at 0.28, this formula with ω 0.95 at 0.48 to 0.53.
 * Source: Chylek & Coakley (1974), Science 183, 75–77 (from memory).
 * Checked against: checks/optics/critical_ssa.csv.
 */
export function criticalSingleScatteringAlbedo(upscatterFraction: number, surfaceAlbedo: number): number {
  requireWithin('upscatterFraction', upscatterFraction, '', 0, 1);
  requireWithin('surfaceAlbedo', surfaceAlbedo, '', 0, 1);
  if (surfaceAlbedo === 0) return 0;
  return (2 * surfaceAlbedo) / (2 * surfaceAlbedo + upscatterFraction * (1 - surfaceAlbedo) ** 2);
}

/**
 * Surface albedo above which a thin layer warms: the smaller root of (1−R)² = q R, q = 2(1−ω)/(ω β̄).
 *
 * @param singleScatteringAlbedo ω, 0 (critical albedo 0) to 1 (critical albedo 1)
 * @param upscatterFraction β̄, 0 to 1
 *
 * Source and checks as `criticalSingleScatteringAlbedo`.
 */
export function criticalSurfaceAlbedo(singleScatteringAlbedo: number, upscatterFraction: number): number {
  requireWithin('singleScatteringAlbedo', singleScatteringAlbedo, '', 0, 1);
  requireWithin('upscatterFraction', upscatterFraction, '', 0, 1);
  const reflected = singleScatteringAlbedo * upscatterFraction;
  if (singleScatteringAlbedo === 1) return 1;
  if (reflected === 0) return 0;
  const half = (1 - singleScatteringAlbedo) / reflected; // q/2
  // The product of both roots is 1: dividing keeps the digits that 1 + q/2 − √(q + q²/4) loses for large q.
  return 1 / (1 + half + Math.sqrt(2 * half + half * half));
}
