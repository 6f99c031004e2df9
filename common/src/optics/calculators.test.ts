import { expect, test } from 'vitest';
import { calculateMie } from './calculate-mie';
import { calculateMixedIndex } from './calculate-mixed-index';
import { calculateModeOptics, type ModeRequest } from './calculate-mode-optics';

const mode: ModeRequest = {
  medianRadiusUm: 0.25,
  geometricStdDev: 2,
  numberFraction: 1,
  minRadiusUm: 0.01,
  maxRadiusUm: 10,
  densityGCm3: 2.65,
  refractiveIndex: { real: 1.53, imaginary: 0.0015 },
};

test('the calculator of one sphere answers efficiencies, albedo and method', () => {
  // checks/optics/mie_sphere.csv, x = 1, m = 1.5 − i.
  const answer = calculateMie({ sizeParameter: 1, refractiveIndex: { real: 1.5, imaginary: 1 } });
  expect(answer.qExt).toBeCloseTo(2.33632098467, 10);
  expect(answer.singleScatteringAlbedo).toBeCloseTo(0.663453761516 / 2.33632098467, 10);
  expect(answer.cautions).toEqual([]);
  expect(answer.method.source).toContain('Mie (1908)');
});

test('a sphere that is not there carries a caution instead of a division by zero', () => {
  const answer = calculateMie({ sizeParameter: 1, refractiveIndex: { real: 1, imaginary: 0 } });
  expect(answer).toMatchObject({ qExt: 0, singleScatteringAlbedo: 1, asymmetry: 0 });
  expect(answer.cautions.map((caution) => caution.code)).toEqual(['nothing-scatters']);
});

test('the calculator of modes answers what the table says of one mode', () => {
  // checks/optics/lognormal_modes.csv, dust A1 at 0.55 µm, k 0.0015.
  const answer = calculateModeOptics({ wavelengthUm: 0.55, modes: [mode] });
  expect(answer.massExtinctionM2PerG).toBeCloseTo(0.9208279, 4);
  expect(answer.singleScatteringAlbedo).toBeCloseTo(0.9736613, 5);
  expect(answer.asymmetry).toBeCloseTo(0.6863071, 5);
  expect(answer.effectiveRadiusUm).toBeCloseTo(0.8305119, 6);
  expect(answer.cautions).toEqual([]);
});

test('limits and a lone number fraction may be left out, and a doubtful default says so', () => {
  const { minRadiusUm: _min, maxRadiusUm: _max, numberFraction: _share, ...bare } = mode;
  const answer = calculateModeOptics({ wavelengthUm: 0.55, modes: [bare] });
  expect(answer.massExtinctionM2PerG).toBeGreaterThan(0.8);
  expect(answer.cautions).toEqual([]);
  const wide = calculateModeOptics({ wavelengthUm: 0.55, modes: [{ ...bare, geometricStdDev: 3 }] });
  expect(wide.cautions.map((caution) => caution.code)).toEqual(['unstated-limits']);
  expect(() => calculateModeOptics({ wavelengthUm: 0.55, modes: [bare, mode] })).toThrow(
    'modes[0].numberFraction is missing',
  );
  const uneven = calculateModeOptics({ wavelengthUm: 0.55, modes: [mode, { ...mode, numberFraction: 0.5 }] });
  expect(uneven.cautions.map((caution) => caution.code)).toEqual(['fractions-not-one']);
});

test('the calculator of mixtures names its rule and warns where the rule misleads', () => {
  const components = [
    { volumeFraction: 0.985, refractiveIndex: { real: 1.53, imaginary: 0.001 } },
    { volumeFraction: 0.015, refractiveIndex: { real: 3.1, imaginary: 0.09 } },
  ];
  const mean = calculateMixedIndex({ rule: 'volume-average', components });
  expect(mean.refractiveIndex.imaginary).toBeCloseTo(0.002335, 12);
  expect(mean.cautions.map((caution) => caution.code)).toEqual(['absorption-overstated']);
  const garnett = calculateMixedIndex({ rule: 'maxwell-garnett', components });
  expect(garnett.cautions).toEqual([]);
  expect(garnett.method.name).toContain('Maxwell Garnett');
});

test('what a calculator does not use, or cannot read, is refused by its path', () => {
  const request = (value: unknown) => value as never;
  expect(() => calculateMie(request({ sizeParameter: 1, refractiveIndex: { real: 1.5, k: 1 } }))).toThrow(
    'refractiveIndex.k is 1; it must be left out',
  );
  expect(() => calculateMie(request({ sizeParameter: 1 }))).toThrow('refractiveIndex');
  expect(() => calculateMie(request({ sizeParameter: '1', refractiveIndex: mode.refractiveIndex }))).toThrow(
    'sizeParameter',
  );
  expect(() => calculateModeOptics(request({ wavelengthUm: 0.55, modes: [] }))).toThrow('modes is 0');
  expect(() => calculateModeOptics(request({ wavelengthUm: 0.55, modes: [null] }))).toThrow('modes[0]');
  expect(() => calculateModeOptics(request({ wavelengthUm: 0.55, modes: [{ ...mode, sigma: 2 }] }))).toThrow(
    'modes[0].sigma',
  );
  expect(() => calculateMixedIndex(request({ rule: 'mean', components: [] }))).toThrow('rule is mean');
  expect(() =>
    calculateMixedIndex(request({ rule: 'bruggeman', components: [{ volumeFraction: 2 }] })),
  ).toThrow('components[0].volumeFraction is 2; it must lie within 0 to 1');
});
