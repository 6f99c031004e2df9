import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { exampleEstimate } from '../../test/example-estimate';
import { criticalSingleScatteringAlbedo } from '../forcing/critical-albedo';
import { upscatterMean } from '../optics/upscatter';
import { globalAnnualMeanInsolation } from '../orbit/mean-insolation';
import type { BackdropBand, EstimateInputs } from './estimate-inputs';
import { LIGHT_INSOLATION, lightMoments, LIGHTS } from './light-moments';
import { regionGeometry } from './region-geometry';
import { previewEstimate, runEstimate } from './run-estimate';
import { sliceField } from './slice-field';
import { regularGrid } from '../sphere/regular-grid';

const METHODS = ['thin-layer-daily', 'thin-layer', 'simple-albedo', 'efficiency'] as const;

/** One ground and sky everywhere. */
function uniform(surfaceAlbedo: number, cloudFraction: number): BackdropBand[] {
  const none = { cloudFractionLand: null, cloudFractionOcean: null };
  return [{ southDeg: -90, northDeg: 90, surfaceAlbedo, cloudFraction, ...none }];
}

function uniformDepth(opticalDepth: number): EstimateInputs['field']['base'] {
  const half = { land: opticalDepth, ocean: opticalDepth };
  return { title: 'one value', opticalDepth: { south: half, north: half }, cautions: [] };
}

// 1361 W m⁻², the rows without gas and cloud variants as they are. 2e-9: the table prints ten digits; the sphere sums to 1e-14.
test('over one ground and sky the half-day form gives the thin-layer table back as the global direct effect', () => {
  const rows = checkTable('optics/forcing_thin_layer.csv').filter(
    (row, i) => i % 40 === 0 && Number(row.S0_W_m2) === 1361,
  );
  expect(rows.length).toBeGreaterThan(3);
  for (const row of rows) {
    const inputs = exampleEstimate({
      method: 'thin-layer',
      longwave: null,
      transmittance: Number(row.T_above),
      backdrop: uniform(Number(row.surface_albedo), Number(row.cloud_fraction)),
      optics: {
        singleScatteringAlbedo: Number(row.omega),
        asymmetry: Number(row.g),
        massExtinctionM2PerG: 0.6,
      },
    });
    const depth = Number(row.tau);
    const result = runEstimate({
      ...inputs,
      field: { ...inputs.field, base: uniformDepth(depth) },
      ensemble: { ...inputs.ensemble, members: 1, parameters: [] },
    });
    const got = result.global.directEffectReference.shortwaveWm2.value;
    const truth = Number(row.dF_TOA_W_m2);
    expect(Math.abs(got - truth), JSON.stringify(row)).toBeLessThan(
      2e-9 * Math.max(1, Math.abs(truth)) + 1e-9,
    );
  }
});

// The daily form averaged over year and sphere is the half-day one: the sunlit hemisphere is seen from every side.
// 2e-3: three nodes per month, cells of 2°, and S₀/(4√(1−e²)) against S₀/4 (1.4e-4).
test('averaged over globe and year the daily form equals the half-day form over one ground', () => {
  for (const surfaceAlbedo of [0, 0.2, 0.6]) {
    const base = exampleEstimate({ backdrop: uniform(surfaceAlbedo, 0.3), longwave: null });
    const inputs = { ...base, field: { ...base.field, base: uniformDepth(0.02) } };
    const daily = runEstimate({ ...inputs, method: 'thin-layer-daily' }).global.directEffectReference
      .shortwaveWm2.value;
    const halfDay = runEstimate({ ...inputs, method: 'thin-layer' }).global.directEffectReference.shortwaveWm2
      .value;
    expect(Math.abs(daily / halfDay - 1), `${surfaceAlbedo}`).toBeLessThan(2e-3);
  }
});

test('the insolation of all rows and months adds up to the global annual mean', () => {
  const geometry = regionGeometry(2);
  const { orbit } = exampleEstimate().slice;
  const { months } = lightMoments(geometry, orbit, 1361);
  const { cellAreaFraction, columns } = regularGrid(2);
  let mean = 0;
  for (const { byRow, shareOfYear } of months) {
    for (let row = 0; row < geometry.rows; row++) {
      mean += shareOfYear * cellAreaFraction[row]! * columns * byRow[row * LIGHTS + LIGHT_INSOLATION]!;
    }
  }
  expect(Math.abs(mean / globalAnnualMeanInsolation(orbit, 1361) - 1)).toBeLessThan(2e-4);
});

test.each(METHODS)('%s: without dust there is no effect', (method) => {
  const inputs = exampleEstimate({ method });
  const { global } = runEstimate({ ...inputs, field: { ...inputs.field, base: uniformDepth(0) } });
  expect(Math.abs(global.forcing.netWm2.value)).toBe(0);
  expect(Math.abs(global.directEffect.netWm2.low)).toBe(0);
});

test.each(METHODS)('%s: regions and the places in none add up to the globe', (method) => {
  const inputs = exampleEstimate({ method });
  const { global, regions, outside } = runEstimate(inputs);
  const places = [...regions, outside];
  expect(places.reduce((total, place) => total + place.areaShare, 0)).toBeCloseTo(1, 12);
  const sum = places.reduce((total, place) => total + place.areaShare * place.forcing.netWm2.value, 0);
  expect(Math.abs(sum - global.forcing.netWm2.value)).toBeLessThan(1e-9);
  const field = sliceField(inputs);
  const { cellAreaFraction, columns } = regularGrid(2);
  const mean = field.netForcingWm2.reduce(
    (total, f, cell) => total + f * cellAreaFraction[Math.floor(cell / columns)]!,
    0,
  );
  expect(Math.abs(mean - global.forcing.netWm2.value)).toBeLessThan(1e-9);
  const depth = field.opticalDepthSlice.reduce(
    (total, d, cell) => total + d * cellAreaFraction[Math.floor(cell / columns)]!,
    0,
  );
  expect(Math.abs(depth - global.opticalDepthSlice)).toBeLessThan(1e-9);
});

test.each(METHODS)(
  '%s: direct effect of the slice minus that of the reference is the forcing, everywhere',
  (method) => {
    const { global, regions } = runEstimate(exampleEstimate({ method }));
    for (const place of [global, ...regions]) {
      for (const part of ['shortwaveWm2', 'longwaveWm2', 'netWm2'] as const) {
        const difference = place.directEffect[part].value - place.directEffectReference[part].value;
        expect(Math.abs(difference - place.forcing[part].value)).toBeLessThan(
          1e-12 + 1e-12 * Math.abs(difference),
        );
      }
      expect(place.forcing.kind).toBe('forcing');
      expect(place.directEffect.kind).toBe('direct-effect');
    }
  },
);

test.each(['thin-layer-daily', 'thin-layer', 'simple-albedo'] as const)(
  '%s: dust that only scatters cools dark ground',
  (method) => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 0.9, noNaN: true }),
        fc.double({ min: 0, max: 0.9, noNaN: true }),
        (asymmetry, cloud) => {
          const inputs = exampleEstimate({
            method,
            longwave: null,
            backdrop: uniform(0, cloud),
            optics: { singleScatteringAlbedo: 1, asymmetry, massExtinctionM2PerG: 0.6 },
          });
          const { global, regions } = previewEstimate({
            ...inputs,
            ensemble: { ...inputs.ensemble, members: 1, parameters: [] },
          });
          expect(global.directEffect.shortwaveWm2.value).toBeLessThan(0);
          for (const region of regions) expect(region.directEffect.shortwaveWm2.value).toBeLessThan(0);
        },
      ),
      { numRuns: 20 },
    );
  },
);

test.each(['thin-layer', 'simple-albedo'] as const)(
  '%s: the sign turns at the critical single-scattering albedo',
  (method) => {
    const critical = criticalSingleScatteringAlbedo(upscatterMean(0.7), 0.3);
    const at = (singleScatteringAlbedo: number) => {
      const inputs = exampleEstimate({
        method,
        longwave: null,
        backdrop: uniform(0.3, 0.5),
        optics: { singleScatteringAlbedo, asymmetry: 0.7, massExtinctionM2PerG: 0.6 },
      });
      return runEstimate({ ...inputs, ensemble: { ...inputs.ensemble, members: 1, parameters: [] } });
    };
    expect(Math.abs(at(critical).global.directEffect.shortwaveWm2.value)).toBeLessThan(1e-12);
    expect(at(critical + 0.01).global.directEffect.shortwaveWm2.value).toBeLessThan(0);
    expect(at(critical - 0.01).global.directEffect.shortwaveWm2.value).toBeGreaterThan(0);
    expect(at(critical).criticalSingleScatteringAlbedo).toBeCloseTo(critical, 12);
  },
);

test.each(METHODS)('%s: doubling the base field doubles every effect', (method) => {
  const inputs = exampleEstimate({ method });
  const { south, north } = inputs.field.base.opticalDepth;
  const twice = (half: typeof south) => ({ land: 2 * half.land, ocean: 2 * half.ocean });
  const base = { ...inputs.field.base, opticalDepth: { south: twice(south), north: twice(north) } };
  const single = runEstimate(inputs).global;
  const doubled = runEstimate({ ...inputs, field: { ...inputs.field, base } }).global;
  for (const bound of ['value', 'low', 'high'] as const) {
    expect(doubled.forcing.netWm2[bound]).toBeCloseTo(2 * single.forcing.netWm2[bound], 10);
  }
  expect(doubled.burdenSliceTg).toBeCloseTo(2 * single.burdenSliceTg, 9);
});

test('one seed gives the same bytes, another seed other intervals, and both the same central values', () => {
  const inputs = exampleEstimate();
  const first = JSON.stringify(runEstimate(inputs));
  expect(JSON.stringify(runEstimate(inputs))).toBe(first);
  const other = runEstimate({ ...inputs, ensemble: { ...inputs.ensemble, seed: 99 } });
  const here = runEstimate(inputs);
  expect(other.global.forcing.netWm2.low).not.toBe(here.global.forcing.netWm2.low);
  expect(other.global.forcing.netWm2.value).toBe(here.global.forcing.netWm2.value);
  expect(previewEstimate(inputs).global.forcing.netWm2.value).toBe(here.global.forcing.netWm2.value);
});

test('the interval holds the central value and the outcomes rise through it', () => {
  const { global, outcomes } = runEstimate(exampleEstimate());
  const { value, low, high } = global.forcing.netWm2;
  expect(low).toBeLessThan(value);
  expect(high).toBeGreaterThan(value);
  expect(outcomes).toHaveLength(50);
  expect(outcomes).toEqual([...outcomes].sort((a, b) => a - b));
  expect(outcomes[0]!).toBeLessThan(low);
  expect(outcomes[49]!).toBeGreaterThan(high);
});

test('months weighted by their length give the annual forcing back when both share one orbit', () => {
  const inputs = exampleEstimate();
  const result = runEstimate({ ...inputs, reference: inputs.slice });
  expect(result.monthly).toHaveLength(12);
  const annual = result.monthly!.reduce((sum, month) => sum + month.shareOfYear * month.netWm2, 0);
  expect(annual).toBeCloseTo(result.global.forcing.netWm2.value, 10);
  const sahara = result.regions.findIndex((region) => region.code === 'SAH');
  const there = result.monthly!.reduce(
    (sum, month) => sum + month.shareOfYear * month.regionNetWm2[sahara]!,
    0,
  );
  expect(there).toBeCloseTo(result.regions[sahara]!.forcing.netWm2.value, 10);
  expect(runEstimate({ ...inputs, method: 'thin-layer' }).monthly).toBeNull();
});

test('an all-sky efficiency says nothing of clear sky', () => {
  const clear = runEstimate(exampleEstimate()).global.forcingClearSky;
  expect(clear.sky).toBe('clear sky');
  expect(clear.shortwaveWm2!.value).toBeLessThan(0);
  expect(clear.longwaveWm2).toBeNull();
  expect(clear.netWm2).toBeNull();
  const withClear = exampleEstimate({
    longwave: { efficiencyWm2: 10, sky: 'clear', highCloudFraction: 0.25 },
  });
  const { forcing, forcingClearSky } = runEstimate(withClear).global;
  expect(forcing.longwaveWm2.value).toBeCloseTo(0.75 * forcingClearSky.longwaveWm2!.value, 12);
  expect(forcingClearSky.netWm2).not.toBeNull();
});
