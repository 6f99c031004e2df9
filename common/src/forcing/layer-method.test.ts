import fc from 'fast-check';
import { expect, test } from 'vitest';
import { upscatterAt, upscatterMean } from '../optics/upscatter';
import { dailyInsolation } from '../orbit/daily-insolation';
import { calculateForcing, type ForcingRequest } from './calculate-forcing';
import { coakleyChylek } from './coakley-chylek';
import { firstOrderBracket } from './first-order-layer';
import { layerForcingInto } from './layer-forcing';
import type { LayerMethodInput } from './layer-method';
import { multiStream } from './multi-stream';
import { slantedLayer } from './slanted-layer';
import { sunOfDay } from './sun-angles';
import { thinLayerForcing } from './thin-layer';
import { twoStream } from './two-stream';

const orbit = { eccentricity: 0.017, obliquityDeg: 23.4, perihelionLongitudeDeg: 102 };
const day = { latitudeDeg: 35, solarLongitudeDeg: 60, orbit };
const air = { transmittance: 1, cloudFraction: 0 };
const dust: LayerMethodInput = {
  ...air,
  surfaceAlbedo: 0.1,
  opticalDepth: 0.1,
  singleScatteringAlbedo: 0.95,
  asymmetry: 0.72,
};
const METHODS = [slantedLayer, multiStream, twoStream];
/** Those that meet the thin layer as they vanish; two-stream closures have slopes of their own. */
const EXACT_SLOPE = [
  ['slanted-layer', slantedLayer, 10_000],
  ['multi-stream', multiStream, 300],
] as const;

const share = fc.double({ min: 0, max: 1, noNaN: true });
const anyAsymmetry = fc.double({ min: -0.6, max: 0.85, noNaN: true });
const anySun = fc.double({ min: 0.05, max: 1, noNaN: true });
const anyDepth = fc.double({ min: 1e-4, max: 5, noNaN: true });
const codes = (request: ForcingRequest) => calculateForcing(request).cautions.map(({ code }) => code);

test.each(EXACT_SLOPE)('%s has the first-order slope at each sun angle', (_, method, numRuns) => {
  const opticalDepth = 1e-6;
  fc.assert(
    fc.property(share, share, anyAsymmetry, anySun, (omega, albedo, g, mu) => {
      const { shortwaveWm2 } = method.evaluate({
        ...air,
        surfaceAlbedo: albedo,
        opticalDepth,
        singleScatteringAlbedo: omega,
        asymmetry: g,
        cosSolarZenith: mu,
        insolationWm2: 1000 * mu,
      });
      const bracket = firstOrderBracket(omega, albedo, upscatterAt(g, mu), upscatterMean(g), mu);
      // The second order is about τ/μ₀ of the first: 2e-5; diffuse light near the horizon adds some.
      expect(Math.abs(shortwaveWm2 / (-1000 * opticalDepth) - bracket)).toBeLessThan(3e-4);
    }),
    { numRuns },
  );
});

test.each(EXACT_SLOPE)(
  '%s has, over the sunlit hemisphere, the slope of the half-day thin layer',
  (_, method) => {
    fc.assert(
      fc.property(share, share, anyAsymmetry, (singleScatteringAlbedo, surfaceAlbedo, asymmetry) => {
        const opticalDepth = 1e-5;
        const layer = { ...air, surfaceAlbedo, opticalDepth, singleScatteringAlbedo, asymmetry };
        const { shortwaveWm2 } = method.evaluate({ ...layer, solarConstantWm2: 1000 });
        const half = thinLayerForcing(
          500,
          surfaceAlbedo,
          opticalDepth,
          singleScatteringAlbedo,
          upscatterMean(asymmetry),
        );
        expect(Math.abs(shortwaveWm2 - half) / (500 * opticalDepth)).toBeLessThan(1e-3);
      }),
      { numRuns: 300 },
    );
  },
);

test('no layer, no effect; no sun, no effect', () => {
  for (const { evaluate } of METHODS) {
    expect(evaluate({ ...dust, opticalDepth: 0 }).shortwaveWm2).toBe(0);
    const night = evaluate({ ...dust, ...day, latitudeDeg: 80, solarLongitudeDeg: 270 });
    expect([night.shortwaveWm2, night.criticalSingleScatteringAlbedo]).toEqual([0, null]);
  }
});

test.each(EXACT_SLOPE)(
  '%s: a layer that absorbs nothing cools over dark ground; an absorbing one warms over white ground',
  (_, method, numRuns) => {
    fc.assert(
      fc.property(
        anyDepth,
        anyAsymmetry,
        anySun,
        fc.double({ min: 0, max: 0.99, noNaN: true }),
        (opticalDepth, asymmetry, mu, omega) => {
          const sun = { cosSolarZenith: mu, insolationWm2: 500 };
          const layer = { ...air, ...sun, opticalDepth, asymmetry };
          const cooling = method.evaluate({ ...layer, surfaceAlbedo: 0, singleScatteringAlbedo: 1 });
          expect(cooling.shortwaveWm2).toBeLessThan(0);
          const warming = method.evaluate({ ...layer, surfaceAlbedo: 1, singleScatteringAlbedo: omega });
          expect(warming.shortwaveWm2).toBeGreaterThan(0);
        },
      ),
      { numRuns },
    );
  },
);

// 2∫μ₀ΔA dμ₀ by 16 points against the isotropic answer.
test('the mean over the sunlit hemisphere is the mean of the single sun angles', () => {
  for (const { evaluate } of METHODS) {
    let sum = 0;
    const points = 60;
    for (let i = 0; i < points; i += 1) {
      const mu = (i + 0.5) / points;
      sum += evaluate({ ...dust, cosSolarZenith: mu, insolationWm2: (1361 / 2) * mu }).shortwaveWm2 / points;
    }
    expect(Math.abs(evaluate(dust).shortwaveWm2 / sum - 1)).toBeLessThan(1e-3);
  }
});

test('16 Gauss points over the lit hours give the insolation and leave less than 0.1 % of the forcing', () => {
  for (const latitudeDeg of [-65, 0, 45, 66.6, 90]) {
    for (const solarLongitudeDeg of [0, 40, 90]) {
      const sun = sunOfDay(latitudeDeg, solarLongitudeDeg, orbit, 1361);
      const mean = dailyInsolation(latitudeDeg, solarLongitudeDeg, orbit, 1361).dailyMeanWm2;
      const label = `${latitudeDeg}° ${solarLongitudeDeg}°`;
      expect(Math.abs(sun.fluxesWm2.reduce((a, b) => a + b, 0) - mean), label).toBeLessThan(1e-6);
      if (mean < 1) continue;
      const daily = slantedLayer.evaluate({ ...dust, latitudeDeg, solarLongitudeDeg, orbit }).shortwaveWm2;
      // The same by the midpoint rule over hour angle, one sun angle after the other.
      const { declinationDeg, litFraction, sunDistanceAu } = dailyInsolation(
        latitudeDeg,
        solarLongitudeDeg,
        orbit,
        1361,
      );
      const [phi, delta] = [latitudeDeg, declinationDeg].map((angle) => (angle * Math.PI) / 180) as [
        number,
        number,
      ];
      const steps = 400;
      let sum = 0;
      for (let i = 0; i < steps; i += 1) {
        const hour = (litFraction * Math.PI * (i + 0.5)) / steps;
        const mu = Math.max(
          1e-4,
          Math.sin(phi) * Math.sin(delta) + Math.cos(phi) * Math.cos(delta) * Math.cos(hour),
        );
        const insolationWm2 = ((1361 / sunDistanceAu ** 2) * litFraction * mu) / steps;
        sum += slantedLayer.evaluate({ ...dust, cosSolarZenith: mu, insolationWm2 }).shortwaveWm2;
      }
      expect(Math.abs(daily / sum - 1), label).toBeLessThan(1e-3);
    }
  }
});

test('the form for the cells of a row gives the numbers of the single cells', () => {
  const depths = [0, 0.02, 0.3, 2];
  const cells = {
    opticalDepth: Float64Array.from(depths),
    surfaceAlbedo: Float64Array.of(0.1, 0.1, 0.5, 0.8),
    cloudFraction: Float64Array.of(0, 0.6, 0.3, 0),
  };
  const sun = sunOfDay(day.latitudeDeg, day.solarLongitudeDeg, orbit, 1361);
  const row = layerForcingInto(
    new Float64Array(4),
    sun,
    coakleyChylek.prepare(dust.asymmetry, sun.cosines),
    { singleScatteringAlbedo: 0.95, transmittance: 0.8 },
    cells,
  );
  depths.forEach((opticalDepth, i) => {
    const single = slantedLayer.evaluate({
      ...dust,
      ...day,
      opticalDepth,
      transmittance: 0.8,
      surfaceAlbedo: cells.surfaceAlbedo[i]!,
      cloudFraction: cells.cloudFraction[i]!,
    });
    expect(single.shortwaveWm2).toBe(row[i]);
  });
});

test('over four orders of magnitude of burden multi-stream saturates, and the thin layer runs away and says so', () => {
  const method = 'multi-stream';
  const at = (opticalDepth: number) => calculateForcing({ ...dust, method, opticalDepth }).shortwaveWm2;
  const [first, last] = [at(1e-3), at(10)];
  expect(last / first).toBeLessThan(2000); // of ten thousand times the burden
  expect(last).toBeGreaterThan(-1361 / 4);
  expect((at(10) - at(3)) / 7).toBeGreaterThan(0.5 * (at(0.3) / 0.3));
  const thin = (opticalDepth: number): ForcingRequest => ({
    ...air,
    method: 'thin-layer',
    surfaceAlbedo: 0.1,
    opticalDepth,
    singleScatteringAlbedo: 0.95,
    upscatterFraction: upscatterMean(0.72),
  });
  expect(calculateForcing(thin(10)).shortwaveWm2).toBeLessThan(-1361 / 4);
  expect(codes(thin(10))).toContain('thin-layer-far-beyond-range');
});

test('above bright cloud absorbing dust warms; the option is off by default and wants both of its inputs', () => {
  const cloud = { cloudFraction: 0.6, singleScatteringAlbedo: 0.9 };
  for (const { evaluate } of METHODS) {
    const off = evaluate({ ...dust, ...cloud }).shortwaveWm2;
    const on = (cloudAlbedo: number, fractionAboveCloud: number) =>
      evaluate({ ...dust, ...cloud, cloudAlbedo, fractionAboveCloud });
    expect(on(0.7, 0).shortwaveWm2).toBe(off);
    expect(on(0.7, 0.5).shortwaveWm2).toBeGreaterThan(off);
    expect(on(0.7, 0.5).cautions.map(({ code }) => code)).toContain('layer-above-cloud');
    // A cloud as dark as the ground, with all of the layer above it, is no cloud.
    const clear = evaluate({ ...dust, ...cloud, cloudFraction: 0 }).shortwaveWm2;
    expect(on(dust.surfaceAlbedo, 1).shortwaveWm2).toBeCloseTo(clear, 10);
    expect(() => evaluate({ ...dust, cloudAlbedo: 0.5 })).toThrow(/fractionAboveCloud is missing/);
  }
});

test('the sun is told in one of three ways, and pieces of another are refused by name', () => {
  const evaluate = (change: object) => () => slantedLayer.evaluate({ ...dust, ...change });
  expect(evaluate({ cosSolarZenith: 0.5 })).toThrow(/insolationWm2 is missing/);
  expect(evaluate({ insolationWm2: 100 })).toThrow(/cosSolarZenith is missing/);
  expect(evaluate({ cosSolarZenith: 0.5, insolationWm2: 100, latitudeDeg: 3 })).toThrow(/latitudeDeg is 3/);
  expect(evaluate({ latitudeDeg: 3, solarLongitudeDeg: 0 })).toThrow(/ageKaBp/);
  expect(evaluate({ ...day, daylightFraction: 0.5 })).toThrow(/daylightFraction is 0.5/);
  expect(evaluate({ upscatterFraction: 0.2 })).toThrow(/upscatterFraction is 0.2; it must be left out/);
  expect(evaluate({ closure: 'eddington' })).toThrow(/closure is eddington/);
});

test('each method says of itself what was measured of it, where it applies', () => {
  const sun = { cosSolarZenith: 1, insolationWm2: 1361 };
  expect(codes({ ...dust, method: 'two-stream' })).toContain('two-stream-thin');
  expect(codes({ ...dust, method: 'two-stream', opticalDepth: 1 })).not.toContain('two-stream-thin');
  expect(codes({ ...dust, method: 'two-stream', cosSolarZenith: 0.1, insolationWm2: 136 })).toContain(
    'two-stream-low-sun',
  );
  expect(codes({ ...dust, ...sun, method: 'two-stream', closure: 'eddington', opticalDepth: 0.01 })).toEqual([
    'closure-to-compare',
    'negative-reflectance',
    'longwave-left-out',
  ]);
  expect(codes({ ...dust, method: 'slanted-layer' })).toEqual(['longwave-left-out']);
  expect(codes({ ...dust, method: 'slanted-layer', opticalDepth: 2 })).toContain('slanted-layer-thick');
  expect(codes({ ...dust, ...sun, method: 'slanted-layer', opticalDepth: 2 })).toContain(
    'slanted-layer-one-angle',
  );
  expect(codes({ ...dust, method: 'multi-stream', asymmetry: 0.97 })).toContain('multi-stream-forward-peak');
  expect(codes({ ...dust, method: 'multi-stream', surfaceAlbedo: 0.5 })).toContain('near-sign-change');
});
