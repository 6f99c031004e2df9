import { expect, test } from 'vitest';
import { DUST_OPTICAL_DEPTH } from '../tables/dust-optical-depth';
import { type BySurface, coarseBaseField, surfaceShares } from './base-field';
import { landFraction } from './land-fraction';

const published = (domain: string) => DUST_OPTICAL_DEPTH.find((row) => row.domain === domain)!;

function meanOver(table: BySurface, cells: (readonly ['south' | 'north', 'land' | 'ocean'])[]): number {
  const shares = surfaceShares();
  const area = cells.reduce((sum, [h, s]) => sum + shares[h][s], 0);
  return cells.reduce((sum, [h, s]) => sum + shares[h][s] * table[h][s], 0) / area;
}

test('the hemispheric means of Gkikas et al. come back from the fitted table', () => {
  const present = coarseBaseField().presentOpticalDepth;
  const north = meanOver(present, [
    ['north', 'land'],
    ['north', 'ocean'],
  ]);
  const south = meanOver(present, [
    ['south', 'land'],
    ['south', 'ocean'],
  ]);
  expect(north).toBeCloseTo(published('northern hemisphere').opticalDepth, 10);
  expect(south).toBeCloseTo(published('southern hemisphere').opticalDepth, 10);
  expect((north + south) / 2).toBeCloseTo(published('global').opticalDepth, 10);
});

test('the land and ocean means come back after one common factor and within their printed uncertainty', () => {
  const { presentOpticalDepth, surfaceMarginalFactor } = coarseBaseField();
  for (const surface of ['land', 'ocean'] as const) {
    const mean = meanOver(presentOpticalDepth, [
      ['south', surface],
      ['north', surface],
    ]);
    const { opticalDepth, uncertainty } = published(surface);
    expect(mean).toBeCloseTo(opticalDepth * surfaceMarginalFactor, 10);
    expect(Math.abs(mean - opticalDepth)).toBeLessThan(uncertainty);
  }
});

test('the pre-industrial field is the present one over 1.55 and says that it is coarse', () => {
  const field = coarseBaseField();
  expect(field.opticalDepth.north.land * 1.55).toBeCloseTo(field.presentOpticalDepth.north.land, 12);
  expect(field.cautions.map((c) => c.code)).toContain('coarse-base-field');
});

// 29.2 % of the surface is land (common knowledge); ice shelves count as sea in the table.
test('land covers the known share of the globe, at any step', () => {
  const { south, north } = surfaceShares();
  expect(south.land + north.land).toBeGreaterThan(0.28);
  expect(south.land + north.land).toBeLessThan(0.3);
  expect(landFraction(1)).toHaveLength(180 * 360);
  expect(() => landFraction(3)).toThrow(/stepDeg is 3/);
});
