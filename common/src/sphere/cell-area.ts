import { EARTH_RADIUS_M, RADIANS } from '../physical/constants';
import { requireWithin } from '../physical/domain-error';

export interface LonLatBox {
  westDeg: number;
  /** east of west, so a box over the antimeridian ends beyond 180 */
  eastDeg: number;
  southDeg: number;
  northDeg: number;
}

/**
 * Share of the sphere [1] inside a box of longitudes and latitudes: Δλ (sin φ_N − sin φ_S)/4π, exact.
 *
 * @throws DomainError when north is not above south, or the box is wider than the whole circle
 * Checked against: reference/checks/general/cell_and_band_areas.csv.
 */
export function cellAreaFraction({ westDeg, eastDeg, southDeg, northDeg }: LonLatBox): number {
  requireWithin('southDeg', southDeg, '°', -90, 90);
  requireWithin('northDeg', northDeg, '°', southDeg, 90);
  requireWithin('westDeg', westDeg, '°', -360, 360);
  requireWithin('eastDeg', eastDeg, '°', westDeg, westDeg + 360);
  return ((eastDeg - westDeg) / 360) * sineDifference(southDeg, northDeg);
}

/** Area of the same box [km²] on a sphere, by default of the Earth's surface area (authalic). */
export function cellAreaKm2(box: LonLatBox, radiusM = EARTH_RADIUS_M): number {
  requireWithin('radiusM', radiusM, 'm', 1, 1e12);
  return cellAreaFraction(box) * 4 * Math.PI * (radiusM / 1000) ** 2;
}

/** (sin φ_N − sin φ_S)/2 as a product, which keeps its digits for thin bands near the poles. */
function sineDifference(southDeg: number, northDeg: number): number {
  const middle = ((southDeg + northDeg) / 2) * RADIANS;
  return Math.cos(middle) * Math.sin(((northDeg - southDeg) / 2) * RADIANS);
}
