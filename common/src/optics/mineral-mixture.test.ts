import { expect, test } from 'vitest';
import { mineralMixtureIndex } from './mineral-mixture';
import { refractiveIndexAt, refractiveIndexTable } from './refractive-index';

const SILT = [
  { material: 'quartz', volumeFraction: 0.7 },
  { material: 'calcite', volumeFraction: 0.285 },
  { material: 'hematite', volumeFraction: 0.015 },
];

test('a trace of hematite makes transparent minerals absorb, most by the volume mean', () => {
  const mean = mineralMixtureIndex(SILT, 0.55, 'volume-average').refractiveIndex;
  const garnett = mineralMixtureIndex(SILT, 0.55, 'maxwell-garnett').refractiveIndex;
  const bruggeman = mineralMixtureIndex(SILT, 0.55, 'bruggeman').refractiveIndex;
  const hematite = refractiveIndexAt(refractiveIndexTable('hematite'), 0.55).refractiveIndex;
  expect(mean.imaginary).toBeCloseTo(0.015 * hematite.imaginary, 12);
  expect(garnett.imaginary).toBeGreaterThan(0);
  expect(mean.imaginary / garnett.imaginary).toBeGreaterThan(1.2);
  expect(bruggeman.imaginary).toBeGreaterThan(garnett.imaginary);
  expect(bruggeman.imaginary).toBeLessThan(mean.imaginary);
  for (const index of [mean, garnett, bruggeman]) {
    expect(index.real).toBeGreaterThan(1.54);
    expect(index.real).toBeLessThan(1.65);
  }
});

test('one mineral alone keeps its index, in every rule', () => {
  const quartz = refractiveIndexAt(refractiveIndexTable('quartz'), 0.55).refractiveIndex;
  for (const rule of ['volume-average', 'maxwell-garnett', 'bruggeman'] as const) {
    const alone = mineralMixtureIndex([{ material: 'quartz', volumeFraction: 1 }], 0.55, rule);
    expect(alone.refractiveIndex.real).toBeCloseTo(quartz.real, 12);
    expect(alone.refractiveIndex.imaginary).toBe(0);
    expect(alone.cautions).toEqual([]);
  }
});

test('clays are cautioned in visible light, where their tables do not reach, and not in the infrared', () => {
  const clay = [
    { material: 'illite', volumeFraction: 0.6 },
    { material: 'kaolinite', volumeFraction: 0.4 },
  ];
  const codes = (wavelength: number) =>
    mineralMixtureIndex(clay, wavelength, 'bruggeman').cautions.map((caution) => caution.code);
  expect(codes(0.55)).toEqual(['index-extrapolated', 'index-extrapolated']);
  expect(codes(9.5)).toEqual([]);
  expect(mineralMixtureIndex(clay, 9.5, 'bruggeman').refractiveIndex.imaginary).toBeGreaterThan(0.3);
  expect(() => mineralMixtureIndex([{ material: 'mica', volumeFraction: 1 }], 1, 'bruggeman')).toThrow(
    'material',
  );
});
