import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable, numberIn } from '../../test/check-table';
import {
  arcShareOfYear,
  calendarMonthStarts,
  dayOfSolarLongitude,
  fixedAngularMonths,
  solarLongitudeOfDay,
} from './calendar';
import { bergerOrbit, protocolOrbit } from './elements';
import type { Orbit } from './orbit';

const turn = (a: number, b: number, circle = 360) => Math.abs(((a - b + 1.5 * circle) % circle) - circle / 2);
/** The calendar does not depend on obliquity; the tables leave it out. */
const orbitOf = (row: Record<string, string>): Orbit => ({
  eccentricity: numberIn(row, 'eccentricity'),
  obliquityDeg: 23.4,
  perihelionLongitudeDeg: numberIn(row, 'longitude_of_perihelion_deg'),
});
const present: Orbit = { eccentricity: 0.016724, obliquityDeg: 23.446, perihelionLongitudeDeg: 102.04 };

// Kepler's equation solved to 1e-15 by an independent program; 12 printed digits.
test('days become true longitudes as in an independent solution of Kepler’s equation', () => {
  for (const row of checkTable('orbit/day_to_true_longitude.csv')) {
    const longitude = solarLongitudeOfDay(numberIn(row, 'days_since_1_january_0h'), orbitOf(row));
    const label = `${row.orbit} day ${row.days_since_1_january_0h}`;
    expect(turn(longitude, numberIn(row, 'true_solar_longitude_deg')), label).toBeLessThan(1e-8);
  }
});

test('true longitudes become days as in an independent solution of Kepler’s equation', () => {
  for (const row of checkTable('orbit/true_longitude_to_day.csv')) {
    const day = dayOfSolarLongitude(numberIn(row, 'true_solar_longitude_deg'), orbitOf(row));
    const label = `${row.orbit} λ ${row.true_solar_longitude_deg}`;
    expect(turn(day, numberIn(row, 'days_since_1_january_0h'), 365), label).toBeLessThan(1e-8);
  }
});

test('the four seasons have independently computed lengths', () => {
  for (const row of checkTable('orbit/season_lengths.csv')) {
    (['spring_0_90', 'summer_90_180', 'autumn_180_270', 'winter_270_360'] as const).forEach((season, i) => {
      const days = arcShareOfYear(90 * i, 90 * (i + 1), orbitOf(row)) * 365.2422;
      expect(Math.abs(days - numberIn(row, `${season}_days`)), `${row.orbit} ${season}`).toBeLessThan(1e-7);
    });
  }
});

// 0.12 d: the published lengths come from an approximate calendar (largest distance from an exact one 0.11 d).
test('months bounded by the present longitudes have the lengths of Bartlein & Shafer 2019', () => {
  const starts = calendarMonthStarts(bergerOrbit(0).orbit);
  for (const row of checkTable('orbit/published_month_lengths_bartlein_shafer2019.csv')) {
    const month = numberIn(row, 'month') - 1;
    const { orbit } = bergerOrbit(numberIn(row, 'age_ka_before_1950'));
    const days = arcShareOfYear(starts[month]!, starts[(month + 1) % 12]!, orbit) * 365;
    const label = `${row.age_ka_before_1950} ka, month ${row.month}`;
    expect(Math.abs(days - numberIn(row, 'published_month_length_days')), label).toBeLessThan(0.12);
    expect(Math.abs(days - numberIn(row, 'recomputed_month_length_days')), label).toBeLessThan(1e-4);
  }
});

test('the equinox date trap: day 79.5 is longitude zero, and one day off is one degree off', () => {
  expect(turn(solarLongitudeOfDay(79.5, present), 0)).toBeLessThan(1e-10);
  expect(solarLongitudeOfDay(80.5, present)).toBeGreaterThan(0.97);
  expect(dayOfSolarLongitude(0, present)).toBeCloseTo(79.5, 10);
});

test('the 180° trap: perihelion is passed in early January today and near midsummer 11 ka ago', () => {
  const passage = (orbit: Orbit) => dayOfSolarLongitude(orbit.perihelionLongitudeDeg + 180, orbit);
  expect(passage(present)).toBeGreaterThan(0);
  expect(passage(present)).toBeLessThan(5);
  expect(Math.abs(passage(bergerOrbit(11).orbit) - 172)).toBeLessThan(15);
});

test('angular months fill the circle and the year, and stay close to the present calendar', () => {
  const months = fixedAngularMonths(present);
  expect(months).toHaveLength(12);
  expect(months.reduce((sum, month) => sum + month.days, 0)).toBeCloseTo(365.25, 9);
  const lengths = [31, 28.25, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
  months.forEach((month, i) => {
    expect(month.startLongitudeDeg).toBe((280 + 30 * i) % 360);
    expect(Math.abs(month.days - lengths[i]!), `month ${i + 1}`).toBeLessThan(2);
  });
  const starts = calendarMonthStarts(present);
  months.forEach((month, i) =>
    expect(turn(month.startLongitudeDeg, starts[i]!), `month ${i + 1}`).toBeLessThan(3),
  );
  const warmSeason = fixedAngularMonths(protocolOrbit('last interglacial (PMIP4 lig127k)')!);
  expect(warmSeason[6]!.days, 'perihelion in summer makes July short').toBeLessThan(30);
});

test('day and longitude are each other’s inverse for any orbit', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0, max: 0.6, noNaN: true }),
      fc.double({ min: 0, max: 360, noNaN: true }),
      fc.double({ min: 0, max: 364.999, noNaN: true }),
      (eccentricity, perihelionLongitudeDeg, day) => {
        const orbit = { eccentricity, obliquityDeg: 23, perihelionLongitudeDeg };
        const back = dayOfSolarLongitude(solarLongitudeOfDay(day, orbit), orbit);
        expect(turn(back, day, 365)).toBeLessThan(1e-8);
      },
    ),
  );
});

test('an arc and its complement make one year', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0, max: 0.3, noNaN: true }),
      fc.double({ min: 0, max: 360, noNaN: true }),
      fc.double({ min: 0, max: 360, noNaN: true }),
      (eccentricity, start, end) => {
        const arc = Math.abs(start - end);
        fc.pre(arc > 1e-6 && arc < 360 - 1e-6);
        const orbit = { eccentricity, obliquityDeg: 23, perihelionLongitudeDeg: 77 };
        const both = arcShareOfYear(start, end, orbit) + arcShareOfYear(end, start, orbit);
        expect(both).toBeCloseTo(1, 10);
      },
    ),
  );
  expect(arcShareOfYear(0, 360, present)).toBe(1);
  expect(arcShareOfYear(10, 10, present)).toBe(0);
});
