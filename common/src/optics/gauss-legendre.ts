export interface GaussRule {
  /** abscissae in (−1, 1), rising */
  readonly nodes: Float64Array;
  /** weights, which add up to 2 */
  readonly weights: Float64Array;
}

/**
 * Gauss–Legendre rule: integrates a polynomial of degree 2n − 1 over [−1, 1] exactly.
 * Newton's method on P_n from the usual cosine guess; nodes good to the last bits up to n of a few thousand.
 *
 * Source: Abramowitz & Stegun (1964), 25.4.29 (from memory).
 * Checked against: checks/general/gaussian_grid_rows.csv.
 *
 * @param points n, a whole number of at least 1
 * @returns the rule, made once for each n and shared: do not write into it
 */
export function gaussLegendre(points: number): GaussRule {
  const known = rules.get(points);
  if (known) return known;
  const rule = makeRule(points);
  rules.set(points, rule);
  return rule;
}

const rules = new Map<number, GaussRule>();

function makeRule(points: number): GaussRule {
  const nodes = new Float64Array(points);
  const weights = new Float64Array(points);
  for (let i = 0; i < Math.ceil(points / 2); i += 1) {
    let x = Math.cos((Math.PI * (i + 0.75)) / (points + 0.5));
    let slope = 0;
    // Five steps double the correct digits from the guess's two to all there are; a fixed count cannot loop for ever.
    for (let step = 0; step < 6; step += 1) {
      let previous = 0;
      let value = 1;
      for (let n = 1; n <= points; n += 1) {
        const next = ((2 * n - 1) * x * value - (n - 1) * previous) / n;
        previous = value;
        value = next;
      }
      slope = (points * (x * value - previous)) / (x * x - 1);
      x -= value / slope;
    }
    const weight = 2 / ((1 - x * x) * slope * slope);
    nodes[i] = -x;
    nodes[points - 1 - i] = x;
    weights[i] = weight;
    weights[points - 1 - i] = weight;
  }
  if (points % 2 === 1) nodes[(points - 1) / 2] = 0;
  return { nodes, weights };
}
