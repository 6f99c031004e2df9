import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable, numberIn, relativeError } from '../../test/check-table';
import { gaussLegendre } from '../optics/gauss-legendre';
import { arcShareOfYear, calendarMonthStarts, MONTH_DAYS, solarLongitudeOfDay } from './calendar';
import { dailyInsolation } from './daily-insolation';
import { annualMeanInsolation, arcMeanInsolation, globalAnnualMeanInsolation } from './mean-insolation';
import type { Orbit } from './orbit';

const orbitOf = (row: Record<string, string>): Orbit => ({
  eccentricity: numberIn(row, 'eccentricity'),
  obliquityDeg: numberIn(row, 'obliquity_deg'),
  perihelionLongitudeDeg: numberIn(row, 'longitude_of_perihelion_deg'),
});
const present: Orbit = { eccentricity: 0.016724, obliquityDeg: 23.446, perihelionLongitudeDeg: 102.04 };

const monthMean = (latitude: number, starts: number[], month: number, orbit: Orbit) => {
  const start = starts[month]!;
  const end = starts[(month + 1) % 12]!;
  return arcMeanInsolation(latitude, start, end > start ? end : end + 360, orbit, 1361);
};

const noonMean = (latitude: number, month: number, orbit: Orbit, solarConstant: number) => {
  const first = MONTH_DAYS.slice(0, month).reduce((sum, days) => sum + days, 0);
  const days = MONTH_DAYS[month]!;
  let sum = 0;
  for (let day = 0; day < days; day += 1) {
    const longitude = solarLongitudeOfDay(first + day + 0.5, orbit);
    sum += dailyInsolation(latitude, longitude, orbit, solarConstant).dailyMeanWm2;
  }
  return sum / days;
};

// 1e-9 relative; beside a polar limit the independent quadrature itself is good to about 1e-7 W m⁻².
test('monthly means of both calendars equal independent quadrature, and the calendar effect with them', () => {
  const bounds = calendarMonthStarts(present);
  for (const row of checkTable('orbit/monthly_insolation.csv')) {
    const orbit = orbitOf(row);
    const latitude = numberIn(row, 'latitude_deg');
    const month = numberIn(row, 'month') - 1;
    const label = `${row.orbit} ${latitude}° month ${row.month}`;
    const close = (value: number, column: string, absolute = 1e-7) => {
      const wanted = numberIn(row, column);
      expect(Math.abs(value - wanted), `${label} ${column}`).toBeLessThan(1e-9 * wanted + absolute);
    };
    close(
      monthMean(latitude, calendarMonthStarts(orbit), month, orbit),
      'fixed_day_continuous_mean_W_m2_S0_1361',
    );
    close(monthMean(latitude, bounds, month, orbit), 'fixed_angular_mean_W_m2_S0_1361');
    close(noonMean(latitude, month, orbit, 1361), 'fixed_day_noon_sample_mean_W_m2_S0_1361');
    const days = arcShareOfYear(bounds[month]!, bounds[(month + 1) % 12]!, orbit) * 365;
    close(days, 'fixed_angular_month_length_days');
  }
});

// 0.01 W m⁻²: the table prints two decimals.
test('the plain mean of noon values reproduces the monthly table of PMIP1', () => {
  for (const row of checkTable('orbit/published_monthly_insolation_pmip1.csv')) {
    const mean = noonMean(numberIn(row, 'latitude_deg'), numberIn(row, 'month') - 1, present, 1365);
    const published = numberIn(row, 'published_insolation_W_m2_S0_1365');
    expect(Math.abs(mean - published), `${row.latitude_deg}° month ${row.month}`).toBeLessThan(0.01);
  }
});

test('annual means equal independent quadrature, by latitude and for the globe', () => {
  for (const row of checkTable('orbit/annual_insolation.csv')) {
    const orbit = orbitOf(row);
    const value =
      row.latitude_deg === 'global'
        ? globalAnnualMeanInsolation(orbit, 1361)
        : annualMeanInsolation(numberIn(row, 'latitude_deg'), orbit, 1361);
    const wanted = numberIn(row, 'annual_mean_insolation_W_m2_S0_1361');
    expect(relativeError(value, wanted), `${row.orbit} ${row.latitude_deg}`).toBeLessThan(1e-9);
  }
});

test('annual means averaged over the sphere are S₀/(4√(1−e²)) to 1e-9', () => {
  const rule = gaussLegendre(80);
  fc.assert(
    fc.property(
      fc.double({ min: 0, max: 0.07, noNaN: true }),
      fc.double({ min: 20, max: 26, noNaN: true }),
      fc.double({ min: 0, max: 360, noNaN: true }),
      (eccentricity, obliquityDeg, perihelionLongitudeDeg) => {
        const orbit = { eccentricity, obliquityDeg, perihelionLongitudeDeg };
        const circle = 90 - obliquityDeg;
        let mean = 0;
        for (const [south, north] of [
          [0, circle],
          [circle, 90],
        ] as const) {
          rule.nodes.forEach((node, i) => {
            const theta = (Math.PI / 2) * (1 + node);
            const latitude = (south + north) / 2 - ((north - south) / 2) * Math.cos(theta);
            const width = (((north - south) / 2) * Math.PI) / 180;
            const weight = rule.weights[i]! * (Math.PI / 2) * width * Math.sin(theta);
            mean +=
              weight * Math.cos((latitude * Math.PI) / 180) * annualMeanInsolation(latitude, orbit, 1361);
          });
        }
        // Both hemispheres receive the same in a year.
        expect(relativeError(mean, globalAnnualMeanInsolation(orbit, 1361))).toBeLessThan(1e-9);
      },
    ),
    { numRuns: 5 },
  );
});

test('the annual mean does not depend on the perihelion and is the same in both hemispheres', () => {
  const turned = { ...present, perihelionLongitudeDeg: 250 };
  for (const latitude of [0, 30, 65, 80, 90]) {
    const mean = annualMeanInsolation(latitude, present, 1361);
    expect(relativeError(annualMeanInsolation(latitude, turned, 1361), mean)).toBeLessThan(1e-11);
    expect(relativeError(annualMeanInsolation(-latitude, present, 1361), mean)).toBeLessThan(1e-9);
  }
});
