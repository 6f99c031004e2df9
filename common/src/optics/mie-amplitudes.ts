import { requireWithin } from '../physical/domain-error';
import { MAX_SIZE_PARAMETER, MIN_SIZE_PARAMETER, requireIndex, type RefractiveIndex } from './mie';
import { MieCoefficients } from './mie-coefficients';

export interface Amplitudes {
  s1: { re: number; im: number };
  s2: { re: number; im: number };
}

/**
 * Amplitude functions of a sphere at one scattering angle:
 *
 *   S₁ = Σ (2j+1)/(j(j+1)) (a_j π_j + b_j τ_j),  S₂ = Σ (2j+1)/(j(j+1)) (a_j τ_j + b_j π_j)
 *   π_j = P_j¹/sin θ,  τ_j = dP_j¹/dθ
 *
 * |S₁|² and |S₂|² stand for light polarised across and along the scattering plane. (4/x²) Re S₁(0°) = qExt.
 *
 * @param cosAngle cosine of the scattering angle, 1 = straight on
 *
 * Source: Bohren & Huffman (1983) chapter 4 (from memory).
 * Checked against: qExt by the optical theorem, qBack at 180°, both of checks/optics/mie_sphere.csv.
 */
export function mieAmplitudes(sizeParameter: number, index: RefractiveIndex, cosAngle: number): Amplitudes {
  requireWithin('sizeParameter', sizeParameter, '', MIN_SIZE_PARAMETER, MAX_SIZE_PARAMETER);
  requireWithin('cosAngle', cosAngle, '', -1, 1);
  requireIndex(index);
  const coefficients = new MieCoefficients();
  coefficients.compute(sizeParameter, index.real, index.imaginary);
  const { terms, aRe, aIm, bRe, bIm } = coefficients;
  const s1 = { re: 0, im: 0 };
  const s2 = { re: 0, im: 0 };
  let piBefore = 0;
  let pi = 1;
  for (let j = 1; j <= terms; j += 1) {
    const tau = j * cosAngle * pi - (j + 1) * piBefore;
    const weight = (2 * j + 1) / (j * (j + 1));
    s1.re += weight * (aRe[j]! * pi + bRe[j]! * tau);
    s1.im += weight * (aIm[j]! * pi + bIm[j]! * tau);
    s2.re += weight * (aRe[j]! * tau + bRe[j]! * pi);
    s2.im += weight * (aIm[j]! * tau + bIm[j]! * pi);
    [piBefore, pi] = [pi, ((2 * j + 1) * cosAngle * pi - (j + 1) * piBefore) / j];
  }
  return { s1, s2 };
}

/** Arrays that `addIntensities` works in, reused from sphere to sphere. */
export class AmplitudeSums {
  plusRe = new Float64Array(0);
  plusIm = new Float64Array(0);
  minusRe = new Float64Array(0);
  minusIm = new Float64Array(0);
  /** (2j+1)/j and (j+1)/j of the recurrence of π_j */
  rise = new Float64Array(0);
  fall = new Float64Array(0);

  /** Sets (2j+1)/(j(j+1)) (a_j ± b_j) of a sphere. */
  take({ terms, aRe, aIm, bRe, bIm }: MieCoefficients): void {
    if (this.plusRe.length <= terms) this.reserve(Math.ceil(terms * 1.3) + 16);
    for (let j = 1; j <= terms; j += 1) {
      const weight = (2 * j + 1) / (j * (j + 1));
      this.plusRe[j] = weight * (aRe[j]! + bRe[j]!);
      this.plusIm[j] = weight * (aIm[j]! + bIm[j]!);
      this.minusRe[j] = weight * (aRe[j]! - bRe[j]!);
      this.minusIm[j] = weight * (aIm[j]! - bIm[j]!);
    }
  }

  private reserve(length: number): void {
    this.plusRe = new Float64Array(length);
    this.plusIm = new Float64Array(length);
    this.minusRe = new Float64Array(length);
    this.minusIm = new Float64Array(length);
    this.rise = Float64Array.from({ length }, (_, j) => (j === 0 ? 0 : (2 * j + 1) / j));
    this.fall = Float64Array.from({ length }, (_, j) => (j === 0 ? 0 : (j + 1) / j));
  }
}

/**
 * Adds `weight` · (|S₁|² + |S₂|²) of one sphere at the angles of cosine μ and −μ. With S± = S₁ ± S₂ the terms are
 * (a ± b)(π ± τ), and π_j(−μ) = (−1)^(j+1) π_j(μ), τ_j(−μ) = (−1)^j τ_j(μ): both sides come of one recurrence.
 *
 * @param cosines 0 to 1
 */
export function addIntensities(
  forward: Float64Array,
  backward: Float64Array,
  cosines: Float64Array,
  weight: number,
  coefficients: MieCoefficients,
  sums: AmplitudeSums,
): void {
  sums.take(coefficients);
  const { plusRe, plusIm, minusRe, minusIm, rise, fall } = sums;
  const { terms } = coefficients;
  for (let i = 0; i < cosines.length; i += 1) {
    const mu = cosines[i]!;
    let piBefore = 0;
    let pi = 1;
    let sign = 1;
    let sumPlusRe = 0;
    let sumPlusIm = 0;
    let sumMinusRe = 0;
    let sumMinusIm = 0;
    let backPlusRe = 0;
    let backPlusIm = 0;
    let backMinusRe = 0;
    let backMinusIm = 0;
    for (let j = 1; j <= terms; j += 1) {
      const tau = j * mu * pi - (j + 1) * piBefore;
      const together = pi + tau;
      const apart = pi - tau;
      sumPlusRe += plusRe[j]! * together;
      sumPlusIm += plusIm[j]! * together;
      sumMinusRe += minusRe[j]! * apart;
      sumMinusIm += minusIm[j]! * apart;
      backPlusRe += sign * plusRe[j]! * apart;
      backPlusIm += sign * plusIm[j]! * apart;
      backMinusRe += sign * minusRe[j]! * together;
      backMinusIm += sign * minusIm[j]! * together;
      sign = -sign;
      const next = rise[j]! * mu * pi - fall[j]! * piBefore;
      piBefore = pi;
      pi = next;
    }
    const half = weight / 2;
    forward[i]! += half * (sumPlusRe ** 2 + sumPlusIm ** 2 + sumMinusRe ** 2 + sumMinusIm ** 2);
    backward[i]! += half * (backPlusRe ** 2 + backPlusIm ** 2 + backMinusRe ** 2 + backMinusIm ** 2);
  }
}
