import { DomainError, requireWithin } from '../physical/domain-error';

/**
 * Quantile of type 7: linear between the sorted values at h = (n − 1) p.
 *
 * @param values finite numbers, at least one, in any order (not changed)
 * @param probability p [1], 0 to 1
 * @throws DomainError when there is no value, a value is not finite or p leaves its range
 *
 * Source: Hyndman & Fan (1996), Am. Stat. 50, 361–365, definition 7.
 * Checked against: reference/checks/general/quantiles_type7.csv.
 */
export function quantile(values: ArrayLike<number>, probability: number): number {
  const sorted = Float64Array.from(values).sort();
  return sortedQuantile(sorted, probability);
}

/** The same for values that are already in ascending order: no copy, no sorting. */
export function sortedQuantile(sorted: ArrayLike<number>, probability: number): number {
  requireWithin('probability', probability, '', 0, 1);
  if (sorted.length === 0) {
    throw new DomainError('no-values', { field: 'values', value: 'none', allowed: 'at least one number' });
  }
  const last = sorted.length - 1;
  requireWithin('values', sorted[last]!, '', -Number.MAX_VALUE, Number.MAX_VALUE);
  requireWithin('values', sorted[0]!, '', -Number.MAX_VALUE, Number.MAX_VALUE);
  const position = last * probability;
  const below = Math.floor(position);
  const above = Math.min(last, below + 1);
  return sorted[below]! + (position - below) * (sorted[above]! - sorted[below]!);
}

/**
 * Values of n equally likely outcomes: quantiles at (i + ½)/n. What a dot plot of n dots shows.
 */
export function equallyLikelyOutcomes(sorted: ArrayLike<number>, count: number): number[] {
  return Array.from({ length: count }, (_, i) => sortedQuantile(sorted, (i + 0.5) / count));
}
