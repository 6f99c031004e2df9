import { type Distribution, distributionQuantile } from '../statistics/distributions';
import { scrambledSobolPoints } from '../statistics/sobol';

export interface ParameterDraws {
  /** member × parameter */
  values: Float64Array;
  /** member × extra dimension, uniform in (0, 1): for quantities that share the design but have no distribution here */
  uniforms: Float64Array;
}

/**
 * Draws of an ensemble from one scrambled Sobol design: parameters first, extra dimensions after them.
 *
 * @param seed whole number 0 to 2³² − 1; the same seed gives the same bytes, whatever else runs
 * @throws DomainError for an impossible distribution or more dimensions than there are direction numbers
 */
export function drawParameters(
  distributions: readonly Distribution[],
  extraDimensions: number,
  members: number,
  seed: number,
): ParameterDraws {
  const parameters = distributions.length;
  const dimensions = parameters + extraDimensions;
  const points = scrambledSobolPoints(members, dimensions, seed);
  const values = new Float64Array(members * parameters);
  const uniforms = new Float64Array(members * extraDimensions);
  for (let m = 0; m < members; m++) {
    distributions.forEach((distribution, j) => {
      values[m * parameters + j] = distributionQuantile(distribution, points[m * dimensions + j]!);
    });
    for (let j = 0; j < extraDimensions; j++) {
      uniforms[m * extraDimensions + j] = points[m * dimensions + parameters + j]!;
    }
  }
  return { values, uniforms };
}
