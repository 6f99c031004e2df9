import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable, numberIn, relativeError } from '../../test/check-table';
import { gaussLegendre } from '../optics/gauss-legendre';
import { hgUpscatterCoefficients, upscatterAt, upscatterMean, upscatterOrder } from '../optics/upscatter';
import { dailyInsolation, sunCourse } from '../orbit/daily-insolation';
import { bergerOrbit } from '../orbit/elements';
import { dailyMeanUpscatter, dailyMoments } from './daily-moments';
import { firstOrderBracket } from './first-order-layer';
import { thinLayerForcing } from './thin-layer';
import {
  thinLayerDaily,
  thinLayerDailyInto,
  thinLayerDailySlope,
  type ThinLayerDailyInput,
} from './thin-layer-daily';

const { orbit } = bergerOrbit(21);
const base: ThinLayerDailyInput = {
  latitudeDeg: 20,
  ageKaBp: 21,
  solarLongitudeDeg: 100,
  transmittance: 0.76,
  cloudFraction: 0.3,
  surfaceAlbedo: 0.2,
  opticalDepth: 0.05,
  singleScatteringAlbedo: 0.92,
  asymmetry: 0.72,
};
const anyCase = fc.record({
  latitudeDeg: fc.double({ min: -90, max: 90, noNaN: true }),
  solarLongitudeDeg: fc.double({ min: 0, max: 360, noNaN: true }),
  asymmetry: fc.double({ min: 0, max: 0.85, noNaN: true }),
  surfaceAlbedo: fc.double({ min: 0, max: 1, noNaN: true }),
  singleScatteringAlbedo: fc.double({ min: 0, max: 1, noNaN: true }),
});

// First-order expansion by an independent program, 10 digits printed.
test('the first order at one sun angle equals independent values', () => {
  for (const row of checkTable('optics/forcing_local_mu0.csv')) {
    const [tau, g, mu] = [numberIn(row, 'tau'), numberIn(row, 'g'), numberIn(row, 'mu0')];
    const label = JSON.stringify(row);
    expect(Math.abs(upscatterAt(g, mu) - numberIn(row, 'beta_mu0')), label).toBeLessThan(1e-9);
    const bracket = firstOrderBracket(
      numberIn(row, 'omega'),
      numberIn(row, 'surface_albedo'),
      upscatterAt(g, mu),
      upscatterMean(g),
      mu,
    );
    expect(Math.abs((tau * bracket) / mu - numberIn(row, 'delta_albedo_first_order')), label).toBeLessThan(
      1e-9,
    );
    expect(
      relativeError(-1361 * tau * bracket, numberIn(row, 'dF_W_m2_for_S0_1361_at_this_mu0'), 1),
      label,
    ).toBeLessThan(1e-8);
  }
});

test('the moments give what direct integration over the lit hours gives, to 1e-9', () => {
  const rule = gaussLegendre(200);
  fc.assert(
    fc.property(
      anyCase,
      ({ latitudeDeg, solarLongitudeDeg, asymmetry, surfaceAlbedo, singleScatteringAlbedo }) => {
        const order = upscatterOrder(asymmetry, 1e-14);
        const moments = dailyMoments(latitudeDeg, solarLongitudeDeg, orbit, 1361, order);
        const mean = upscatterMean(asymmetry);
        const { a, b, h0 } = sunCourse(latitudeDeg, solarLongitudeDeg, orbit);
        fc.pre(h0 > 0);
        let direct = 0;
        let size = 0;
        rule.nodes.forEach((node, i) => {
          const mu = Math.max(0, a + b * Math.cos((h0 * (1 + node)) / 2));
          const bracket = firstOrderBracket(
            singleScatteringAlbedo,
            surfaceAlbedo,
            upscatterAt(asymmetry, mu),
            mean,
            mu,
          );
          direct += (rule.weights[i]! / 2) * bracket;
          size += (rule.weights[i]! / 2) * Math.abs(bracket);
        });
        const slope = thinLayerDailySlope(
          moments,
          {
            singleScatteringAlbedo,
            dailyUpscatter: dailyMeanUpscatter(hgUpscatterCoefficients(asymmetry, order), moments.legendre),
            upscatterMean: mean,
            transmittance: 1,
          },
          surfaceAlbedo,
          0,
        );
        expect(Math.abs(slope + moments.incidentWm2 * direct)).toBeLessThan(
          1e-9 * moments.incidentWm2 * Math.max(size, 1e-3),
        );
      },
    ),
    { numRuns: 200 },
  );
});

test('the first moment is the daylight mean of the sun angle, and light times it is the insolation', () => {
  for (const latitude of [-80, -30, 0, 45, 66, 90]) {
    const moments = dailyMoments(latitude, 80, orbit, 1361, 21);
    const day = dailyInsolation(latitude, 80, orbit, 1361);
    expect(Math.abs(moments.legendre[0]! - day.meanCosZenithDaylight)).toBeLessThan(1e-12);
    expect(Math.abs(moments.incidentWm2 * moments.meanMu - day.dailyMeanWm2)).toBeLessThan(1e-9);
  }
});

test('averaged over the sphere at one distance the daily form is the half-day form', () => {
  const rule = gaussLegendre(64);
  const circle: typeof orbit = { eccentricity: 0, obliquityDeg: 23, perihelionLongitudeDeg: 0 };
  for (const longitude of [0, 50, 90]) {
    const limit = Math.cos((dailyInsolation(0, longitude, circle, 1361).declinationDeg * Math.PI) / 180);
    let mean = 0;
    for (const [from, to] of [
      [-1, -limit],
      [-limit, limit],
      [limit, 1],
    ] as const) {
      rule.nodes.forEach((node, i) => {
        const theta = (Math.PI / 2) * (1 + node);
        const sine = Math.min(1, Math.max(-1, (from + to) / 2 - ((to - from) / 2) * Math.cos(theta)));
        const weight = (rule.weights[i]! * Math.PI * (to - from) * Math.sin(theta)) / 8;
        const { ageKaBp: _, ...rest } = base;
        const input = {
          ...rest,
          orbit: circle,
          latitudeDeg: (Math.asin(sine) * 180) / Math.PI,
          solarLongitudeDeg: longitude,
        };
        mean += weight * thinLayerDaily.evaluate(input).shortwaveWm2;
      });
    }
    const light = 0.5 * 1361 * base.transmittance ** 2 * (1 - base.cloudFraction);
    const half = thinLayerForcing(light, base.surfaceAlbedo, 0.05, 0.92, upscatterMean(0.72));
    expect(relativeError(mean, half), `λ ${longitude}`).toBeLessThan(1e-6);
  }
});

test('a layer that absorbs nothing over dark ground cools wherever the sun shines; polar night gives nothing', () => {
  fc.assert(
    fc.property(anyCase, ({ latitudeDeg, solarLongitudeDeg, asymmetry }) => {
      const input = {
        ...base,
        latitudeDeg,
        solarLongitudeDeg,
        asymmetry,
        surfaceAlbedo: 0,
        singleScatteringAlbedo: 1,
      };
      const { shortwaveWm2 } = thinLayerDaily.evaluate(input);
      const { litFraction } = dailyInsolation(latitudeDeg, solarLongitudeDeg, orbit, 1361);
      if (litFraction > 0) expect(shortwaveWm2).toBeLessThan(0);
      else expect(shortwaveWm2).toBe(0);
    }),
    { numRuns: 60 },
  );
});

test('the effect vanishes at the critical single-scattering albedo it reports', () => {
  const critical = thinLayerDaily.evaluate(base).criticalSingleScatteringAlbedo!;
  expect(critical).toBeGreaterThan(0);
  expect(critical).toBeLessThan(1);
  const { shortwaveWm2 } = thinLayerDaily.evaluate({ ...base, singleScatteringAlbedo: critical });
  expect(Math.abs(shortwaveWm2)).toBeLessThan(1e-12);
});

test('the form for the cells of a row gives the numbers of the single evaluation', () => {
  const order = upscatterOrder(base.asymmetry, 1e-14);
  const moments = dailyMoments(base.latitudeDeg, base.solarLongitudeDeg, orbit, 1361, order);
  const optics = {
    singleScatteringAlbedo: base.singleScatteringAlbedo,
    dailyUpscatter: dailyMeanUpscatter(hgUpscatterCoefficients(base.asymmetry, order), moments.legendre),
    upscatterMean: upscatterMean(base.asymmetry),
    transmittance: base.transmittance,
  };
  const cells = {
    opticalDepth: Float64Array.of(0, 0.05, 0.2),
    surfaceAlbedo: Float64Array.of(0.1, 0.2, 0.8),
    cloudFraction: Float64Array.of(0.5, 0.3, 0),
  };
  const out = thinLayerDailyInto(new Float64Array(3), moments, optics, cells);
  for (let i = 0; i < 3; i += 1) {
    const { shortwaveWm2 } = thinLayerDaily.evaluate({
      ...base,
      opticalDepth: cells.opticalDepth[i]!,
      surfaceAlbedo: cells.surfaceAlbedo[i]!,
      cloudFraction: cells.cloudFraction[i]!,
    });
    expect(Math.abs(out[i]! - shortwaveWm2)).toBeLessThan(1e-12);
  }
});

test('a low sun and an old orbit bring their cautions, and two orbits at once are refused', () => {
  const low = thinLayerDaily.evaluate({ ...base, latitudeDeg: 82, solarLongitudeDeg: 4, opticalDepth: 0.05 });
  expect(low.cautions.map((caution) => caution.code)).toContain('thin-layer-slant-beyond-range');
  const old = thinLayerDaily.evaluate({ ...base, ageKaBp: 1500 });
  expect(old.cautions.map((caution) => caution.code)).toContain('berger1978-beyond-range');
  expect(() => thinLayerDaily.evaluate({ ...base, orbit })).toThrow(
    /ageKaBp is 21; it must be left out when orbit is given/,
  );
});
