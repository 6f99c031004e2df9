import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { greatCircleKm } from './great-circle';

// 1e-11 relative: the table prints twelve digits.
test('distances on the sphere equal those of an independent geodesic program', () => {
  const rows = checkTable('general/great_circle_distances.csv');
  expect(rows.length).toBeGreaterThan(4);
  for (const row of rows) {
    const got = greatCircleKm(
      [Number(row.lon1_deg), Number(row.lat1_deg)],
      [Number(row.lon2_deg), Number(row.lat2_deg)],
    );
    const truth = Number(row.distance_sphere_km);
    expect(Math.abs(got - truth), `${row.lon1_deg}, ${row.lat1_deg}`).toBeLessThan(1e-11 * truth + 1e-9);
  }
});

test('a latitude beyond the pole is refused', () => {
  expect(() => greatCircleKm([0, 91], [0, 0])).toThrow(/latitude is 91/);
});
