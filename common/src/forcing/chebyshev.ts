/** An axis of Chebyshev points, both ends included, in some function of the quantity. */
export interface ChebyshevAxis {
  readonly from: number;
  readonly to: number;
  readonly points: number;
}

/** Points of the axis from `from` to `to`. */
export function chebyshevPoints({ from, to, points }: ChebyshevAxis): Float64Array {
  return Float64Array.from({ length: points }, (_, i) => {
    const share = (1 - Math.cos((Math.PI * i) / (points - 1))) / 2;
    return from + (to - from) * share;
  });
}

/**
 * Weights with which the values at the points of an axis make the value of their polynomial at x.
 *
 * Barycentric formula of the second kind: stable for any number of points.
 * Source: Berrut & Trefethen (2004), SIAM Rev. 46, 501–517 (from memory).
 *
 * @param points of `chebyshevPoints`
 * @param x between the first and the last of them
 */
export function chebyshevWeights(points: Float64Array, x: number): Float64Array {
  const weights = new Float64Array(points.length);
  const met = points.indexOf(x);
  if (met >= 0) {
    weights[met] = 1;
    return weights;
  }
  const last = points.length - 1;
  let sum = 0;
  for (let i = 0; i <= last; i += 1) {
    const factor = (i % 2 === 0 ? 1 : -1) * (i === 0 || i === last ? 0.5 : 1);
    weights[i] = factor / (x - points[i]!);
    sum += weights[i]!;
  }
  return weights.map((weight) => weight / sum);
}
