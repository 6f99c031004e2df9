import { expect, test } from 'vitest';
import { addCoarseDust, COARSE_DUST } from './coarse-addition';
import { mixtureMassFractionBelow, modeOptics, type OpticalMode } from './mode-optics';
import { NON_SPHERICITY, withNonSphericity } from './non-sphericity';

const dust: OpticalMode = {
  medianRadiusUm: 0.414,
  geometricStdDev: 2,
  minRadiusUm: 0.05,
  maxRadiusUm: 10,
  numberFraction: 1,
  densityGCm3: 2.6,
  refractiveIndex: { real: 1.52, imaginary: 0.0015 },
};

test('the coarse addition raises the mass above 5 µm by its factor and leaves the rest', () => {
  const below = mixtureMassFractionBelow([dust], 5);
  const { modes, cautions } = addCoarseDust([dust]);
  const ratio = (share: number) => (1 - share) / share;
  expect(ratio(mixtureMassFractionBelow(modes, 5)) / ratio(below)).toBeCloseTo(4, 9);
  expect(modes.reduce((sum, mode) => sum + mode.numberFraction, 0)).toBeCloseTo(1, 12);
  expect(cautions[0]!.message).toContain('Adebiyi & Kok (2020)');
  // Coarser dust: less extinction per gram, more absorption per extinction.
  const [before, after] = [modeOptics([dust], 0.55), modeOptics(modes, 0.55)];
  expect(after.massExtinctionM2PerG).toBeLessThan(before.massExtinctionM2PerG);
  expect(after.singleScatteringAlbedo).toBeLessThan(before.singleScatteringAlbedo);
  expect(after.effectiveRadiusUm).toBeGreaterThan(before.effectiveRadiusUm);
});

test('a factor of 1 changes no optics', () => {
  const { modes } = addCoarseDust([dust], 1);
  const [before, after] = [modeOptics([dust], 0.55), modeOptics(modes, 0.55)];
  expect(Math.abs(after.massExtinctionM2PerG / before.massExtinctionM2PerG - 1)).toBeLessThan(1e-4);
  expect(after.asymmetry).toBeCloseTo(before.asymmetry, 4);
});

test('the coarse addition is the published load over that of the models', () => {
  const models = 17 / 4; // Tg: 17 Tg is four times the model mean
  expect(COARSE_DUST.factor.low).toBeCloseTo(12 / models, 1);
  expect(COARSE_DUST.factor.high).toBeCloseTo(24 / models, 1);
});

test('where nothing is above 5 µm there is nothing to raise', () => {
  expect(() => addCoarseDust([{ ...dust, maxRadiusUm: 2 }])).toThrow('Widen the size limits first');
  expect(() => addCoarseDust([dust], 20)).toThrow('factor is 20');
});

test('the correction for shape raises extinction alone and names itself', () => {
  const spheres = modeOptics([dust], 0.55, 'fast');
  const { optics, cautions } = withNonSphericity(spheres);
  expect(optics.massExtinctionM2PerG / spheres.massExtinctionM2PerG).toBeCloseTo(
    NON_SPHERICITY.factor.central,
    12,
  );
  expect(optics.singleScatteringAlbedo).toBe(spheres.singleScatteringAlbedo);
  expect(optics.asymmetry).toBe(spheres.asymmetry);
  expect(cautions[0]!.message).toContain('from memory');
  expect(() => withNonSphericity(spheres, 0.5)).toThrow('factor is 0.5');
});
