import { requireWithin } from '../physical/domain-error';
import { seededWholeNumbers } from './seeded-numbers';

/** x = (permutation + u)/n of one column: each of n equal strata once. McKay, Beckman & Conover (1979), Technometrics 21, 239. */
export function stratifiedColumn(permutation: ArrayLike<number>, offsets: ArrayLike<number>): Float64Array {
  const n = permutation.length;
  return Float64Array.from({ length: n }, (_, i) => (permutation[i]! + offsets[i]!) / n);
}

/**
 * Latin hypercube of any number of dimensions: row i, dimension j at i·d + j, every value strictly inside (0, 1).
 *
 * @param seed whole number 0 to 2³² − 1; the same seed gives the same bytes
 */
export function latinHypercube(count: number, dimensions: number, seed: number): Float64Array {
  requireWithin('count', count, '', 1, 2 ** 24);
  requireWithin('dimensions', dimensions, '', 1, 10_000);
  requireWithin('seed', seed, '', 0, 2 ** 32 - 1);
  const next = seededWholeNumbers(seed ^ 0x5eed1e55);
  const points = new Float64Array(count * dimensions);
  for (let j = 0; j < dimensions; j++) {
    const permutation = shuffled(count, next);
    const offsets = Float64Array.from({ length: count }, () => (next() + 0.5) / 2 ** 32);
    stratifiedColumn(permutation, offsets).forEach((x, i) => (points[i * dimensions + j] = x));
  }
  return points;
}

/** Fisher–Yates. The bias of the multiplication (2⁻³² · n) is far below what a sample of n can show. */
function shuffled(count: number, next: () => number): Uint32Array {
  const order = Uint32Array.from({ length: count }, (_, i) => i);
  for (let i = count - 1; i > 0; i--) {
    const j = Math.floor((next() / 2 ** 32) * (i + 1));
    [order[i], order[j]] = [order[j]!, order[i]!];
  }
  return order;
}
