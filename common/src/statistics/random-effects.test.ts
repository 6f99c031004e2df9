import fc from 'fast-check';
import { expect, test } from 'vitest';
import { randomEffects } from './random-effects';

// Worked by hand: y = 0, 1, 5 with v = 1 each: mean 2, Q = 14, c = 3 − 1 = 2, τ² = (14 − 2)/2 = 6.
test('three equal variances give the result worked by hand', () => {
  const studies = [0, 1, 5].map((estimate) => ({ estimate, variance: 1 }));
  const got = randomEffects(studies);
  expect(got.mean).toBeCloseTo(2, 12);
  expect(got.q).toBeCloseTo(14, 12);
  expect(got.betweenVariance).toBeCloseTo(6, 12);
  expect(got.standardError).toBeCloseTo(Math.sqrt(7 / 3), 12);
  expect(got.iSquared).toBeCloseTo(12 / 14, 12);
});

test('estimates that agree have no variance between them and the precise one weighs most', () => {
  const got = randomEffects([
    { estimate: 1, variance: 0.01 },
    { estimate: 1.05, variance: 1 },
  ]);
  expect(got.betweenVariance).toBe(0);
  expect(got.weights[0]).toBeCloseTo(100 / 101, 12);
});

test('the mean lies among the estimates, weights add up to one, order does not matter', () => {
  const study = fc.record({
    estimate: fc.double({ min: -5, max: 5, noNaN: true }),
    variance: fc.double({ min: 1e-3, max: 10, noNaN: true }),
  });
  fc.assert(
    fc.property(fc.array(study, { minLength: 1, maxLength: 12 }), (studies) => {
      const got = randomEffects(studies);
      const all = studies.map((s) => s.estimate);
      expect(got.mean).toBeGreaterThanOrEqual(Math.min(...all) - 1e-9);
      expect(got.mean).toBeLessThanOrEqual(Math.max(...all) + 1e-9);
      expect(got.weights.reduce((a, b) => a + b, 0)).toBeCloseTo(1, 10);
      expect(randomEffects([...studies].reverse()).mean).toBeCloseTo(got.mean, 9);
    }),
  );
});

test('no study and a zero variance are refused', () => {
  expect(() => randomEffects([])).toThrow(/studies/);
  expect(() => randomEffects([{ estimate: 1, variance: 0 }])).toThrow(/variance is 0/);
});
