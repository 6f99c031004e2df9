import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { type LonLat, polygonAreaKm2, polygonAreaSr } from './polygon-area';

// 1e-11 relative: the table prints twelve digits.
test('polygons with straight longitude–latitude edges have the areas of the table, around poles too', () => {
  const rows = checkTable('general/polygon_areas.csv');
  expect(rows.length).toBeGreaterThan(6);
  for (const row of rows) {
    const ring = String(row.vertices_lon_lat_deg)
      .split(' ')
      .map((vertex) => vertex.split('|').map(Number) as unknown as LonLat);
    expect(
      Math.abs(polygonAreaKm2(ring) / Number(row.area_straight_lonlat_edges_km2) - 1),
      row.shape,
    ).toBeLessThan(1e-11);
  }
});

test('direction, first vertex and a turn of the globe do not change the area', () => {
  const lon = fc.double({ min: -60, max: 60, noNaN: true });
  const lat = fc.double({ min: -80, max: 80, noNaN: true });
  fc.assert(
    fc.property(
      fc.tuple(lon, lat),
      fc.tuple(lon, lat),
      fc.tuple(lon, lat),
      fc.double({ min: -200, max: 200, noNaN: true }),
      (a, b, c, turn) => {
        const area = polygonAreaSr([a, b, c]);
        expect(polygonAreaSr([c, b, a])).toBeCloseTo(area, 12);
        expect(polygonAreaSr([b, c, a])).toBeCloseTo(area, 12);
        const turned = [a, b, c].map(([x, y]) => [x + turn, y] as const);
        expect(polygonAreaSr(turned)).toBeCloseTo(area, 12);
      },
    ),
  );
});

test('two vertices are refused', () => {
  expect(() =>
    polygonAreaSr([
      [0, 0],
      [1, 1],
    ]),
  ).toThrow(/at least 3 vertices/);
});
