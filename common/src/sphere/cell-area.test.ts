import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { cellAreaFraction, cellAreaKm2 } from './cell-area';
import { regularGrid } from './regular-grid';

// 2e-12 relative: the table prints thirteen digits.
test('cell and band areas equal the closed form', () => {
  const rows = checkTable('general/cell_and_band_areas.csv');
  expect(rows.length).toBeGreaterThan(15);
  for (const row of rows) {
    const box = {
      westDeg: Number(row.lon_west_deg),
      eastDeg: Number(row.lon_east_deg),
      southDeg: Number(row.lat_south_deg),
      northDeg: Number(row.lat_north_deg),
    };
    expect(Math.abs(cellAreaKm2(box, Number(row.radius_m)) / Number(row.area_km2) - 1)).toBeLessThan(2e-12);
    expect(Math.abs(cellAreaFraction(box) / Number(row.fraction_of_sphere) - 1)).toBeLessThan(2e-12);
  }
});

test.each([0.5, 1, 2, 3.75])('cells of a %s° grid add up to the sphere', (stepDeg) => {
  const { cellAreaFraction: area, columns } = regularGrid(stepDeg);
  expect(area.reduce((a, b) => a + b, 0) * columns).toBeCloseTo(1, 13);
});

test('a box with north below south is refused', () => {
  expect(() => cellAreaKm2({ westDeg: 0, eastDeg: 1, southDeg: 10, northDeg: 5 })).toThrow(/northDeg is 5/);
});
