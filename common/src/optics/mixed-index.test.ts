import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable, numberIn } from '../../test/check-table';
import type { RefractiveIndex } from './mie';
import { mixedIndex, MIXING_RULES, volumeFractions, type MixtureComponent } from './mixed-index';

const COLUMNS = {
  'volume-average': 'volume_mean_m',
  'maxwell-garnett': 'maxwell_garnett',
  bruggeman: 'bruggeman',
} as const;

// Computed to twelve digits; 1e-10 leaves room for the printed ones of the smallest k.
test.each(MIXING_RULES)('the rule %s gives the index of every mixture of the table', (rule) => {
  for (const row of checkTable('optics/mixing_rules.csv')) {
    const components: MixtureComponent[] = [1, 2, 3]
      .filter((i) => row[`n${i}`] !== '')
      .map((i) => ({
        volumeFraction: numberIn(row, i === 1 ? 'f1_matrix' : `f${i}`),
        refractiveIndex: { real: numberIn(row, `n${i}`), imaginary: numberIn(row, `k${i}`) },
      }));
    const mixed = mixedIndex(rule, components);
    expect(Math.abs(mixed.real - numberIn(row, `${COLUMNS[rule]}_n`)), row.case).toBeLessThan(1e-10);
    expect(Math.abs(mixed.imaginary - numberIn(row, `${COLUMNS[rule]}_k`)), row.case).toBeLessThan(1e-10);
  }
});

const anyIndex: fc.Arbitrary<RefractiveIndex> = fc.record({
  real: fc.double({ min: 1.1, max: 3, noNaN: true }),
  imaginary: fc.oneof(fc.constant(0), fc.double({ min: 1e-6, max: 1, noNaN: true })),
});

test('mixing a material with itself is the identity, in every rule', () => {
  fc.assert(
    fc.property(anyIndex, fc.double({ min: 0, max: 1, noNaN: true }), (refractiveIndex, share) => {
      for (const rule of MIXING_RULES) {
        const alone = mixedIndex(rule, [{ volumeFraction: 1, refractiveIndex }]);
        const split = mixedIndex(rule, [
          { volumeFraction: share, refractiveIndex },
          { volumeFraction: 1 - share, refractiveIndex },
        ]);
        for (const mixed of [alone, split]) {
          expect(mixed.real).toBeCloseTo(refractiveIndex.real, 11);
          expect(mixed.imaginary).toBeCloseTo(refractiveIndex.imaginary, 11);
        }
      }
    }),
    { numRuns: 100, seed: 5 },
  );
});

test('every mixture lies on the physical side, and Bruggeman knows no host', () => {
  fc.assert(
    fc.property(
      anyIndex,
      anyIndex,
      anyIndex,
      fc.double({ min: 0.05, max: 0.9, noNaN: true }),
      (a, b, c, f) => {
        const of = (list: [number, RefractiveIndex][]) =>
          list.map(([volumeFraction, refractiveIndex]) => ({ volumeFraction, refractiveIndex }));
        const rest = (1 - f) / 2;
        const one = mixedIndex(
          'bruggeman',
          of([
            [f, a],
            [rest, b],
            [rest, c],
          ]),
        );
        const other = mixedIndex(
          'bruggeman',
          of([
            [rest, c],
            [f, a],
            [rest, b],
          ]),
        );
        expect(one.real).toBeCloseTo(other.real, 10);
        expect(one.imaginary).toBeCloseTo(other.imaginary, 10);
        expect(one.real).toBeGreaterThan(0);
        expect(one.imaginary).toBeGreaterThanOrEqual(0);
        // Two of three components alike: the continued root must be that of the closed form of two.
        const three = mixedIndex(
          'bruggeman',
          of([
            [f, a],
            [rest, b],
            [rest, b],
          ]),
        );
        const two = mixedIndex(
          'bruggeman',
          of([
            [f, a],
            [1 - f, b],
          ]),
        );
        expect(three.real).toBeCloseTo(two.real, 10);
        expect(three.imaginary).toBeCloseTo(two.imaginary, 10);
      },
    ),
    { numRuns: 60, seed: 5 },
  );
});

test('volume fractions follow mass over density', () => {
  expect(volumeFractions([0.5, 0.5], [2, 4])).toEqual(
    [2 / 3, 1 / 3].map((share) => expect.closeTo(share, 14)),
  );
  expect(() => volumeFractions([0, 0], [2, 4])).toThrow('massFractions');
});

test('fractions that do not add up to 1 are refused with the sum', () => {
  const water = { real: 1.33, imaginary: 0 };
  expect(() =>
    mixedIndex('bruggeman', [
      { volumeFraction: 0.5, refractiveIndex: water },
      { volumeFraction: 0.4, refractiveIndex: water },
    ]),
  ).toThrow('components is 0.9; it must be such that the volume fractions add up to 1');
});
