import { expect, test } from 'vitest';
import { bandOptics, longwaveWeights, planckWeights, shortwaveWeights, SHORTWAVE_UM } from './broadband';

const grey = () => ({ massExtinctionM2PerG: 0.6, singleScatteringAlbedo: 0.9, asymmetry: 0.7 });

test('the band mean of grey optics is the grey value', () => {
  const band = bandOptics(grey, shortwaveWeights());
  expect(band.massExtinctionM2PerG).toBeCloseTo(0.6, 13);
  expect(band.singleScatteringAlbedo).toBeCloseTo(0.9, 13);
  expect(band.asymmetry).toBeCloseTo(0.7, 13);
  expect(band.massAbsorptionM2PerG).toBeCloseTo(0.06, 13);
  expect(band.basis).toBe('Planck function at 5772 K, cut to 0.2–4 µm');
});

// Smooth functions of wavelength: the rule's own error is far below what the optics carry.
test('24 wavelengths weigh the shortwave as well as 200', () => {
  const mean = (count: number, of: (wavelength: number) => number) => {
    const { wavelengthsUm, weights } = planckWeights(5772, SHORTWAVE_UM, count);
    return wavelengthsUm.reduce((sum, wavelength, i) => sum + weights[i]! * of(wavelength), 0);
  };
  for (const of of [(w: number) => w, (w: number) => 1 / w, (w: number) => Math.exp(-w)])
    expect(Math.abs(mean(24, of) / mean(200, of) - 1)).toBeLessThan(1e-9);
});

test('the weights peak where Wien puts the black body', () => {
  // Over ln λ the energy is λB, which peaks at λT = 3669.7 µm K: root of x = 4(1 − e^(−x)), x = 3.9207.
  const { wavelengthsUm, weights } = planckWeights(288, [4, 100], 200);
  const rule = wavelengthsUm.map((_, i) => {
    const width = Math.log((wavelengthsUm[i + 1] ?? 100) / (wavelengthsUm[i - 1] ?? 4));
    return weights[i]! / width;
  });
  const peak = wavelengthsUm[rule.indexOf(Math.max(...rule))]!;
  expect(Math.abs((peak * 288) / 3669.7 - 1)).toBeLessThan(0.03);
});

test('a band knows its limits', () => {
  expect(longwaveWeights(270).wavelengthsUm[0]).toBeGreaterThan(4);
  expect(longwaveWeights(270).weights.reduce((sum, weight) => sum + weight, 0)).toBeCloseTo(1, 13);
  expect(() => longwaveWeights(50)).toThrow('temperatureK is 50 K');
  expect(() => planckWeights(5772, [4, 0.2], 24)).toThrow('highUm');
  expect(bandOptics(() => ({ ...grey(), massExtinctionM2PerG: 0 }), shortwaveWeights())).toMatchObject({
    singleScatteringAlbedo: 1,
    asymmetry: 0,
  });
});
