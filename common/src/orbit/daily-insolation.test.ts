import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable, numberIn, relativeError } from '../../test/check-table';
import { gaussLegendre } from '../optics/gauss-legendre';
import { dailyInsolation, dailyMeanInsolationInto } from './daily-insolation';
import { bergerOrbit } from './elements';
import type { Orbit } from './orbit';

const orbitOf = (row: Record<string, string>): Orbit => ({
  eccentricity: numberIn(row, 'eccentricity'),
  obliquityDeg: numberIn(row, 'obliquity_deg'),
  perihelionLongitudeDeg: numberIn(row, 'longitude_of_perihelion_deg'),
});
const anyOrbit = fc.record({
  eccentricity: fc.double({ min: 0, max: 0.07, noNaN: true }),
  obliquityDeg: fc.double({ min: 20, max: 26, noNaN: true }),
  perihelionLongitudeDeg: fc.double({ min: 0, max: 360, noNaN: true }),
});

// Independent closed form, 12 printed digits. On the limit of polar day itself only Q is comparable (1e-6 absolute).
test('daily insolation, day length and mean sun angles equal independent values to 1e-9', () => {
  for (const row of checkTable('orbit/daily_insolation.csv')) {
    const label = `${row.orbit} ${row.latitude_deg}° λ ${row.true_solar_longitude_deg}°`;
    const day = dailyInsolation(
      numberIn(row, 'latitude_deg'),
      numberIn(row, 'true_solar_longitude_deg'),
      orbitOf(row),
      1361,
    );
    const wanted = numberIn(row, 'insolation_W_m2_S0_1361');
    if (row.regime === 'day_night_boundary' || row.regime === 'pole_at_equinox') {
      expect(Math.abs(day.dailyMeanWm2 - wanted), label).toBeLessThan(1e-6);
      continue;
    }
    expect(relativeError(day.dailyMeanWm2, wanted, 1e-3), label).toBeLessThan(1e-9);
    expect(relativeError(day.dayLengthHours, numberIn(row, 'day_length_h')), label).toBeLessThan(1e-9);
    expect(relativeError(day.litFraction * Math.PI, numberIn(row, 'half_day_angle_rad')), label).toBeLessThan(
      1e-9,
    );
    expect(
      relativeError(day.meanCosZenithDaylight, numberIn(row, 'mean_cos_zenith_daylight')),
      label,
    ).toBeLessThan(1e-9);
    expect(
      relativeError(day.insolationWeightedCosZenith, numberIn(row, 'mean_cos_zenith_insolation_weighted')),
      label,
    ).toBeLessThan(1e-9);
    expect(
      relativeError(day.litFraction * day.meanCosZenithDaylight, numberIn(row, 'mean_cos_zenith_24h')),
      label,
    ).toBeLessThan(1e-9);
    expect(
      relativeError(day.sunDistanceAu, numberIn(row, 'sun_distance_over_semimajor_axis')),
      label,
    ).toBeLessThan(1e-9);
    expect(Math.abs(day.declinationDeg - numberIn(row, 'declination_deg')), label).toBeLessThan(1e-8);
  }
});

// 0.015 W m⁻²: half the last printed digit plus what the rounded printed elements can move Q.
test('daily insolation reproduces the table of Berger & Loutre 1991', () => {
  for (const row of checkTable('orbit/published_insolation_berger_loutre1991.csv')) {
    const day = dailyInsolation(
      numberIn(row, 'latitude_deg'),
      numberIn(row, 'true_solar_longitude_deg'),
      orbitOf(row),
      1360,
    );
    const published = numberIn(row, 'published_insolation_W_m2_S0_1360');
    expect(
      Math.abs(day.dailyMeanWm2 - published),
      `${row.age_ka_before_1950} ka ${row.latitude_deg}°`,
    ).toBeLessThan(0.015);
  }
});

test('insolation of time slices follows from the series of 1978 at three solar constants', () => {
  for (const row of checkTable('orbit/insolation_time_slices.csv')) {
    const { orbit } = bergerOrbit(numberIn(row, 'age_ka_before_1950'));
    for (const constant of [1360, 1361, 1365]) {
      const { dailyMeanWm2 } = dailyInsolation(
        numberIn(row, 'latitude_deg'),
        numberIn(row, 'true_solar_longitude_deg'),
        orbit,
        constant,
      );
      const wanted = numberIn(row, `q_b78_W_m2_S0_${constant}`);
      // 1e-9 relative; next to polar night Q is a small difference, so 1e-7 W m⁻² beside it.
      expect(Math.abs(dailyMeanWm2 - wanted), JSON.stringify(row)).toBeLessThan(1e-9 * wanted + 1e-7);
    }
  }
});

// Berger's program of 1978, printed sample: 65° N, 10 ka, λ 90°, S₀ 1353: 45147 kJ m⁻² d⁻¹ and 21.97 h.
test('the printed sample of the program of 1978 comes out to its last digit', () => {
  const day = dailyInsolation(65, 90, bergerOrbit(10).orbit, 1353);
  expect(Math.round(day.dailyMeanWm2 * 86.4)).toBe(45147);
  expect(day.dayLengthHours).toBeCloseTo(21.97, 2);
});

test('at one time of the year insolation averages over the sphere to S₀/(4 r²)', () => {
  const rule = gaussLegendre(60);
  fc.assert(
    fc.property(anyOrbit, fc.double({ min: 0, max: 360, noNaN: true }), (orbit, longitude) => {
      const { declinationDeg, sunDistanceAu } = dailyInsolation(0, longitude, orbit, 1361);
      const limit = Math.sin(((90 - Math.abs(declinationDeg)) * Math.PI) / 180);
      let mean = 0;
      for (const [from, to] of [
        [-1, -limit],
        [-limit, limit],
        [limit, 1],
      ] as const) {
        rule.nodes.forEach((node, i) => {
          // sin φ on a cosine path: smooth where polar day begins.
          const theta = (Math.PI / 2) * (1 + node);
          const sine = (from + to) / 2 - ((to - from) / 2) * Math.cos(theta);
          const latitude = (Math.asin(Math.min(1, Math.max(-1, sine))) * 180) / Math.PI;
          const q = dailyInsolation(latitude, longitude, orbit, 1361).dailyMeanWm2;
          mean += (rule.weights[i]! * Math.PI * (to - from) * Math.sin(theta) * q) / 8;
        });
      }
      expect(relativeError(mean, 1361 / (4 * sunDistanceAu ** 2))).toBeLessThan(1e-7);
    }),
    { numRuns: 60 },
  );
});

test('insolation is never negative, and the weighted sun angle is at least the daylight mean', () => {
  fc.assert(
    fc.property(
      anyOrbit,
      fc.double({ min: -90, max: 90, noNaN: true }),
      fc.double({ min: 0, max: 360, noNaN: true }),
      (orbit, latitude, longitude) => {
        const day = dailyInsolation(latitude, longitude, orbit, 1361);
        expect(day.dailyMeanWm2).toBeGreaterThanOrEqual(0);
        expect(day.litFraction).toBeGreaterThanOrEqual(0);
        expect(day.litFraction).toBeLessThanOrEqual(1);
        expect(day.insolationWeightedCosZenith).toBeGreaterThanOrEqual(day.meanCosZenithDaylight - 1e-9);
        const fromMean = (1361 / day.sunDistanceAu ** 2) * day.litFraction * day.meanCosZenithDaylight;
        expect(Math.abs(fromMean - day.dailyMeanWm2)).toBeLessThan(1e-9);
      },
    ),
  );
});

test('the form for many latitudes gives the numbers of the scalar form', () => {
  const latitudes = Float64Array.from({ length: 19 }, (_, i) => -90 + 10 * i);
  const { orbit } = bergerOrbit(21);
  const out = dailyMeanInsolationInto(new Float64Array(19), latitudes, 100, orbit, 1361);
  expect([...out]).toEqual(
    [...latitudes].map((latitude) => dailyInsolation(latitude, 100, orbit, 1361).dailyMeanWm2),
  );
});

test('a latitude beyond the pole and an impossible orbit are refused by name', () => {
  const { orbit } = bergerOrbit(0);
  expect(() => dailyInsolation(91, 0, orbit, 1361)).toThrow(
    /latitudeDeg is 91 °; it must lie within -90 to 90/,
  );
  expect(() => dailyInsolation(0, 0, { ...orbit, eccentricity: 1 }, 1361)).toThrow(/eccentricity/);
});
