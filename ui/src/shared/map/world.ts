import { geoEquirectangular, geoStream } from 'd3-geo';
import type { GeoJSON } from 'geojson';
import { feature } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import land110 from 'world-atlas/land-110m.json';

type Point = [number, number];

const span = (from: number, to: number, steps = 40) =>
  Array.from({ length: steps + 1 }, (_, at) => from + ((to - from) * at) / steps);

const line = (coordinates: Point[], name: string) => ({
  type: 'Feature' as const,
  properties: { name },
  geometry: { type: 'LineString' as const, coordinates },
});

/** Rings of the land, cut at the antimeridian: uncut they would draw lines across the map. */
function landRings(): Point[][][] {
  const topology = land110 as unknown as Topology<{ land: GeometryCollection }>;
  const rings: Point[][][] = [];
  let ring: Point[] = [];
  const cut = geoEquirectangular()
    .scale(180 / Math.PI)
    .translate([0, 0])
    .precision(0)
    .stream({
      lineStart: () => {
        ring = [];
      },
      lineEnd: () => {
        if (ring.length > 2) rings.push([[...ring, ring[0]!]]);
      },
      point: (x, y) => {
        ring.push([x, -y]);
      },
      polygonStart: () => undefined,
      polygonEnd: () => undefined,
    });
  geoStream(feature(topology, topology.objects.land), cut);
  return rings;
}

/** Edge of the map as a ring: it also fixes the bounding box, which the land alone gets wrong. */
const sphereRing = (): Point[] => [
  ...span(-90, 90).map((lat): Point => [-180, lat]),
  ...span(-180, 180).map((lon): Point => [lon, 90]),
  ...span(90, -90).map((lat): Point => [180, lat]),
  ...span(180, -180).map((lon): Point => [lon, -90]),
];

/** Outline, graticule of 60 by 30 degrees and coast. Coast: Natural Earth 1:110m through world-atlas. */
export function worldShapes(): GeoJSON {
  return {
    type: 'FeatureCollection',
    features: [
      {
        type: 'Feature',
        properties: { name: 'sphere' },
        geometry: { type: 'Polygon', coordinates: [sphereRing()] },
      },
      ...span(-120, 120, 4).map((lon, at) =>
        line(
          span(-90, 90).map((lat): Point => [lon, lat]),
          `meridian ${at}`,
        ),
      ),
      ...span(-60, 60, 4).map((lat, at) =>
        line(
          span(-180, 180).map((lon): Point => [lon, lat]),
          `parallel ${at}`,
        ),
      ),
      {
        type: 'Feature',
        properties: { name: 'land' },
        geometry: { type: 'MultiPolygon', coordinates: landRings() },
      },
    ],
  };
}
