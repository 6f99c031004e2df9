import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { weightedGeometricMean } from './weighted-geometric-mean';

// 1e-9 relative: the table prints twelve digits, the t quantile is found by iteration.
test('weighted geometric means, their spread and both intervals equal the table', () => {
  const rows = checkTable('general/weighted_geometric_mean.csv');
  expect(rows.length).toBeGreaterThan(4);
  for (const row of rows) {
    const numbers = (text: unknown) => String(text).split(' ').map(Number);
    const got = weightedGeometricMean(numbers(row.values), numbers(row.weights));
    const pairs: [number | null | undefined, unknown][] = [
      [got.geometricMean, row.geometric_mean],
      [got.effectiveCount, row.effective_sample_size],
      [got.geometricSd, row.geometric_sd],
      [got.logStandardError, row.standard_error_of_log],
      [got.interval95?.[0], row.ci95_low_t],
      [got.interval95?.[1], row.ci95_high_t],
      [got.normalInterval95?.[0], row.ci95_low_normal],
      [got.normalInterval95?.[1], row.ci95_high_normal],
    ];
    for (const [value, text] of pairs) {
      const truth = Number(text);
      expect(Math.abs(value! - truth), `${row.values}`).toBeLessThanOrEqual(1e-9 * Math.abs(truth));
    }
  }
});

test('one value has a mean but no interval', () => {
  const one = weightedGeometricMean([3.5]);
  expect(one.geometricMean).toBeCloseTo(3.5, 12);
  expect(one.interval95).toBeNull();
});

test('zero, a negative weight and unequal lengths are refused', () => {
  expect(() => weightedGeometricMean([0, 1])).toThrow(/values is 0/);
  expect(() => weightedGeometricMean([1, 2], [1, -1])).toThrow(/weights is -1/);
  expect(() => weightedGeometricMean([1, 2], [1])).toThrow(/1 weights for 2 values/);
});
