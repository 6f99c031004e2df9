import { expect, test } from 'vitest';
import { modeOptics } from './mode-optics';
import {
  humidityCurve,
  humidMode,
  humidOptics,
  WATER_DENSITY_G_CM3,
  type HygroscopicMode,
} from './water-uptake';

const sulfate: HygroscopicMode = {
  medianRadiusUm: 0.07,
  geometricStdDev: 1.8,
  minRadiusUm: 0.001,
  maxRadiusUm: 5,
  numberFraction: 1,
  densityGCm3: 1.77,
  refractiveIndex: { real: 1.53, imaginary: 1e-7 },
  kappa: 0.53,
};

test('dry air changes nothing', () => {
  const dry = humidOptics([sulfate], 0, 0.55);
  const asGiven = modeOptics([sulfate], 0.55);
  expect(dry.massExtinctionM2PerG).toBeCloseTo(asGiven.massExtinctionM2PerG, 10);
  expect(dry.extinctionPerDryMassM2PerG).toBeCloseTo(asGiven.massExtinctionM2PerG, 10);
  expect(dry.asymmetry).toBeCloseTo(asGiven.asymmetry, 10);
});

test('water enters radii, density and index by its share of the volume', () => {
  // Growth factor at 90 %: checks/general/kappa_koehler_growth.csv, ammonium sulfate, κ 0.53.
  const growth = 1.79359866109;
  const { mode } = humidMode(sulfate, 0.9, 0.55);
  expect(mode.medianRadiusUm).toBeCloseTo(0.07 * growth, 10);
  const share = growth ** -3;
  expect(mode.densityGCm3).toBeCloseTo(1.77 * share + WATER_DENSITY_G_CM3 * (1 - share), 10);
  // Water at 0.55 µm: 1.333 (Hale & Querry 1973).
  expect(mode.refractiveIndex.real).toBeCloseTo(1.53 * share + 1.333 * (1 - share), 10);
});

test('extinction rises with humidity, and per dry mass more than per wet mass', () => {
  const curve = humidityCurve([sulfate], [0, 0.3, 0.5, 0.7, 0.8, 0.9, 0.95], 0.55, 'fast');
  expect(curve[0]).toBe(1);
  curve.slice(1).forEach((value, i) => expect(value).toBeGreaterThan(curve[i]!));
  // Measured scattering enhancement of ammonium sulfate at 80–85 % is about 2.5 to 4 (from memory).
  expect(curve[4]).toBeGreaterThan(2);
  expect(curve[4]).toBeLessThan(4);
  const humid = humidOptics([sulfate], 0.8, 0.55);
  expect(humid.extinctionPerDryMassM2PerG).toBeGreaterThan(humid.massExtinctionM2PerG);
});

test('what takes up no water stays as it is at any humidity', () => {
  const inert = { ...sulfate, kappa: 0 };
  expect(humidityCurve([inert], [0.9], 0.55, 'fast')[0]).toBeCloseTo(1, 12);
  expect(() => humidOptics([sulfate], 1, 0.55)).toThrow(
    'relativeHumidity is 1; it must lie within 0 to 0.99',
  );
});
