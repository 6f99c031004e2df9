import { readNumber, refuseUnused } from '../physical/check-fields';
import { requireWithin } from '../physical/domain-error';

/** The Earth's orbit as insolation sees it. */
export interface Orbit {
  /** e [1], 0 to 0.9 */
  eccentricity: number;
  /** ε [°], 0 to 90 */
  obliquityDeg: number;
  /**
   * ϖ [°], 0 to 360, from the moving vernal equinox to the perihelion: about 102 in 1950 CE. Tables that print about
   * 282 give the Sun's longitude at perihelion, ϖ + 180.
   */
  perihelionLongitudeDeg: number;
}

const FIELDS = [
  { field: 'eccentricity', unit: '', min: 0, max: 0.9 },
  { field: 'obliquityDeg', unit: '°', min: 0, max: 90 },
  { field: 'perihelionLongitudeDeg', unit: '°', min: 0, max: 360 },
] as const;

/** An orbit from outside: every element present and in range, nothing else. @throws DomainError */
export function readOrbit(given: object): Orbit {
  refuseUnused(
    given,
    FIELDS.map(({ field }) => field),
    'orbit.',
  );
  const [eccentricity, obliquityDeg, perihelionLongitudeDeg] = FIELDS.map((spec) =>
    readNumber(given, spec, 'orbit.'),
  );
  return {
    eccentricity: eccentricity!,
    obliquityDeg: obliquityDeg!,
    perihelionLongitudeDeg: perihelionLongitudeDeg!,
  };
}

/** @throws DomainError when an element leaves its range */
export function checkOrbit(orbit: Orbit): Orbit {
  for (const { field, unit, min, max } of FIELDS) requireWithin(field, orbit[field], unit, min, max);
  return orbit;
}

/** An angle brought to 0 ≤ a < 360. */
export function wrapDegrees(angleDeg: number): number {
  const wrapped = angleDeg % 360;
  return wrapped < 0 ? (wrapped + 360) % 360 : wrapped;
}
