import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { regionAt } from './region-set';

test('every point of the table lies in its region, at the poles and on the antimeridian too', () => {
  const rows = checkTable('general/point_in_region.csv');
  expect(rows.length).toBeGreaterThan(200);
  for (const row of rows) {
    const lon = Number(row.longitude_deg_east);
    const lat = Number(row.latitude_deg_north);
    expect(regionAt(lon, lat), `${lon}, ${lat}`).toBe(row.region_acronym);
  }
});

test('both names of the antimeridian give the same region', () => {
  for (let lat = -90; lat <= 90; lat += 2.5) expect(regionAt(180, lat)).toBe(regionAt(-180, lat));
});

test('where published regions overlap the first in table order owns the point', () => {
  // ENA and NAO share a sliver; ENA comes first. CAR and NAO likewise.
  const codes = new Set<string | null>();
  for (let lon = -80; lon < -50; lon += 0.05) codes.add(regionAt(lon, 27));
  expect(codes.has('NAO')).toBe(true);
  expect(() => regionAt(0, 90.5)).toThrow(/latitude is 90.5/);
});
