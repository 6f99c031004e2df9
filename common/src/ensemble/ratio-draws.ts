import { latinHypercube } from '../statistics/latin-hypercube';
import { normalQuantile } from '../statistics/normal-quantile';

/** ln R of one region with the two parts of its error. */
export interface RatioError {
  lnRatio: number;
  /** share of the error of the global mean that this region carries, 0 to 1 */
  sharedLoad: number;
  /** standard error of this region alone */
  ownSe: number;
}

/**
 * Ratios R of every member and region: exp(ln R + load · shared error + own error), member × region.
 *
 * The error of the global mean is one number per member, given by the caller's design. Regions are too many for its
 * direction numbers, so their own errors come from a Latin hypercube of the same seed.
 *
 * @param sharedUniforms one number in (0, 1) per member
 * @param sharedSe standard error of the global mean of ln R
 */
export function drawRatios(
  regions: readonly RatioError[],
  sharedSe: number,
  sharedUniforms: Float64Array,
  seed: number,
): Float64Array {
  const members = sharedUniforms.length;
  const own = latinHypercube(members, regions.length, seed);
  const ratios = new Float64Array(members * regions.length);
  for (let m = 0; m < members; m++) {
    const shared = sharedSe * normalQuantile(sharedUniforms[m]!);
    regions.forEach(({ lnRatio, sharedLoad, ownSe }, r) => {
      const at = m * regions.length + r;
      ratios[at] = Math.exp(lnRatio + sharedLoad * shared + ownSe * normalQuantile(own[at]!));
    });
  }
  return ratios;
}
