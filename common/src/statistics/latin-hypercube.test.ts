import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { latinHypercube, stratifiedColumn } from './latin-hypercube';

// 1e-6: offsets are printed with six digits, results with seven.
test('columns made from the given permutations and offsets equal the table', () => {
  const table = checkTable('general/latin_hypercube.csv');
  for (const design of new Set(table.map((row) => `${row.n} ${row.d}`))) {
    const rows = table.filter((row) => `${row.n} ${row.d}` === design);
    for (let j = 0; j < Number(rows[0]!.d); j++) {
      const column = (name: string) => rows.map((row) => Number(row[name]!.split(' ')[j]));
      const got = stratifiedColumn(column('permutation_values'), column('u_values'));
      column('x_values').forEach((x, i) => expect(Math.abs(got[i]! - x)).toBeLessThan(1e-6));
    }
  }
});

test('every column holds one point per stratum, and a seed gives the same bytes', () => {
  const points = latinHypercube(100, 7, 42);
  for (let j = 0; j < 7; j++) {
    const strata = new Set(Array.from({ length: 100 }, (_, i) => Math.floor(points[i * 7 + j]! * 100)));
    expect(strata.size).toBe(100);
  }
  expect(latinHypercube(100, 7, 42)).toEqual(points);
  expect(latinHypercube(100, 7, 43)).not.toEqual(points);
});
