import { readEither, readNumber, readObject, refuseUnused } from '../physical/check-fields';
import { SOLAR_CONSTANT_WM2 } from '../physical/constants';
import type { Caution } from '../physical/domain-error';
import { AGE_FIELD } from './calculate-orbit';
import { CALENDAR_DAYS, solarLongitudeOfDay } from './calendar';
import { dailyInsolation } from './daily-insolation';
import { bergerOrbit } from './elements';
import { readOrbit, type Orbit } from './orbit';

export interface InsolationRequest {
  /** this or `ageKaBp` */
  orbit?: Orbit;
  ageKaBp?: number;
  latitudeDeg: number;
  /** this or `dayOfYear` */
  solarLongitudeDeg?: number;
  /** days since 1 January 00:00 in a year of 365 days, March equinox at 79.5 */
  dayOfYear?: number;
  solarConstantWm2?: number;
}

export interface InsolationAnswer {
  dailyMeanWm2: number;
  dayLengthHours: number;
  meanCosZenithDaylight: number;
  insolationWeightedCosZenith: number;
  cautions: Caution[];
  method: { name: string; source: string };
}

const LATITUDE = { field: 'latitudeDeg', unit: '°', min: -90, max: 90 } as const;
const LONGITUDE = { field: 'solarLongitudeDeg', unit: '°', min: 0, max: 360 } as const;
const DAY = { field: 'dayOfYear', unit: 'd', min: 0, max: CALENDAR_DAYS } as const;
const SOLAR_CONSTANT = {
  field: 'solarConstantWm2',
  unit: 'W m⁻²',
  min: 0,
  max: 10_000,
  default: SOLAR_CONSTANT_WM2,
} as const;

/** Daily insolation at a latitude and a season. @throws DomainError naming the field at fault */
export function calculateInsolation(request: InsolationRequest): InsolationAnswer {
  refuseUnused(request, [
    'orbit',
    'ageKaBp',
    'latitudeDeg',
    'solarLongitudeDeg',
    'dayOfYear',
    'solarConstantWm2',
  ]);
  const { orbit, cautions } = readOrbitOrAge(request);
  const latitudeDeg = readNumber(request, LATITUDE);
  const solarLongitudeDeg =
    readEither(request, 'solarLongitudeDeg', 'dayOfYear') === 'dayOfYear'
      ? solarLongitudeOfDay(readNumber(request, DAY), orbit)
      : readNumber(request, LONGITUDE);
  const day = dailyInsolation(latitudeDeg, solarLongitudeDeg, orbit, readNumber(request, SOLAR_CONSTANT));
  return {
    dailyMeanWm2: day.dailyMeanWm2,
    dayLengthHours: day.dayLengthHours,
    meanCosZenithDaylight: day.meanCosZenithDaylight,
    insolationWeightedCosZenith: day.insolationWeightedCosZenith,
    cautions,
    method: { name: 'Daily insolation', source: 'Berger (1978), J. Atmos. Sci. 35, 2362–2367' },
  };
}

/** The orbit given, or the one of the age given; exactly one of the two. @throws DomainError */
export function readOrbitOrAge(given: object): { orbit: Orbit; cautions: Caution[] } {
  if (readEither(given, 'orbit', 'ageKaBp') === 'orbit') {
    return { orbit: readOrbit(readObject(given, 'orbit')), cautions: [] };
  }
  return bergerOrbit(readNumber(given, AGE_FIELD));
}
