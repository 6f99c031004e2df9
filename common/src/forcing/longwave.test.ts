import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable, numberIn } from '../../test/check-table';
import { greyLayer } from './longwave';
import { thinLayer } from './thin-layer';
import { simpleAlbedo } from './simple-albedo';

const layer = {
  transmittance: 0.76,
  cloudFraction: 0.6,
  surfaceAlbedo: 0.1,
  opticalDepth: 0.02,
  singleScatteringAlbedo: 0.95,
  upscatterFraction: 0.2,
};
const grey = { opticalDepth: 0.03, surfaceTemperatureK: 300, layerTemperatureK: 280 };

// 8 decimals printed.
test('the grey layer equals independent fluxes at the top, the surface and within', () => {
  for (const row of checkTable('optics/longwave_grey_layer.csv')) {
    const fluxes = greyLayer(
      numberIn(row, 'tau_abs'),
      numberIn(row, 'surface_temperature_K'),
      numberIn(row, 'layer_temperature_K'),
      1.66,
      numberIn(row, 'surface_emissivity'),
    );
    const label = JSON.stringify(row);
    expect(Math.abs(fluxes.emissivity - numberIn(row, 'layer_emissivity_D1.66')), label).toBeLessThan(1e-9);
    expect(Math.abs(fluxes.toaWm2 - numberIn(row, 'dF_TOA_W_m2')), label).toBeLessThan(1e-7);
    expect(Math.abs(fluxes.surfaceWm2 - numberIn(row, 'dF_surface_W_m2')), label).toBeLessThan(1e-7);
    expect(Math.abs(fluxes.layerWm2 - numberIn(row, 'dF_layer_W_m2')), label).toBeLessThan(1e-7);
  }
});

test('a layer colder than black ground warms, a warmer one cools, an empty one does nothing', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.001, max: 5, noNaN: true }),
      fc.double({ min: 200, max: 320, noNaN: true }),
      fc.double({ min: 1, max: 60, noNaN: true }),
      (depth, temperature, difference) => {
        expect(greyLayer(depth, temperature, temperature - difference).toaWm2).toBeGreaterThan(0);
        expect(greyLayer(depth, temperature, temperature + difference).toaWm2).toBeLessThan(0);
        expect(Math.abs(greyLayer(0, temperature, temperature - difference).toaWm2)).toBe(0);
      },
    ),
  );
});

test('a shortwave method takes a longwave block by efficiency or of a grey layer', () => {
  const byEfficiency = thinLayer.evaluate({ ...layer, longwave: { efficiencyWm2: 15 } });
  expect(byEfficiency.longwaveWm2).toBeCloseTo(0.3, 12);
  expect(byEfficiency.netWm2).toBe(byEfficiency.shortwaveWm2 + byEfficiency.longwaveWm2);
  expect(byEfficiency.cautions.map((caution) => caution.code)).not.toContain('longwave-left-out');
  const byLayer = thinLayer.evaluate({
    ...layer,
    longwave: { ...grey, highCloudFraction: 0.25, gasTransmission: 0.5 },
  });
  expect(byLayer.longwaveWm2).toBeCloseTo(0.375 * greyLayer(0.03, 300, 280).toaWm2, 12);
});

test('a grey layer without gases says that it is an upper bound', () => {
  const { cautions } = thinLayer.evaluate({ ...layer, longwave: { ...grey, highCloudFraction: 0.2 } });
  expect(cautions.map((caution) => caution.code)).toEqual(['longwave-no-gas-overlap']);
});

test('fields within the longwave block are refused by their full name', () => {
  const wrong = (longwave: object) => () =>
    thinLayer.evaluate({ ...layer, longwave: longwave as typeof grey });
  expect(wrong({ ...grey, layerTemperatureK: 20 })).toThrow(
    /longwave.layerTemperatureK is 20 K; it must lie within 100 to 400/,
  );
  expect(wrong({ opticalDepth: 0.1 })).toThrow(/longwave.surfaceTemperatureK is missing/);
  expect(wrong({ efficiencyWm2: 3, diffusivity: 2 })).toThrow(
    /longwave.diffusivity is 2; it must be left out/,
  );
  const surface = { insolationWm2: 340, transmittance: 0.76, cloudFraction: 0.6, albedoChange: 0.01 };
  expect(() => simpleAlbedo.evaluate({ ...surface, longwave: { efficiencyWm2: 3 } })).toThrow(
    /longwave.efficiencyWm2/,
  );
});
