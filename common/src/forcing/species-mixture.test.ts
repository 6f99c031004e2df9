import fc from 'fast-check';
import { expect, test } from 'vitest';
import { mixSpecies, type Species } from './species-mixture';

const dust: Species = { name: 'dust', opticalDepth: 0.2, singleScatteringAlbedo: 0.9, asymmetry: 0.75 };
const sulfate: Species = { name: 'sulfate', opticalDepth: 0.1, singleScatteringAlbedo: 1, asymmetry: 0.6 };

test('optical depths add, single-scattering albedo goes by extinction and asymmetry by scattering', () => {
  const mixture = mixSpecies([dust, sulfate]);
  expect(mixture.opticalDepth).toBeCloseTo(0.3, 12);
  expect(mixture.singleScatteringAlbedo).toBeCloseTo(0.28 / 0.3, 12);
  expect(mixture.asymmetry).toBeCloseTo((0.75 * 0.18 + 0.6 * 0.1) / 0.28, 12);
  expect(mixture.cautions.map(({ code }) => code)).toEqual(['species-mixed-externally']);
  expect(mixSpecies([dust]).cautions).toEqual([]);
});

test('a mixture lies between its species, in any order, and a species of no depth changes nothing', () => {
  const share = fc.double({ min: 0, max: 1, noNaN: true });
  const anySpecies = fc.array(fc.tuple(share, share, share), { minLength: 1, maxLength: 5 });
  fc.assert(
    fc.property(anySpecies, (values) => {
      const list = values.map(([opticalDepth, singleScatteringAlbedo, asymmetry], i) => {
        return { name: `s${i}`, opticalDepth, singleScatteringAlbedo, asymmetry: 0.98 * asymmetry };
      });
      const mixture = mixSpecies(list);
      const turned = mixSpecies([...list].reverse());
      for (const field of ['singleScatteringAlbedo', 'asymmetry'] as const) {
        const own = list.map((one) => one[field]);
        expect(mixture[field]).toBeGreaterThanOrEqual(Math.min(...own));
        expect(mixture[field]).toBeLessThanOrEqual(Math.max(...own));
        expect(mixture[field]).toBeCloseTo(turned[field], 9);
      }
      if (mixture.opticalDepth < 1e-9) return;
      const more = mixSpecies([...list, { ...dust, opticalDepth: 0 }]);
      expect(more.singleScatteringAlbedo).toBeCloseTo(mixture.singleScatteringAlbedo, 9);
      expect(more.opticalDepth).toBe(mixture.opticalDepth);
    }),
  );
});

test('an empty list, a name that comes twice and an impossible value are refused by name', () => {
  expect(() => mixSpecies([])).toThrow(/species is \[\]; it must be a list of at least one species/);
  expect(() => mixSpecies([dust, dust])).toThrow(/species\[1\].name is dust/);
  expect(() => mixSpecies([dust, { ...sulfate, singleScatteringAlbedo: 1.1 }])).toThrow(
    /species\[1\].singleScatteringAlbedo is 1.1/,
  );
});
