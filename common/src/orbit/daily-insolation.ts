import { RADIANS } from '../physical/constants';
import { requireWithin } from '../physical/domain-error';
import { checkOrbit, type Orbit } from './orbit';

export interface DailyInsolation {
  /** mean over 24 h at the top of the atmosphere [W m⁻²] */
  dailyMeanWm2: number;
  dayLengthHours: number;
  /** lit part of the day [0 to 1] */
  litFraction: number;
  /** mean of μ₀ over the lit hours; 0 in polar night */
  meanCosZenithDaylight: number;
  /** mean of μ₀ weighted by insolation, the one sun angle a formula with a single angle needs; 0 in polar night */
  insolationWeightedCosZenith: number;
  /** Earth–Sun distance over the semi-major axis */
  sunDistanceAu: number;
  declinationDeg: number;
}

/** The sun's daily course at one latitude: μ₀ = a + b cos H for hour angles |H| < H₀. */
export interface SunCourse {
  /** sin φ sin δ */
  a: number;
  /** cos φ cos δ, not negative */
  b: number;
  /** half-day angle [rad], 0 in polar night, π in polar day */
  h0: number;
  sunDistanceAu: number;
  declinationDeg: number;
}

/**
 * Course of the sun over one day.
 *
 *   r/a = (1 − e²) / (1 + e cos(λ − ϖ − 180°)),  sin δ = sin ε sin λ,
 *   cos H₀ = −tan φ tan δ, −1 or less in polar day, 1 or more in polar night
 *
 * @param latitudeDeg φ [°], −90 to 90
 * @param solarLongitudeDeg λ [°], true longitude of the Sun, −360 to 720, 0 at the March equinox
 * @throws DomainError when a value leaves its range
 *
 * At a pole cos φ is taken as 0 exactly, and δ = 0 there as night. Limits: λ stands still for the day.
 * Source: Berger (1978), J. Atmos. Sci. 35, 2362–2367.
 */
export function sunCourse(latitudeDeg: number, solarLongitudeDeg: number, orbit: Orbit): SunCourse {
  requireWithin('latitudeDeg', latitudeDeg, '°', -90, 90);
  requireWithin('solarLongitudeDeg', solarLongitudeDeg, '°', -360, 720);
  const { eccentricity: e, obliquityDeg, perihelionLongitudeDeg } = checkOrbit(orbit);
  const lambda = solarLongitudeDeg * RADIANS;
  const trueAnomaly = lambda - perihelionLongitudeDeg * RADIANS - Math.PI;
  const sunDistanceAu = (1 - e * e) / (1 + e * Math.cos(trueAnomaly));
  const sineOfLongitude = solarLongitudeDeg % 180 === 0 ? 0 : Math.sin(lambda);
  const sinDelta = Math.sin(obliquityDeg * RADIANS) * sineOfLongitude;
  const phi = latitudeDeg * RADIANS;
  const a = Math.sin(phi) * sinDelta;
  const b = Math.abs(latitudeDeg) === 90 ? 0 : Math.cos(phi) * Math.sqrt(1 - sinDelta * sinDelta);
  return { a, b, h0: halfDay(a, b), sunDistanceAu, declinationDeg: Math.asin(sinDelta) / RADIANS };
}

function halfDay(a: number, b: number): number {
  if (a >= b) return a > 0 ? Math.PI : 0;
  return a <= -b ? 0 : Math.acos(-a / b);
}

/**
 * Daily insolation on a horizontal plane at the top of the atmosphere, with day length and mean sun angles.
 *
 *   Q = S₀/π · (a/r)² · (H₀ sin φ sin δ + cos φ cos δ sin H₀)
 *
 * @param latitudeDeg φ [°], −90 to 90, north positive
 * @param solarLongitudeDeg λ [°], 0 at the March equinox, 90 at the June solstice
 * @param solarConstantWm2 S₀ at the semi-major axis [W m⁻²], 0 to 10 000
 * @throws DomainError when a value leaves its range
 *
 * Limits: λ and δ stand still for the day (they move by about 1° and at most 0.4°); no refraction, no width of the
 * solar disc: do not use it for twilight.
 * Source: Berger (1978). Checked against: checks/orbit/daily_insolation.csv to 1e-9 relative,
 * published_insolation_berger_loutre1991.csv to 0.015 W m⁻².
 */
export function dailyInsolation(
  latitudeDeg: number,
  solarLongitudeDeg: number,
  orbit: Orbit,
  solarConstantWm2: number,
): DailyInsolation {
  requireWithin('solarConstantWm2', solarConstantWm2, 'W m⁻²', 0, 10_000);
  const { a, b, h0, sunDistanceAu, declinationDeg } = sunCourse(latitudeDeg, solarLongitudeDeg, orbit);
  const daySum = h0 === 0 ? 0 : a * h0 + b * Math.sin(h0);
  const squares = a * a * h0 + 2 * a * b * Math.sin(h0) + b * b * (h0 / 2 + Math.sin(2 * h0) / 4);
  return {
    dailyMeanWm2: (solarConstantWm2 / Math.PI) * (daySum / (sunDistanceAu * sunDistanceAu)),
    dayLengthHours: (24 * h0) / Math.PI,
    litFraction: h0 / Math.PI,
    meanCosZenithDaylight: daySum > 0 ? daySum / h0 : 0,
    insolationWeightedCosZenith: daySum > 0 ? squares / daySum : 0,
    sunDistanceAu,
    declinationDeg,
  };
}

/**
 * Daily mean insolation at many latitudes and one solar longitude, into an array of the caller's [W m⁻²].
 * The same numbers as `dailyInsolation`.
 */
export function dailyMeanInsolationInto(
  out: Float64Array,
  latitudesDeg: Float64Array,
  solarLongitudeDeg: number,
  orbit: Orbit,
  solarConstantWm2: number,
): Float64Array {
  for (let i = 0; i < latitudesDeg.length; i += 1) {
    out[i] = dailyInsolation(latitudesDeg[i]!, solarLongitudeDeg, orbit, solarConstantWm2).dailyMeanWm2;
  }
  return out;
}
