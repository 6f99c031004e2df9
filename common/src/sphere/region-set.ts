import { requireWithin } from '../physical/domain-error';
import { AR6_REGIONS, type Ar6Region } from '../tables/ar6-regions';
import type { LonLat } from './polygon-area';

/** A region of a set: one or more rings with edges straight in longitude and latitude. */
export type Region = Ar6Region;

/** Names of the region sets at hand. */
export const REGION_SETS = ['ar6'] as const;
export type RegionSetId = (typeof REGION_SETS)[number];

/** IPCC AR6 reference regions, version 4, in table order. Iturbide et al. (2020), ESSD 12, 2959–2970, CC BY 4.0. */
export function ar6Regions(): readonly Region[] {
  return AR6_REGIONS;
}

/**
 * Code of the region that a point belongs to: the first in table order that holds it, edges included.
 * The published polygons overlap slightly in nine pairs and leave small gaps: then null.
 *
 * @param lon any longitude [°]; +180 and −180 are the same meridian and belong to whoever touches either
 * @param lat latitude [°]; a pole belongs to the region whose edge runs along it
 * @throws DomainError for a latitude outside ±90°
 * Checked against: reference/checks/general/point_in_region.csv.
 */
export function regionAt(lon: number, lat: number): string | null {
  requireWithin('latitude', lat, '°', -90, 90);
  requireWithin('longitude', lon, '°', -720, 720);
  const wrapped = wrapLongitude(lon);
  // A pole has no longitude: try those that the edges along ±90 run over.
  const longitudes =
    Math.abs(lat) === 90 ? [wrapped, 0, -180, 180] : wrapped === -180 ? [-180, 180] : [wrapped];
  const found = AR6_REGIONS.find((region) =>
    region.parts.some((ring) => longitudes.some((longitude) => ringHolds(ring, longitude, lat))),
  );
  return found?.code ?? null;
}

/** Longitude in −180 (included) to 180 (excluded). */
export function wrapLongitude(lon: number): number {
  if (lon >= -180 && lon < 180) return lon;
  const turned = (((lon + 180) % 360) + 360) % 360;
  return turned - 180;
}

/** Even–odd rule in the plane of longitude and latitude; a point on an edge is inside. */
function ringHolds(ring: readonly LonLat[], lon: number, lat: number): boolean {
  let inside = false;
  for (let i = 0; i < ring.length; i++) {
    const [x1, y1] = ring[i]!;
    const [x2, y2] = ring[(i + 1) % ring.length]!;
    const cross = (x2 - x1) * (lat - y1) - (y2 - y1) * (lon - x1);
    const withinBox =
      lon >= Math.min(x1, x2) &&
      lon <= Math.max(x1, x2) &&
      lat >= Math.min(y1, y2) &&
      lat <= Math.max(y1, y2);
    if (cross === 0 && withinBox) return true;
    if (y1 > lat !== y2 > lat && lon < x1 + ((lat - y1) * (x2 - x1)) / (y2 - y1)) inside = !inside;
  }
  return inside;
}
