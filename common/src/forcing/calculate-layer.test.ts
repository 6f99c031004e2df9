import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable, numberIn } from '../../test/check-table';
import { calculateLayer, LAYER_SCHEME_IDS, type LayerRequest } from './calculate-layer';

const dust: LayerRequest = {
  opticalDepth: 0.1,
  singleScatteringAlbedo: 0.95,
  asymmetry: 0.75,
  surfaceAlbedo: 0.1,
  scheme: 'multi-stream',
};
const codes = (request: LayerRequest) => calculateLayer(request).cautions.map(({ code }) => code);

/** Every seventh row: the whole tables are compared where the schemes themselves are tested. */
const some = <Row>(rows: Row[]) => rows.filter((_, i) => i % 7 === 0);

// 8 decimals printed, 7 to be trusted.
test('the layer over grey ground answers the exact planetary albedo, at a sun angle and without one', () => {
  for (const row of some(checkTable('optics/rt_exact_layer.csv'))) {
    const { reflectance, transmittance, absorptance } = calculateLayer({
      opticalDepth: numberIn(row, 'tau'),
      singleScatteringAlbedo: numberIn(row, 'omega'),
      asymmetry: numberIn(row, 'g'),
      cosSolarZenith: numberIn(row, 'mu0'),
      surfaceAlbedo: 0.3,
      scheme: 'multi-stream',
    });
    expect(Math.abs(reflectance - numberIn(row, 'toa_albedo_Rs0.3')), JSON.stringify(row)).toBeLessThan(5e-7);
    expect(reflectance + 0.7 * transmittance! + absorptance!).toBeCloseTo(1, 12);
  }
  for (const row of some(checkTable('optics/rt_exact_diffuse.csv'))) {
    const black = calculateLayer({
      opticalDepth: numberIn(row, 'tau'),
      singleScatteringAlbedo: numberIn(row, 'omega'),
      asymmetry: numberIn(row, 'g'),
      surfaceAlbedo: 0,
      scheme: 'multi-stream',
    });
    const label = JSON.stringify(row);
    expect(Math.abs(black.reflectance - numberIn(row, 'R_isotropic_incidence')), label).toBeLessThan(5e-7);
    expect(Math.abs(black.transmittance! - numberIn(row, 'T_isotropic_incidence')), label).toBeLessThan(5e-7);
  }
});

// Closed form against matrix exponential, 8 decimals.
test('over black ground the two-stream schemes answer the tabulated fluxes, none of them negative', () => {
  const schemes = [
    ['delta-eddington', 'delta_eddington'],
    ['coakley-chylek', 'coakley_chylek_1'],
  ] as const;
  for (const row of checkTable('optics/rt_twostream.csv')) {
    for (const [scheme, column] of schemes) {
      const answer = calculateLayer({
        opticalDepth: numberIn(row, 'tau'),
        singleScatteringAlbedo: numberIn(row, 'omega'),
        asymmetry: numberIn(row, 'g'),
        cosSolarZenith: numberIn(row, 'mu0'),
        surfaceAlbedo: 0,
        scheme,
      });
      const expected = numberIn(row, `R_${column}`);
      expect(Math.abs(answer.reflectance - expected), JSON.stringify(row)).toBeLessThan(3e-8);
      expect(Math.abs(answer.transmittance! - numberIn(row, `T_${column}`))).toBeLessThan(3e-8);
      const warned = answer.cautions.some(({ code }) => code === 'negative-reflectance');
      expect(warned, JSON.stringify(row)).toBe(false);
    }
  }
});

// First order at 10 digits; four digits printed for the mean.
test('the thin layer answers a reflectance alone, the first-order one', () => {
  for (const row of checkTable('optics/forcing_local_mu0.csv')) {
    const answer = calculateLayer({
      opticalDepth: numberIn(row, 'tau'),
      singleScatteringAlbedo: numberIn(row, 'omega'),
      asymmetry: numberIn(row, 'g'),
      cosSolarZenith: numberIn(row, 'mu0'),
      surfaceAlbedo: numberIn(row, 'surface_albedo'),
      scheme: 'thin-layer',
    });
    const change = answer.reflectance - numberIn(row, 'surface_albedo');
    expect(Math.abs(change - numberIn(row, 'delta_albedo_first_order'))).toBeLessThan(1e-9);
    expect([answer.transmittance, answer.absorptance]).toEqual([null, null]);
  }
  for (const row of checkTable('optics/error_mean_case.csv')) {
    const { reflectance } = calculateLayer({
      opticalDepth: numberIn(row, 'tau'),
      singleScatteringAlbedo: numberIn(row, 'omega'),
      asymmetry: numberIn(row, 'g'),
      surfaceAlbedo: numberIn(row, 'surface_albedo'),
      scheme: 'thin-layer',
    });
    const expected = numberIn(row, 'thin_layer_delta_albedo');
    expect(Math.abs(reflectance - numberIn(row, 'surface_albedo') - expected)).toBeLessThan(
      6e-5 * Math.max(0.1, Math.abs(expected)) + 1e-7,
    );
  }
  expect(codes({ ...dust, opticalDepth: 3, cosSolarZenith: 0.1, scheme: 'thin-layer' })).toContain(
    'reflectance-impossible',
  );
});

const share = fc.double({ min: 0, max: 1, noNaN: true });
test.each([
  ['coakley-chylek', 1000],
  ['multi-stream', 300],
] as const)(
  'by %s every part of the light lies within 0 to 1 and all of it is accounted for',
  (scheme, numRuns) => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 20, noNaN: true }),
        share,
        fc.double({ min: -0.7, max: 0.8, noNaN: true }),
        fc.option(fc.double({ min: 0.01, max: 1, noNaN: true }), { nil: undefined }),
        share,
        (opticalDepth, singleScatteringAlbedo, asymmetry, cosSolarZenith, surfaceAlbedo) => {
          const { reflectance, transmittance, absorptance } = calculateLayer({
            opticalDepth,
            singleScatteringAlbedo,
            asymmetry,
            ...(cosSolarZenith !== undefined && { cosSolarZenith }),
            surfaceAlbedo,
            scheme,
          });
          const slack = 1e-9; // rounding over some twenty doublings
          expect(reflectance).toBeGreaterThanOrEqual(-slack);
          expect(reflectance).toBeLessThanOrEqual(1 + slack);
          expect(absorptance).toBeGreaterThanOrEqual(-slack);
          expect(absorptance).toBeLessThanOrEqual(1 + slack);
          expect((1 - surfaceAlbedo) * transmittance!).toBeLessThanOrEqual(1 + slack);
          expect(
            Math.abs(reflectance + (1 - surfaceAlbedo) * transmittance! + absorptance! - 1),
          ).toBeLessThan(slack);
        },
      ),
      { numRuns },
    );
  },
);

test('a layer that absorbs nothing keeps all light, by every scheme that tells', () => {
  for (const scheme of ['coakley-chylek', 'multi-stream', 'delta-eddington'] as const) {
    for (const opticalDepth of [0.001, 0.3, 20]) {
      const answer = calculateLayer({ ...dust, scheme, opticalDepth, singleScatteringAlbedo: 1 });
      // Delta-Eddington stops at ω 1 − 1e-9.
      expect(Math.abs(answer.absorptance!), scheme).toBeLessThan(scheme === 'delta-eddington' ? 1e-6 : 1e-9);
    }
  }
});

test('an unknown scheme, a sun below the horizon and a stray input are refused by name', () => {
  const odd = (change: object) => () => calculateLayer({ ...dust, ...change });
  expect(odd({ scheme: 'guess' })).toThrow(new RegExp(`one of ${LAYER_SCHEME_IDS.join(', ')}`));
  expect(odd({ cosSolarZenith: -0.1 })).toThrow(/cosSolarZenith is -0.1/);
  expect(odd({ cloudFraction: 0.1 })).toThrow(/cloudFraction is 0.1; it must be left out/);
  expect(odd({ surfaceAlbedo: undefined })).toThrow(/surfaceAlbedo is missing/);
});
