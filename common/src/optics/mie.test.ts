import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable, numberIn, relativeError } from '../../test/check-table';
import { mie } from './mie';

// Arbitrary-precision series, 12 digits printed. 1e-8: ten times what double precision needs at the hardest row;
// g below x = 0.01 and qBack as far as the table's own cross-check in double precision went.
test('efficiencies of single spheres follow the arbitrary-precision table', () => {
  for (const row of checkTable('optics/mie_sphere.csv')) {
    const x = numberIn(row, 'x');
    const label = `x ${row.x}, m ${row.n} − ${row.k}i`;
    const sphere = mie(x, { real: numberIn(row, 'n'), imaginary: numberIn(row, 'k') });
    expect(relativeError(sphere.qExt, numberIn(row, 'Qext'), 1e-300), `qExt ${label}`).toBeLessThan(1e-8);
    expect(relativeError(sphere.qSca, numberIn(row, 'Qsca'), 1e-300), `qSca ${label}`).toBeLessThan(1e-8);
    expect(relativeError(sphere.qBack, numberIn(row, 'Qback'), 1e-300), `qBack ${label}`).toBeLessThan(1e-6);
    const tolerance = x >= 0.01 ? 1e-8 : 1e-3;
    expect(relativeError(sphere.asymmetry, numberIn(row, 'g'), 1e-300), `g ${label}`).toBeLessThan(tolerance);
  }
});

const published = checkTable('optics/mie_published.csv');

// The printed digits are the tolerance.
test.each(published.map((row) => [row.label!, row] as const))(
  'the published case %s is reproduced',
  (_, row) => {
    const sphere = mie(numberIn(row, 'x'), { real: numberIn(row, 'n'), imaginary: numberIn(row, 'k') });
    const tolerance = numberIn(row, 'tolerance_abs');
    const pairs = [
      ['Qext_published', sphere.qExt],
      ['Qsca_published', sphere.qSca],
      ['Qback_published', sphere.qBack],
      ['g_published', sphere.asymmetry],
    ] as const;
    const printed = pairs.filter(([column]) => row[column] !== '');
    expect(printed.length).toBeGreaterThan(0);
    for (const [column, value] of printed)
      expect(Math.abs(value - numberIn(row, column)), column).toBeLessThan(tolerance);
  },
);

test('the sphere of Bohren & Huffman (1983), appendix A, has their efficiencies', () => {
  // Radius 0.525 µm, 0.6328 µm light, index 1.55 in vacuum; printed to five decimals.
  const sphere = mie((2 * Math.PI * 0.525) / 0.6328, { real: 1.55, imaginary: 0 });
  expect(sphere.qSca).toBeCloseTo(3.10543, 5);
  expect(sphere.qBack).toBeCloseTo(2.92534, 5);
  expect(sphere.asymmetry).toBeCloseTo(0.63314, 5);
});

const anySphere = {
  x: fc.double({ min: -6, max: 4, noNaN: true }).map((exponent) => 10 ** exponent),
  n: fc.double({ min: 0.01, max: 10, noNaN: true }),
  k: fc.oneof(fc.constant(0), fc.double({ min: 1e-8, max: 10, noNaN: true })),
};

test('extinction is scattering and absorption, each in its bounds, for any sphere', () => {
  fc.assert(
    fc.property(anySphere.x, anySphere.n, anySphere.k, (x, real, imaginary) => {
      const sphere = mie(x, { real, imaginary });
      expect(sphere.qExt).toBe(sphere.qSca + sphere.qAbs);
      expect(sphere.qSca).toBeGreaterThan(0);
      expect(sphere.qAbs).toBeGreaterThanOrEqual(0);
      expect(sphere.qBack).toBeGreaterThanOrEqual(0);
      expect(Math.abs(sphere.asymmetry)).toBeLessThanOrEqual(1);
      if (imaginary === 0) expect(sphere.qAbs).toBe(0);
      else expect(sphere.qAbs).toBeGreaterThan(0);
    }),
    { numRuns: 300, seed: 5 },
  );
});

test('tiny spheres have the efficiencies of Rayleigh', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 1e-6, max: 1e-4, noNaN: true }),
      fc.double({ min: 1.2, max: 3, noNaN: true }),
      fc.double({ min: 0.001, max: 1, noNaN: true }),
      (x, real, imaginary) => {
        const sphere = mie(x, { real, imaginary });
        // L = (m² − 1)/(m² + 2)
        const [er, ei] = [real * real - imaginary * imaginary, -2 * real * imaginary];
        const below = (er + 2) ** 2 + ei ** 2;
        const re = ((er - 1) * (er + 2) + ei * ei) / below;
        const im = (3 * ei) / below;
        // The next term is of relative size x², under 1e-6 here, over a small k.
        expect(relativeError(sphere.qAbs, -4 * x * im, 1e-300)).toBeLessThan(1e-5);
        expect(relativeError(sphere.qSca, (8 / 3) * x ** 4 * (re * re + im * im), 1e-300)).toBeLessThan(1e-5);
      },
    ),
    { numRuns: 100, seed: 5 },
  );
});

// Edge correction of order x^(−2/3) (van de Hulst 1957, from memory): 2 + 1.99 x^(−2/3) for a strongly absorbing sphere.
test('large spheres take twice their shadow, up to x = 1e5', () => {
  for (const x of [1e4, 3e4, 1e5]) {
    for (const index of [
      { real: 1.53, imaginary: 0.008 },
      { real: 1.33, imaginary: 0 },
      { real: 1.75, imaginary: 0.44 },
      { real: 10, imaginary: 10 },
    ]) {
      const sphere = mie(x, index);
      expect(Math.abs(sphere.qExt - 2), `x ${x}, n ${index.real}`).toBeLessThan(3 * x ** (-2 / 3));
      expect(sphere.qExt).toBe(sphere.qSca + sphere.qAbs);
    }
    expect(mie(x, { real: 1.75, imaginary: 0.44 }).qExt).toBeCloseTo(2 + 1.9924 * x ** (-2 / 3), 4);
  }
});

test('a sphere of the index of its medium scatters nothing, and no NaN comes of it', () => {
  expect(mie(3, { real: 1, imaginary: 0 })).toEqual({ qExt: 0, qSca: 0, qAbs: 0, qBack: 0, asymmetry: 0 });
  const soft = mie(3, { real: 1 + 1e-9, imaginary: 0 });
  const softer = mie(3, { real: 1 + 1e-8, imaginary: 0 });
  expect(softer.qSca / soft.qSca).toBeCloseTo(100, 3);
});

test('a value outside its range is refused by name', () => {
  expect(() => mie(0, { real: 1.5, imaginary: 0 })).toThrow(
    'sizeParameter is 0; it must lie within 0.000001',
  );
  expect(() => mie(2e5, { real: 1.5, imaginary: 0 })).toThrow('sizeParameter');
  expect(() => mie(1, { real: 11, imaginary: 0 })).toThrow('refractiveIndex.real');
  expect(() => mie(1, { real: 1.5, imaginary: -0.1 })).toThrow('refractiveIndex.imaginary');
  expect(() => mie(1, { real: NaN, imaginary: 0 })).toThrow('refractiveIndex.real');
});
