import fc from 'fast-check';
import { expect, test } from 'vitest';
import { REFRACTIVE_INDICES } from '../tables/refractive-indices';
import { refractiveIndexAt, refractiveIndexTable } from './refractive-index';

test('every table rises in wavelength and holds physical values of equal number', () => {
  for (const { id, wavelengthsUm, real, imaginary } of REFRACTIVE_INDICES) {
    expect(real.length, id).toBe(wavelengthsUm.length);
    expect(imaginary.length, id).toBe(wavelengthsUm.length);
    wavelengthsUm.forEach((wavelength, i) => {
      if (i > 0) expect(wavelength, id).toBeGreaterThan(wavelengthsUm[i - 1]!);
      expect(real[i], id).toBeGreaterThan(0);
      expect(imaginary[i], id).toBeGreaterThanOrEqual(0);
    });
  }
});

test('at the wavelengths of a table its own rows come back', () => {
  for (const table of REFRACTIVE_INDICES) {
    table.wavelengthsUm.forEach((wavelength, i) => {
      expect(refractiveIndexAt(table, wavelength)).toEqual({
        refractiveIndex: { real: table.real[i], imaginary: table.imaginary[i] },
        cautions: [],
      });
    });
  }
});

test('between two rows nothing overshoots', () => {
  fc.assert(
    fc.property(
      fc.constantFrom(...REFRACTIVE_INDICES.filter((table) => table.wavelengthsUm.length > 1)),
      fc.nat(),
      fc.double({ min: 0, max: 1, noNaN: true }),
      (table, pick, share) => {
        const i = pick % (table.wavelengthsUm.length - 1);
        const [a, b] = [table.wavelengthsUm[i]!, table.wavelengthsUm[i + 1]!];
        const { refractiveIndex, cautions } = refractiveIndexAt(table, Math.min(b, a + share * (b - a)));
        expect(cautions).toEqual([]);
        for (const [part, column] of [
          ['real', table.real],
          ['imaginary', table.imaginary],
        ] as const) {
          const slack = 1e-12 * column[i]!;
          expect(refractiveIndex[part]).toBeGreaterThanOrEqual(Math.min(column[i]!, column[i + 1]!) - slack);
          expect(refractiveIndex[part]).toBeLessThanOrEqual(Math.max(column[i]!, column[i + 1]!) + slack);
        }
      },
    ),
    { numRuns: 300, seed: 5 },
  );
});

// Handbook values at the sodium line 0.589 µm: quartz 1.544, calcite 1.658 (ordinary rays), water 1.333, halite 1.544.
test.each([
  ['quartz', 1.544],
  ['calcite', 1.658],
  ['water', 1.333],
  ['sodium-chloride', 1.544],
])('the index of %s at the sodium line is the one of the handbooks', (material, expected) => {
  expect(refractiveIndexAt(refractiveIndexTable(material), 0.589).refractiveIndex.real).toBeCloseTo(
    expected,
    2,
  );
});

test('beyond its table a material keeps its last value and says so', () => {
  const illite = refractiveIndexAt(refractiveIndexTable('illite'), 0.55);
  expect(illite.cautions[0]).toMatchObject({ code: 'index-extrapolated' });
  expect(illite.cautions[0]!.message).toContain('2.5 to 200 µm');
  const carbon = refractiveIndexAt(refractiveIndexTable('black-carbon-bond-2006'), 0.55);
  expect(carbon.refractiveIndex).toEqual({ real: 1.95, imaginary: 0.79 });
  expect(carbon.cautions[0]!.message).toContain('the one wavelength 0.5 µm');
  expect(() => refractiveIndexTable('granite')).toThrow(
    'material is granite; it must be one of dust-woodward-2001',
  );
  expect(() => refractiveIndexAt(refractiveIndexTable('water'), 0)).toThrow('wavelengthUm');
});
