import fc from 'fast-check';
import { expect, test } from 'vitest';
import { regionWeights } from './region-weights';
import { ar6Regions, regionAt } from './region-set';
import { planarPolygonAreaSr } from './polygon-area';
import { regularGrid } from './regular-grid';

test.each([30, 5, 2])('the partition of a %s° grid covers the sphere once and each cell fully', (stepDeg) => {
  const { cells, areaFraction } = regionWeights(stepDeg);
  const grid = regularGrid(stepDeg);
  const perCell = new Float64Array(grid.rows * grid.columns);
  cells.forEach((cell, i) => (perCell[cell]! += areaFraction[i]!));
  expect(Math.abs(areaFraction.reduce((a, b) => a + b, 0) - 1)).toBeLessThan(1e-12);
  perCell.forEach((area, cell) => {
    const truth = grid.cellAreaFraction[Math.floor(cell / grid.columns)]!;
    expect(Math.abs(area - truth)).toBeLessThan(1e-12 * truth + 1e-16);
  });
});

// Regions of which no other one holds a piece keep their whole polygon: 1e-10, the sum of many slices.
test('a region that overlaps no other has its polygon area, whatever the step', () => {
  const overlapping = new Set([
    'ENA',
    'NAO',
    'CAR',
    'NSA',
    'SWS',
    'SES',
    'SSA',
    'SAH',
    'ARP',
    'NEAF',
    'ESAF',
    'MDG',
    'SIO',
  ]);
  for (const stepDeg of [10, 2]) {
    const { codes, regions, areaFraction } = regionWeights(stepDeg);
    ar6Regions().forEach((region, index) => {
      if (overlapping.has(region.code)) return;
      const truth = region.parts.reduce((sum, ring) => sum + planarPolygonAreaSr(ring), 0) / (4 * Math.PI);
      const got = areaFraction.reduce((sum, area, i) => sum + (regions[i] === index ? area : 0), 0);
      expect(Math.abs(got / truth - 1), codes[index]).toBeLessThan(1e-10);
    });
  }
});

test('the piece that no region covers is the gap that was measured on the published table', () => {
  const { regions, areaFraction } = regionWeights(2);
  const none = areaFraction.reduce((sum, area, i) => sum + (regions[i]! < 0 ? area : 0), 0);
  // 1.45 square degrees of the plane somewhere between the Equator and 75°
  expect(none).toBeGreaterThan(0.25 * (1.45 / 41252.96));
  expect(none).toBeLessThan(1.01 * (1.45 / 41252.96));
});

test('a cell that lies wholly in one region says what the point test says at its centre', () => {
  const { codes, cells, regions } = regionWeights(2);
  const grid = regularGrid(2);
  const entries = new Map<number, number[]>();
  cells.forEach((cell, i) => entries.set(cell, [...(entries.get(cell) ?? []), regions[i]!]));
  let whole = 0;
  for (const [cell, held] of entries) {
    if (held.length > 1) continue;
    whole++;
    const code = regionAt(
      grid.longitudesDeg[cell % grid.columns]!,
      grid.latitudesDeg[Math.floor(cell / grid.columns)]!,
    );
    expect(code).toBe(held[0]! < 0 ? null : codes[held[0]!]);
  }
  expect(whole).toBeGreaterThan(14_000);
});

test('region means weighted by region area add up to the global mean of any field', () => {
  const { codes, cells, regions, areaFraction } = regionWeights(5);
  const grid = regularGrid(5);
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 2 ** 31 - 1 }), (seed) => {
      const field = (cell: number) => Math.sin(cell * 12.9898 + seed) * 100;
      const area = new Float64Array(codes.length + 1);
      const sum = new Float64Array(codes.length + 1);
      cells.forEach((cell, i) => {
        area[regions[i]! + 1]! += areaFraction[i]!;
        sum[regions[i]! + 1]! += areaFraction[i]! * field(cell);
      });
      const fromRegions = sum.reduce(
        (total, s, r) => total + (area[r]! > 0 ? (s / area[r]!) * area[r]! : 0),
        0,
      );
      let global = 0;
      for (let cell = 0; cell < grid.rows * grid.columns; cell++) {
        global += grid.cellAreaFraction[Math.floor(cell / grid.columns)]! * field(cell);
      }
      expect(Math.abs(fromRegions - global)).toBeLessThan(1e-9);
    }),
    { numRuns: 20 },
  );
});

test('a step that does not divide the half circle is refused', () => {
  expect(() => regionWeights(7)).toThrow(/divides 180° evenly/);
});
