import { EARTH_RADIUS_M, RADIANS } from '../physical/constants';
import { DomainError, requireWithin } from '../physical/domain-error';

/** Vertex [longitude, latitude] in degrees. */
export type LonLat = readonly [lon: number, lat: number];

/**
 * Area [sr] of a polygon whose edges are straight in longitude and latitude (not great circles):
 *
 *   |Σ Δλ m|,  m = (cos φ₁ − cos φ₂)/(φ₂ − φ₁), or sin φ where φ₁ = φ₂
 *
 * @param ring vertices, not closed, either direction. Longitudes are unwrapped along the ring (each step
 *   within ±180°); a ring around a pole is closed over that pole.
 * @throws DomainError with fewer than three vertices or a latitude outside ±90°
 *
 * Limits: the ring must not cross itself. A pole given as one vertex makes a triangle of the plane: give the
 * pole edge two vertices. The AR6 regions are defined with such edges.
 * Checked against: reference/checks/general/polygon_areas.csv and ar6_region_areas.csv.
 */
export function polygonAreaSr(ring: readonly LonLat[]): number {
  requireRing(ring);
  const { turnRad, sum } = edgeIntegral(ring, (from, to) => shortWay(to - from));
  if (Math.abs(turnRad) < 1) return Math.abs(sum);
  const northern = ring.reduce((total, [, lat]) => total + lat, 0) > 0;
  return Math.abs(northern ? turnRad - sum : turnRad + sum);
}

/**
 * The same for a ring that lies in the plane of longitude and latitude as written, edges of more than 180°
 * included: the form in which the published regions are stored, cut at the antimeridian, pole edges drawn out.
 */
export function planarPolygonAreaSr(ring: readonly LonLat[]): number {
  requireRing(ring);
  return Math.abs(edgeIntegral(ring, (from, to) => to - from).sum);
}

/** Area [km²] on a sphere of the Earth's surface area. */
export function polygonAreaKm2(ring: readonly LonLat[], radiusM = EARTH_RADIUS_M): number {
  return polygonAreaSr(ring) * (radiusM / 1000) ** 2;
}

function requireRing(ring: readonly LonLat[]): void {
  if (ring.length < 3) {
    throw new DomainError('too-few-vertices', {
      field: 'ring',
      value: ring.length,
      allowed: 'at least 3 vertices',
    });
  }
  for (const [lon, lat] of ring) {
    requireWithin('longitude', lon, '°', -720, 720);
    requireWithin('latitude', lat, '°', -90, 90);
  }
}

/** Σ Δλ m along the ring, and the longitude gained on the way: 0, or ±2π around a pole. */
function edgeIntegral(ring: readonly LonLat[], step: (from: number, to: number) => number) {
  let turnRad = 0;
  let sum = 0;
  ring.forEach(([lon, lat], i) => {
    const [nextLon, nextLat] = ring[(i + 1) % ring.length]!;
    const stepRad = step(lon, nextLon) * RADIANS;
    turnRad += stepRad;
    sum += stepRad * meanSine(lat * RADIANS, nextLat * RADIANS);
  });
  return { turnRad, sum };
}

/** A longitude step of up to 180° as written, a longer one the short way round. */
function shortWay(step: number): number {
  return Math.abs(step) <= 180 ? step : step - 360 * Math.round(step / 360);
}

/** Mean of sin φ along a straight edge. As a product of sines, for the digits of nearly level edges. */
function meanSine(phi1: number, phi2: number): number {
  const half = (phi2 - phi1) / 2;
  const middle = (phi1 + phi2) / 2;
  return half === 0 ? Math.sin(middle) : (Math.sin(middle) * Math.sin(half)) / half;
}
