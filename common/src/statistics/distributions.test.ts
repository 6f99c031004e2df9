import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { distributionFromBounds } from './distribution-from-bounds';
import { type Distribution, distributionQuantile } from './distributions';
import { normalQuantile } from './normal-quantile';
import { erfc, incompleteBeta, normalCdf, studentQuantile } from './special-functions';

// Quantiles of the normal distribution as printed in common tables to six and more digits (from memory).
test('normal quantiles equal tabulated ones and go back through the distribution function', () => {
  expect(normalQuantile(0.95)).toBeCloseTo(1.6448536269514722, 14);
  expect(normalQuantile(0.975)).toBeCloseTo(1.959963984540054, 14);
  for (const p of [1e-12, 1e-6, 0.01, 0.2, 0.5, 0.7, 0.999, 1 - 1e-9]) {
    expect(Math.abs(normalCdf(normalQuantile(p)) / p - 1)).toBeLessThan(1e-13);
  }
});

test('the error function joins its two ways of evaluation and equals known values', () => {
  expect(Math.abs(erfc(2.4999999999) - erfc(2.5))).toBeLessThan(1e-12);
  expect(erfc(1)).toBeCloseTo(0.15729920705028513, 15); // Abramowitz & Stegun table 7.1, from memory
  expect(erfc(3) / 2.209049699858544e-5).toBeCloseTo(1, 12);
});

// JCGM 100:2008 table G.2, as in the worked example (t for 99 %, 16 degrees of freedom); five printed digits.
test("Student's t equals the worked example of the Guide to uncertainty", () => {
  const row = checkTable('general/uncertainty_worked_examples.csv').find(
    (r) => r.quantity === 't99_at_16_dof',
  )!;
  expect(studentQuantile(0.995, 16)).toBeCloseTo(Number(row.computed_value), 5);
});

test('the incomplete beta function equals its closed forms', () => {
  expect(incompleteBeta(0.3, 1, 1)).toBeCloseTo(0.3, 14);
  expect(incompleteBeta(0.3, 2, 1)).toBeCloseTo(0.09, 14);
  expect(incompleteBeta(0.3, 1, 5)).toBeCloseTo(1 - 0.7 ** 5, 14);
});

test('lognormal percentiles equal the conversion table', () => {
  for (const row of checkTable('general/lognormal_conversions.csv')) {
    const d: Distribution = {
      kind: 'lognormal',
      median: Number(row.geometric_mean),
      geometricSd: Number(row.geometric_sd),
    };
    expect(distributionQuantile(d, 0.05) / Number(row.p05)).toBeCloseTo(1, 10);
    expect(distributionQuantile(d, 0.95) / Number(row.p95)).toBeCloseTo(1, 10);
  }
});

const shapes: Distribution[] = [
  { kind: 'normal', mean: 2, sd: 1, min: 0 },
  { kind: 'lognormal', median: 0.6, geometricSd: 1.4, max: 1.2 },
  { kind: 'uniform', low: -1, high: 3 },
  { kind: 'triangular', low: 0.7, mode: 0.76, high: 0.82 },
  { kind: 'beta', low: 0.85, high: 0.95, alpha: 3, beta: 3 },
  { kind: 'beta', low: 0, high: 1, alpha: 0.4, beta: 2, max: 0.8 },
];

test('every quantile function rises and stays within its limits', () => {
  const p = fc.double({ min: 1e-9, max: 1 - 1e-9, noNaN: true });
  for (const d of shapes) {
    fc.assert(
      fc.property(p, p, (a, b) => {
        const low = distributionQuantile(d, Math.min(a, b));
        const high = distributionQuantile(d, Math.max(a, b));
        expect(low).toBeLessThanOrEqual(high + 1e-12);
        if ('min' in d && d.min !== undefined) expect(low).toBeGreaterThanOrEqual(d.min);
        if ('max' in d && d.max !== undefined) expect(high).toBeLessThanOrEqual(d.max);
      }),
    );
  }
});

test('a symmetric beta distribution has its median in the middle, a triangular one its mode share below the mode', () => {
  expect(distributionQuantile(shapes[4]!, 0.5)).toBeCloseTo(0.9, 12);
  const skew: Distribution = { kind: 'triangular', low: 0, mode: 1, high: 4 };
  expect(distributionQuantile(skew, 0.25)).toBeCloseTo(1, 12);
});

test('bounds read as 5 to 95 % come back as those quantiles', () => {
  const d = distributionFromBounds({ kind: 'lognormal', low: 0.4, central: 0.6, high: 0.9 });
  expect(distributionQuantile(d, 0.05)).toBeCloseTo(0.4, 12);
  expect(distributionQuantile(d, 0.95)).toBeCloseTo(0.9, 12);
});

test('impossible distributions are refused by name', () => {
  expect(() => distributionQuantile({ kind: 'normal', mean: 0, sd: -1 }, 0.5)).toThrow(/normal.sd is -1/);
  expect(() => distributionQuantile({ kind: 'triangular', low: 0, mode: 2, high: 1 }, 0.5)).toThrow(/mode/);
  expect(() => distributionQuantile({ kind: 'normal', mean: 0, sd: 1, min: 40 }, 0.5)).toThrow(/leave some/);
  expect(() => distributionFromBounds({ kind: 'normal', low: 1, central: 0, high: 2 })).toThrow(
    /central is 0/,
  );
});
