import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { SOBOL_DIRECTIONS } from './sobol-directions';
import { scrambledSobolPoints, sobolPoints } from './sobol';

test('direction numbers equal the published table in all 64 dimensions', () => {
  const rows = checkTable('general/sobol_direction_numbers_64.csv').slice(1);
  expect(rows).toHaveLength(SOBOL_DIRECTIONS.length);
  rows.forEach((row, i) => {
    expect(SOBOL_DIRECTIONS[i]!.polynomial).toBe(Number(row.polynomial_a));
    expect(SOBOL_DIRECTIONS[i]!.initial).toEqual(String(row.initial_m).split(' ').map(Number));
    expect(SOBOL_DIRECTIONS[i]!.initial).toHaveLength(Number(row.degree_s));
  });
});

// exact: both sides are multiples of 2⁻³⁰ printed in full
test('unscrambled points equal the tables, early and deep ones', () => {
  const early = sobolPoints(64, 10);
  for (const row of checkTable('general/sobol_points_unscrambled.csv')) {
    const index = Number(row.index);
    if (index >= 64) continue;
    for (let j = 0; j < 10; j++) expect(early[index * 10 + j]).toBe(Number(row[`x${j + 1}`]));
  }
  const deepRows = checkTable('general/sobol_points_deep.csv');
  const deepest = Math.max(...deepRows.map((row) => Number(row.index)));
  const deep = sobolPoints(deepest + 1, 64);
  for (const row of deepRows) {
    expect(deep[Number(row.index) * 64 + Number(row.dimension) - 1]).toBeCloseTo(Number(row.x), 10);
  }
});

test('a seed gives the same bytes each time and another seed gives others', () => {
  expect(scrambledSobolPoints(128, 8, 7)).toEqual(scrambledSobolPoints(128, 8, 7));
  expect(scrambledSobolPoints(128, 8, 8)).not.toEqual(scrambledSobolPoints(128, 8, 7));
});

test('scrambled points stay balanced: each of 128 equal parts holds one of 128 points in every dimension', () => {
  const points = scrambledSobolPoints(128, 12, 20260101);
  for (let j = 0; j < 12; j++) {
    const parts = new Set(Array.from({ length: 128 }, (_, i) => Math.floor(points[i * 12 + j]! * 128)));
    expect(parts.size).toBe(128);
  }
  expect(Math.min(...points)).toBeGreaterThan(0);
  expect(Math.max(...points)).toBeLessThan(1);
});

test('more dimensions than there are direction numbers are refused', () => {
  expect(() => sobolPoints(4, 65)).toThrow(/dimensions is 65/);
});
