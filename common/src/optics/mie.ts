import { requireWithin } from '../physical/domain-error';
import { MieCoefficients } from './mie-coefficients';

/** Size parameters served: 2πr/λ. */
export const MIN_SIZE_PARAMETER = 1e-6;
export const MAX_SIZE_PARAMETER = 1e5;
/** Each part of the refractive index m = n − ik goes to 10; n starts where metals do. */
export const MIN_REAL_INDEX = 0.01;
export const MAX_INDEX_PART = 10;

export interface RefractiveIndex {
  /** n */
  real: number;
  /** k of m = n − ik, 0 or more */
  imaginary: number;
}

/** Efficiencies: cross sections over the cross section πr² of the sphere. */
export interface MieEfficiencies {
  qExt: number;
  qSca: number;
  qAbs: number;
  /** radar backscatter: 4π times the one per steradian */
  qBack: number;
  /** mean cosine of the scattering angle; 0 where nothing scatters */
  asymmetry: number;
}

/** Places of the values that `mieInto` writes. */
export const Q_EXT = 0;
export const Q_SCA = 1;
export const Q_ABS = 2;
export const Q_BACK = 3;
/** g·qSca, what a sum over sizes needs */
export const G_Q_SCA = 4;

const shared = new MieCoefficients();

/**
 * Efficiencies of a homogeneous sphere.
 *
 *   qSca = 2/x² Σ (2j+1)(|a_j|² + |b_j|²),  qExt = qSca + qAbs,  qBack = 1/x² |Σ (2j+1)(−1)^j (a_j − b_j)|²
 *   g qSca = 4/x² Σ [ j(j+2)/(j+1) Re(a_j a*_{j+1} + b_j b*_{j+1}) + (2j+1)/(j(j+1)) Re(a_j b*_j) ]
 *
 * @param sizeParameter x = 2πr/λ [1], 1e-6 to 1e5, λ in the medium round the sphere
 * @param index m = n − ik relative to the medium: n 0.01 to 10, k 0 to 10
 * @throws DomainError when a value leaves its range
 *
 * Limits: one sphere of one index. qExt → 2 for large spheres (diffracted light included).
 * Source: Mie (1908), Ann. Phys. 330, 377–445; Bohren & Huffman (1983) chapter 4 (from memory).
 * Checked against: checks/optics/mie_sphere.csv (1e-8 relative; qBack 1e-6) and mie_published.csv.
 */
export function mie(sizeParameter: number, index: RefractiveIndex): MieEfficiencies {
  requireWithin('sizeParameter', sizeParameter, '', MIN_SIZE_PARAMETER, MAX_SIZE_PARAMETER);
  const { real, imaginary } = requireIndex(index);
  const out = mieInto(new Float64Array(5), sizeParameter, real, imaginary);
  const qSca = out[Q_SCA]!;
  return {
    qExt: out[Q_EXT]!,
    qSca,
    qAbs: out[Q_ABS]!,
    qBack: out[Q_BACK]!,
    asymmetry: qSca > 0 ? out[G_Q_SCA]! / qSca : 0,
  };
}

/** @throws DomainError naming the part of the index that leaves its range */
export function requireIndex(index: RefractiveIndex, prefix = 'refractiveIndex.'): RefractiveIndex {
  requireWithin(`${prefix}real`, index.real, '', MIN_REAL_INDEX, MAX_INDEX_PART);
  requireWithin(`${prefix}imaginary`, index.imaginary, '', 0, MAX_INDEX_PART);
  return index;
}

/**
 * The same for loops: unchecked, writes qExt, qSca, qAbs, qBack, g·qSca into the first five places of `out`.
 *
 * @param coefficients arrays to work in; afterwards they hold the coefficients of this sphere
 */
export function mieInto(
  out: Float64Array,
  x: number,
  n: number,
  k: number,
  coefficients: MieCoefficients = shared,
): Float64Array {
  if (n === 1 && k === 0) return out.fill(0, 0, 5); // else rounding of 1e-31 would pass for scattering
  coefficients.compute(x, n, k);
  const { terms, aRe, aIm, bRe, bIm, absorbed } = coefficients;
  let scattered = 0;
  let taken = 0;
  let forward = 0;
  let backRe = 0;
  let backIm = 0;
  let aReBefore = 0;
  let aImBefore = 0;
  let bReBefore = 0;
  let bImBefore = 0;
  for (let j = 1; j <= terms; j += 1) {
    const ar = aRe[j]!;
    const ai = aIm[j]!;
    const br = bRe[j]!;
    const bi = bIm[j]!;
    const weight = 2 * j + 1;
    scattered += weight * (ar * ar + ai * ai + br * br + bi * bi);
    taken += weight * absorbed[j]!;
    const sign = (j & 1) === 0 ? weight : -weight;
    backRe += sign * (ar - br);
    backIm += sign * (ai - bi);
    forward +=
      (((j - 1) * (j + 1)) / j) * (aReBefore * ar + aImBefore * ai + bReBefore * br + bImBefore * bi) +
      (weight / (j * (j + 1))) * (ar * br + ai * bi);
    aReBefore = ar;
    aImBefore = ai;
    bReBefore = br;
    bImBefore = bi;
  }
  const area = x * x;
  out[Q_SCA] = (2 * scattered) / area;
  out[Q_ABS] = (2 * taken) / area;
  out[Q_EXT] = out[Q_SCA] + out[Q_ABS];
  out[Q_BACK] = (backRe * backRe + backIm * backIm) / area;
  out[G_Q_SCA] = (4 * forward) / area;
  return out;
}
