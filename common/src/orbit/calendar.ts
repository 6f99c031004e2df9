import { DAYS_PER_YEAR, RADIANS } from '../physical/constants';
import { requireWithin } from '../physical/domain-error';
import { checkOrbit, wrapDegrees, type Orbit } from './orbit';

/** Days of the calendar year that day numbers count in. */
export const CALENDAR_DAYS = 365;
/** March equinox: days since 1 January 00:00, that is 21 March 12:00 (the convention of PMIP). */
export const EQUINOX_DAY = 79.5;
/** Days of the months of a year of 365 days. */
export const MONTH_DAYS: readonly number[] = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];

/**
 * First longitude of the January arc [°]. 1 January is at 279.6° in 1950 CE, so arcs of 30° from 280° differ from the
 * present calendar months by less than two days in length and 3° in their beginning. Own choice.
 */
const JANUARY_START_DEG = 280;

/**
 * True solar longitude at a time of the year, by Kepler's equation.
 *
 *   M = E − e sin E,  tan(ν/2) = √((1+e)/(1−e)) tan(E/2),  λ = ν + ϖ + 180°
 *
 * @param dayOfYear days since 1 January 00:00, 0 to 365, in a year of 365 days with the March equinox at 79.5.
 * The same instant is "80.5" where 1 January 00:00 is called day 1.0, and "day 80" where a day is sampled at noon:
 * a slip of one day moves monthly insolation by up to 8.8 W m⁻².
 * @returns λ [°], 0 to 360
 *
 * Source: Berger (1978); checks/orbit/FORMULAS.md §3. Checked against: checks/orbit/day_to_true_longitude.csv.
 */
export function solarLongitudeOfDay(dayOfYear: number, orbit: Orbit): number {
  requireWithin('dayOfYear', dayOfYear, 'd', 0, CALENDAR_DAYS);
  checkOrbit(orbit);
  const e = orbit.eccentricity;
  const atEquinox = meanAnomalyDeg(0, orbit);
  const mean = wrapDegrees(atEquinox + (360 * (dayOfYear - EQUINOX_DAY)) / CALENDAR_DAYS);
  const eccentric = solveKepler(mean * RADIANS, e);
  const anomaly =
    2 * Math.atan2(Math.sqrt(1 + e) * Math.sin(eccentric / 2), Math.sqrt(1 - e) * Math.cos(eccentric / 2));
  return wrapDegrees(anomaly / RADIANS + orbit.perihelionLongitudeDeg + 180);
}

/**
 * Time of the year at which the Sun has a true longitude: the inverse of `solarLongitudeOfDay`.
 *
 * @param solarLongitudeDeg λ [°], −360 to 720
 * @returns days since 1 January 00:00, 0 to 365
 *
 * Checked against: checks/orbit/true_longitude_to_day.csv.
 */
export function dayOfSolarLongitude(solarLongitudeDeg: number, orbit: Orbit): number {
  const day = EQUINOX_DAY + arcShareOfYear(0, wrapDegrees(solarLongitudeDeg), orbit) * CALENDAR_DAYS;
  return day >= CALENDAR_DAYS ? day - CALENDAR_DAYS : day;
}

/**
 * Part of the year that the Sun takes from one true longitude to another (Kepler's second law, closed form).
 *
 * @param startDeg, endDeg λ [°]; the way is taken forwards, a full circle when both are equal modulo 360 but differ
 */
export function arcShareOfYear(startDeg: number, endDeg: number, orbit: Orbit): number {
  requireWithin('solarLongitudeDeg', startDeg, '°', -360, 720);
  requireWithin('solarLongitudeDeg', endDeg, '°', -360, 720);
  checkOrbit(orbit);
  const share = wrapDegrees(meanAnomalyDeg(endDeg, orbit) - meanAnomalyDeg(startDeg, orbit)) / 360;
  // A hair below zero wraps to nearly one; the arc itself tells the two apart.
  const arc = wrapDegrees(endDeg - startDeg);
  if (arc === 0) return endDeg === startDeg ? 0 : 1;
  return arc < 1 && share > 0.5 ? share - 1 : share;
}

export interface AngularMonth {
  startLongitudeDeg: number;
  endLongitudeDeg: number;
  midLongitudeDeg: number;
  /** true length, of a year of 365.25 days */
  days: number;
}

/**
 * Twelve months as fixed arcs of 30° of solar longitude, January first (280° to 310°). Their lengths follow the
 * orbit, so that a month stands for the same seasons in every slice (the calendar effect of Joussaume & Braconnot
 * 1997, J. Geophys. Res. 102, 1943–1956: up to 35 W m⁻² at 6 ka and 92 W m⁻² at 127 ka).
 */
export function fixedAngularMonths(orbit: Orbit): AngularMonth[] {
  return MONTH_DAYS.map((_, month) => {
    const start = wrapDegrees(JANUARY_START_DEG + 30 * month);
    return {
      startLongitudeDeg: start,
      endLongitudeDeg: start + 30,
      midLongitudeDeg: start + 15,
      days: arcShareOfYear(start, start + 30, orbit) * DAYS_PER_YEAR,
    };
  });
}

/**
 * True longitudes at the beginning of the twelve calendar months, for an orbit, with the equinox at noon of 21 March.
 * With the present orbit they bound the fixed-angular months of Joussaume & Braconnot (1997); with a slice's own
 * orbit they are its fixed-day months.
 */
export function calendarMonthStarts(orbit: Orbit): number[] {
  let day = 0;
  return MONTH_DAYS.map((days) => {
    const longitude = solarLongitudeOfDay(day, orbit);
    day += days;
    return longitude;
  });
}

/** Mean anomaly [°] at a true longitude, not wrapped within a turn. */
function meanAnomalyDeg(solarLongitudeDeg: number, orbit: Orbit): number {
  const e = orbit.eccentricity;
  const half = (wrapDegrees(solarLongitudeDeg - orbit.perihelionLongitudeDeg - 180) * RADIANS) / 2;
  const eccentric = 2 * Math.atan2(Math.sqrt(1 - e) * Math.sin(half), Math.sqrt(1 + e) * Math.cos(half));
  return (eccentric - e * Math.sin(eccentric)) / RADIANS;
}

/** Eccentric anomaly [rad] for a mean anomaly of 0 to 2π, to about 1e-15: Newton, safe up to e = 0.9. */
function solveKepler(mean: number, e: number): number {
  let eccentric = e < 0.8 ? mean + e * Math.sin(mean) : Math.PI;
  for (let step = 0; step < 50; step += 1) {
    const change = (eccentric - e * Math.sin(eccentric) - mean) / (1 - e * Math.cos(eccentric));
    eccentric -= change;
    if (Math.abs(change) < 1e-13) break;
  }
  return eccentric;
}
