import { geoEqualEarth, geoEquirectangular, type GeoProjection } from 'd3-geo';

export type ProjectionName = 'equal-earth' | 'plate-carree';

export const projectionTitles: Record<ProjectionName, string> = {
  'equal-earth': 'Equal Earth',
  'plate-carree': 'Plate carrée',
};

export function projectionOf(name: ProjectionName): GeoProjection {
  return name === 'equal-earth' ? geoEqualEarth() : geoEquirectangular();
}

/** Height over width of the whole outline. */
export const aspectOf: Record<ProjectionName, number> = { 'equal-earth': 0.4867, 'plate-carree': 0.5 };
