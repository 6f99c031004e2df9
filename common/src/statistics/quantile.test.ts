import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { equallyLikelyOutcomes, quantile } from './quantile';

// 1e-11: the table prints twelve digits.
test('quantiles of type 7 equal the table row by row', () => {
  const rows = checkTable('general/quantiles_type7.csv');
  expect(rows.length).toBeGreaterThan(50);
  for (const row of rows) {
    const got = quantile(String(row.values).split(' ').map(Number), Number(row.probability));
    expect(Math.abs(got - Number(row.quantile)), row.values).toBeLessThan(1e-11 * Math.max(1, Math.abs(got)));
  }
});

test('a quantile lies between the least and the greatest value and rises with the probability', () => {
  const values = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 30 });
  const p = fc.double({ min: 0, max: 1, noNaN: true });
  fc.assert(
    fc.property(values, p, p, (x, a, b) => {
      const low = quantile(x, Math.min(a, b));
      const high = quantile(x, Math.max(a, b));
      expect(low).toBeLessThanOrEqual(high + 1e-9);
      expect(low).toBeGreaterThanOrEqual(Math.min(...x));
      expect(high).toBeLessThanOrEqual(Math.max(...x) + 1e-9);
    }),
  );
});

test('no values and a probability above one are refused by name', () => {
  expect(() => quantile([], 0.5)).toThrow(/values/);
  expect(() => quantile([1], 1.1)).toThrow(/probability is 1.1/);
});

test('equally likely outcomes of a ramp are the middles of its parts', () => {
  expect(equallyLikelyOutcomes([0, 1], 4)).toEqual([0.125, 0.375, 0.625, 0.875]);
});
