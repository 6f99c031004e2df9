import { DomainError, requireWithin } from '../physical/domain-error';
import { normalQuantile } from './normal-quantile';
import { studentQuantile } from './special-functions';

export interface GeometricMean {
  geometricMean: number;
  /** exp s; null with one effective value */
  geometricSd: number | null;
  /** (Σw)²/Σw² */
  effectiveCount: number;
  /** standard error of the mean of ln x; null with one effective value */
  logStandardError: number | null;
  /** 95 % by Student's t with effectiveCount − 1 degrees of freedom, not rounded */
  interval95: [number, number] | null;
  /** 95 % by the normal distribution: narrower, shown beside the other */
  normalInterval95: [number, number] | null;
}

/**
 * Weighted geometric mean of positive values, with its spread and interval.
 *
 *   μ = Σ w ln x / W,  n_eff = W²/Σw²,  s² = [Σ w (ln x − μ)²/W] n_eff/(n_eff − 1),  se = s/√n_eff
 *
 * @param values x > 0, any unit. A zero needs a stated rule (detection limit) before it comes here.
 * @param weights w ≥ 0, at least one > 0; only their ratios matter
 * @throws DomainError for a value that is not positive, a negative weight, or lengths that differ
 *
 * With equal weights this is the ordinary t interval on logarithms; with others n_eff is an approximation.
 * Source: common practice; Kish (1965), Survey Sampling, for n_eff (from memory).
 * Checked against: reference/checks/general/weighted_geometric_mean.csv.
 */
export function weightedGeometricMean(
  values: number[],
  weights: number[] = values.map(() => 1),
): GeometricMean {
  requirePairs(values, weights);
  const total = weights.reduce((sum, w) => sum + w, 0);
  const mean = values.reduce((sum, x, i) => sum + weights[i]! * Math.log(x), 0) / total;
  const effectiveCount = (total * total) / weights.reduce((sum, w) => sum + w * w, 0);
  if (effectiveCount <= 1 + 1e-12) {
    const nothing = { geometricSd: null, logStandardError: null, interval95: null, normalInterval95: null };
    return { geometricMean: Math.exp(mean), effectiveCount, ...nothing };
  }
  const scatter = values.reduce((sum, x, i) => sum + weights[i]! * (Math.log(x) - mean) ** 2, 0) / total;
  const sd = Math.sqrt((scatter * effectiveCount) / (effectiveCount - 1));
  const logStandardError = sd / Math.sqrt(effectiveCount);
  const about = (z: number): [number, number] => [
    Math.exp(mean - z * logStandardError),
    Math.exp(mean + z * logStandardError),
  ];
  return {
    geometricMean: Math.exp(mean),
    geometricSd: Math.exp(sd),
    effectiveCount,
    logStandardError,
    interval95: about(studentQuantile(0.975, effectiveCount - 1)),
    normalInterval95: about(normalQuantile(0.975)),
  };
}

function requirePairs(values: number[], weights: number[]): void {
  if (values.length === 0 || values.length !== weights.length) {
    throw new DomainError('lengths-differ', {
      field: 'weights',
      value: `${weights.length} weights for ${values.length} values`,
      allowed: 'one weight for each of at least one value',
    });
  }
  values.forEach((x) => requireWithin('values', x, '', Number.MIN_VALUE, Number.MAX_VALUE));
  weights.forEach((w) => requireWithin('weights', w, '', 0, Number.MAX_VALUE));
  if (weights.every((w) => w === 0)) {
    throw new DomainError('no-weight', { field: 'weights', value: 0, allowed: 'at least one above zero' });
  }
}
