import type { Region } from './region-set';

/** A sloping or upright edge of a region's ring, from its lower to its upper end. Level edges bound no width. */
export interface RegionEdge {
  region: number;
  lowLat: number;
  highLat: number;
  lowLon: number;
  /** degrees of longitude per degree of latitude */
  slope: number;
}

export function regionEdges(regions: readonly Region[]): RegionEdge[] {
  const edges: RegionEdge[] = [];
  regions.forEach((region, index) => {
    for (const ring of region.parts) {
      ring.forEach(([lon, lat], i) => {
        const [nextLon, nextLat] = ring[(i + 1) % ring.length]!;
        if (lat === nextLat) return;
        const up = lat < nextLat;
        edges.push({
          region: index,
          lowLat: up ? lat : nextLat,
          highLat: up ? nextLat : lat,
          lowLon: up ? lon : nextLon,
          slope: (nextLon - lon) / (nextLat - lat),
        });
      });
    }
  });
  return edges;
}

export function longitudeAt(edge: RegionEdge, lat: number): number {
  return edge.lowLon + (lat - edge.lowLat) * edge.slope;
}

/**
 * Latitudes, ascending, between which no edge begins, ends or crosses another: within one such band the
 * edges keep their order from west to east.
 */
export function bandLatitudes(edges: RegionEdge[], always: Iterable<number>): number[] {
  const latitudes = new Set<number>(always);
  for (const edge of edges) latitudes.add(edge.lowLat).add(edge.highLat);
  for (let i = 0; i < edges.length; i++) {
    for (let j = 0; j < i; j++) {
      const crossing = crossingLatitude(edges[i]!, edges[j]!);
      if (crossing !== null) latitudes.add(crossing);
    }
  }
  return [...latitudes].sort((a, b) => a - b);
}

function crossingLatitude(a: RegionEdge, b: RegionEdge): number | null {
  const low = Math.max(a.lowLat, b.lowLat);
  const high = Math.min(a.highLat, b.highLat);
  if (low >= high || a.slope === b.slope) return null;
  const lat = low + (longitudeAt(b, low) - longitudeAt(a, low)) / (a.slope - b.slope);
  return lat > low && lat < high ? lat : null;
}
