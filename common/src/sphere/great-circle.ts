import { EARTH_RADIUS_M, RADIANS } from '../physical/constants';
import { requireWithin } from '../physical/domain-error';
import type { LonLat } from './polygon-area';

/**
 * Shortest distance along the sphere [km] between two points.
 *
 * By the arctangent of sine and cosine of the angle, which keeps its digits for near and for opposite points.
 * @throws DomainError for a latitude outside ±90°
 * Checked against: reference/checks/general/great_circle_distances.csv.
 */
export function greatCircleKm([lon1, lat1]: LonLat, [lon2, lat2]: LonLat, radiusM = EARTH_RADIUS_M): number {
  requireWithin('latitude', lat1, '°', -90, 90);
  requireWithin('latitude', lat2, '°', -90, 90);
  requireWithin('longitude', lon1, '°', -720, 720);
  requireWithin('longitude', lon2, '°', -720, 720);
  const a = lat1 * RADIANS;
  const b = lat2 * RADIANS;
  const turn = (lon2 - lon1) * RADIANS;
  const across = Math.cos(b) * Math.sin(turn);
  const along = Math.cos(a) * Math.sin(b) - Math.sin(a) * Math.cos(b) * Math.cos(turn);
  const cosine = Math.sin(a) * Math.sin(b) + Math.cos(a) * Math.cos(b) * Math.cos(turn);
  return Math.atan2(Math.hypot(across, along), cosine) * (radiusM / 1000);
}
