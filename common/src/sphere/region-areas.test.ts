import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { calculateRegionAreas } from './region-areas';

// 1e-9 relative: the share is printed with twelve digits; areas print ten.
test('areas of all AR6 regions equal the independent computation', () => {
  const { regions, cautions } = calculateRegionAreas({ regionSet: 'ar6' });
  const rows = checkTable('general/ar6_region_areas.csv');
  expect(rows.length).toBeGreaterThan(40);
  for (const row of rows) {
    const got = regions.find((region) => region.code === row.acronym)!;
    expect(Math.abs(got.shareOfSphere / Number(row.fraction_of_sphere) - 1), row.acronym).toBeLessThan(1e-9);
    expect(Math.abs(got.areaKm2 / Number(row['area_km2_R_6371.007181']) - 1), row.acronym).toBeLessThan(1e-9);
  }
  expect(regions).toHaveLength(58);
  expect(cautions.map((c) => c.code)).toContain('regions-overlap');
});

// 1.0000706: measured on the published table with an independent program.
test('the published polygons add up to slightly more than the sphere', () => {
  const total = calculateRegionAreas({ regionSet: 'ar6' }).regions.reduce(
    (sum, r) => sum + r.shareOfSphere,
    0,
  );
  expect(total).toBeCloseTo(1.0000706, 6);
});

test('an unknown region set is refused with the ones there are', () => {
  expect(() => calculateRegionAreas({ regionSet: 'ar7' })).toThrow(/regionSet is ar7; it must be one of ar6/);
});
