import fc from 'fast-check';
import { expect, test } from 'vitest';
import { calculateColumn } from './column';

// Kok et al. (2021): about 5000 Tg a year fall and 22 to 29 Tg float; over 5.1e14 m² that is 1.9 days (field practice).
test('global deposition of 5000 Tg a year and 1.9 days make a load of 26 Tg', () => {
  const area = 5.1e14;
  const { burdenGM2, opticalDepth } = calculateColumn({
    depositionGM2Yr: 5000e12 / area,
    lifetimeDays: 1.9,
    massExtinctionM2PerG: 0.59,
  });
  expect((burdenGM2 * area) / 1e12).toBeCloseTo(26, 0);
  expect(opticalDepth).toBeCloseTo(0.03, 3);
});

test('doubling the flux doubles burden and optical depth', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0, max: 100, noNaN: true }),
      fc.double({ min: 0, max: 30, noNaN: true }),
      fc.double({ min: 0, max: 5, noNaN: true }),
      (depositionGM2Yr, lifetimeDays, massExtinctionM2PerG) => {
        const one = calculateColumn({ depositionGM2Yr, lifetimeDays, massExtinctionM2PerG });
        const two = calculateColumn({
          depositionGM2Yr: 2 * depositionGM2Yr,
          lifetimeDays,
          massExtinctionM2PerG,
        });
        expect(two.burdenGM2).toBeCloseTo(2 * one.burdenGM2, 10);
        expect(two.opticalDepth).toBeCloseTo(2 * one.opticalDepth, 10);
      },
    ),
  );
});

test('a column too thick to last carries a caution; a negative lifetime is refused', () => {
  const thick = calculateColumn({ depositionGM2Yr: 1000, lifetimeDays: 5, massExtinctionM2PerG: 0.6 });
  expect(thick.cautions.map((caution) => caution.code)).toEqual(['optical-depth-implausible']);
  expect(() => calculateColumn({ depositionGM2Yr: 1, lifetimeDays: -1, massExtinctionM2PerG: 0.6 })).toThrow(
    /lifetimeDays is -1 d/,
  );
});
