import { requireWithin } from '../physical/domain-error';
import { seededWholeNumbers } from './seeded-numbers';
import { SOBOL_DIRECTIONS } from './sobol-directions';

const BITS = 30;
const SCALE = 2 ** -BITS;

export const MAX_SOBOL_DIMENSIONS = SOBOL_DIRECTIONS.length + 1;

/**
 * Sobol points as 30-bit whole numbers, in Gray-code order, point 0 first: row i, dimension j at i·d + j.
 *
 * Point 0 is part of the design: without it a power-of-two sample is out of balance.
 * Source: Sobol (1967); Antonov & Saleev (1979) for the Gray-code order (from memory).
 * Checked against: reference/checks/general/sobol_points_unscrambled.csv and sobol_points_deep.csv.
 */
function sobolWholeNumbers(count: number, dimensions: number): Uint32Array {
  requireWithin('count', count, '', 1, 2 ** 24);
  requireWithin('dimensions', dimensions, '', 1, MAX_SOBOL_DIMENSIONS);
  const directions = Array.from({ length: dimensions }, (_, j) => directionNumbers(j));
  const points = new Uint32Array(count * dimensions);
  for (let i = 1; i < count; i++) {
    const bit = Math.log2((i & -i) >>> 0); // lowest set bit of i = lowest zero bit of i − 1
    for (let j = 0; j < dimensions; j++) {
      points[i * dimensions + j] = points[(i - 1) * dimensions + j]! ^ directions[j]![bit]!;
    }
  }
  return points;
}

function directionNumbers(dimension: number): Uint32Array {
  const v = new Uint32Array(BITS);
  if (dimension === 0) return v.map((_, i) => 2 ** (BITS - 1 - i));
  const { polynomial, initial } = SOBOL_DIRECTIONS[dimension - 1]!;
  const degree = initial.length;
  for (let i = 0; i < BITS; i++) {
    if (i < degree) {
      v[i] = initial[i]! * 2 ** (BITS - 1 - i);
      continue;
    }
    let next = v[i - degree]! ^ (v[i - degree]! >>> degree);
    for (let k = 1; k < degree; k++) {
      if ((polynomial >>> (degree - 1 - k)) & 1) next ^= v[i - k]!;
    }
    v[i] = next;
  }
  return v;
}

/** Unscrambled points in [0, 1), first point zero in every dimension. */
export function sobolPoints(count: number, dimensions: number): Float64Array {
  return Float64Array.from(sobolWholeNumbers(count, dimensions), (whole) => whole * SCALE);
}

/**
 * Sobol points scrambled by a digital shift: each dimension's whole numbers are XORed with one seeded number,
 * which keeps the balance of the design and moves it to a random place. Then half a step is added, so every
 * point lies strictly inside (0, 1) and quantile functions stay finite.
 *
 * @param seed whole number 0 to 2³² − 1; the same seed gives the same bytes
 */
export function scrambledSobolPoints(count: number, dimensions: number, seed: number): Float64Array {
  requireWithin('seed', seed, '', 0, 2 ** 32 - 1);
  const next = seededWholeNumbers(seed);
  const shifts = Uint32Array.from({ length: dimensions }, () => next() >>> (32 - BITS));
  return Float64Array.from(
    sobolWholeNumbers(count, dimensions),
    (whole, i) => ((whole ^ shifts[i % dimensions]!) + 0.5) * SCALE,
  );
}
