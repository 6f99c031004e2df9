import { expect, test } from 'vitest';
import { checkTable, numberIn, relativeError } from '../../test/check-table';
import { calculateHumidityGrowth, diameterGrowthFactor } from './humidity-growth';

// Closed form by an independent program, 12 digits printed.
test('growth without curvature equals independent values for every substance and humidity', () => {
  for (const row of checkTable('general/kappa_koehler_growth.csv')) {
    const growth = diameterGrowthFactor(numberIn(row, 'kappa'), numberIn(row, 'relative_humidity'));
    const label = `${row.substance} at ${row.relative_humidity}`;
    expect(relativeError(growth, numberIn(row, 'growth_factor_no_kelvin')), label).toBeLessThan(1e-10);
  }
});

test('humidity near saturation carries a caution, saturation is refused', () => {
  expect(calculateHumidityGrowth({ kappa: 0.5, relativeHumidity: 0.8 }).cautions).toEqual([]);
  expect(calculateHumidityGrowth({ kappa: 0.5, relativeHumidity: 0.95 }).cautions.map((c) => c.code)).toEqual(
    ['humidity-near-saturation'],
  );
  expect(() => calculateHumidityGrowth({ kappa: 0.5, relativeHumidity: 1 })).toThrow(/relativeHumidity is 1/);
  expect(() => calculateHumidityGrowth({ kappa: -0.1, relativeHumidity: 0.5 })).toThrow(/kappa is -0.1/);
});
