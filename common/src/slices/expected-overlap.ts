import { normalCdf } from '../statistics/special-functions';

export interface AgeWindow {
  youngKaBp: number;
  oldKaBp: number;
}

/**
 * Length [ka] of an age interval that lies in a window, averaged over a normal error of the age:
 *
 *   E = ∫ₐᵇ [Φ((o − t)/σ) − Φ((y − t)/σ)] dt = σ [G((o−a)/σ) − G((o−b)/σ) − G((y−a)/σ) + G((y−b)/σ)],
 *   G(z) = z Φ(z) + φ(z).
 *
 * With σ = 0 the plain overlap. The error moves the interval as a whole; it does not change its length.
 */
export function expectedOverlapKa(interval: AgeWindow, window: AgeWindow, sigmaKa: number): number {
  const { youngKaBp: a, oldKaBp: b } = interval;
  const { youngKaBp: y, oldKaBp: o } = window;
  if (sigmaKa === 0) return Math.max(0, Math.min(b, o) - Math.max(a, y));
  const g = (age: number) => integralOfPhi(age / sigmaKa);
  return Math.max(0, sigmaKa * (g(o - a) - g(o - b) - g(y - a) + g(y - b)));
}

/** Chance [1] that a point in time lies in a window. */
export function chanceInside(ageKaBp: number, window: AgeWindow, sigmaKa: number): number {
  if (sigmaKa === 0) return Number(ageKaBp >= window.youngKaBp && ageKaBp <= window.oldKaBp);
  return normalCdf((window.oldKaBp - ageKaBp) / sigmaKa) - normalCdf((window.youngKaBp - ageKaBp) / sigmaKa);
}

function integralOfPhi(z: number): number {
  return z * normalCdf(z) + Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
}
