import { EARTH_RADIUS_M, RADIANS } from '../physical/constants';
import type { VettingContext } from './context';
import { onGlobe } from './land';
import { archiveOf, archiveOfText, siteKey, sitesOf, type Site } from './samples';
import { thinnedCells } from './site-cells';

/** A site of the file with the logarithm of its median flux, beside the sites of its archive around it. */
export interface NeighbouredSite {
  site: Site;
  log10Flux: number;
  /** neighbours looked at, of the file and of Holdings; an even choice of them where they are very many */
  count: number;
  /** median of the neighbours' log10 flux and median absolute deviation from it; 0 without neighbours */
  medianLog10: number;
  deviationLog10: number;
}

/** A place with a flux, its position as a unit vector: a distance then costs three products. */
export interface FluxPlace {
  latitudeDeg: number;
  longitudeDeg: number;
  archive: string;
  log10Flux: number;
  x: number;
  y: number;
  z: number;
}

/** Results by context and radius: two rules look at the same neighbours of the same run. */
const known = new WeakMap<VettingContext, Map<number, NeighbouredSite[]>>();

/**
 * Dust fluxes of the file's sites (median over their samples) beside those of the same archive within a radius:
 * other sites of the file, and sites of Holdings whose median flux is given.
 * Each site looks into its own cell and those around it, each cell thinned to a fixed number: time grows with
 * the number of sites and not with its square.
 *
 * @param radiusKm up to 1100 km, the width of a band of cells
 */
export function neighbouredSites(context: VettingContext, radiusKm: number): NeighbouredSite[] {
  const byRadius = known.get(context) ?? new Map<number, NeighbouredSite[]>();
  known.set(context, byRadius);
  const before = byRadius.get(radiusKm);
  if (before) return before;
  const found = compareWithNeighbours(context, radiusKm);
  byRadius.set(radiusKm, found);
  return found;
}

function compareWithNeighbours(context: VettingContext, radiusKm: number): NeighbouredSite[] {
  const own = sitesOf(context).flatMap((site) => {
    const place = placeWithFlux(context, site);
    return place ? [{ site, place }] : [];
  });
  const around = thinnedCells([...own.map(({ place }) => place), ...heldPlaces(context)]);
  const cosRadius = Math.cos((radiusKm * 1000) / EARTH_RADIUS_M);
  return own.map(({ site, place }) => {
    const near: number[] = [];
    for (const cell of around(place)) {
      for (const other of cell) {
        const isNear = other.x * place.x + other.y * place.y + other.z * place.z >= cosRadius;
        if (isNear && other !== place) near.push(other.log10Flux);
      }
    }
    return { site, log10Flux: place.log10Flux, count: near.length, ...middleAndSpread(near) };
  });
}

function placeWithFlux(context: VettingContext, site: Site): FluxPlace | null {
  const archive = archiveOf(context, site.rows[0]!);
  const fluxes = site.rows.filter((row) => row.quantity === 'dust').map((row) => row.fluxGM2Yr ?? 0);
  const positive = Float64Array.from(fluxes.filter((flux) => flux > 0)).sort();
  const median = positive[Math.floor(positive.length / 2)];
  return archive === null || median === undefined ? null : placeOf(site, archive, median);
}

/** Sites of Holdings with a flux, save those that the file has under the same name: they are no other site. */
function heldPlaces(context: VettingContext): FluxPlace[] {
  const names = new Set(sitesOf(context).map(({ name }) => siteKey(name)));
  return context.heldSites.flatMap((held) => {
    if (names.has(siteKey(held.site))) return [];
    const flux = held.medianFluxGM2Yr ?? 0;
    const place =
      held.archive === null || flux <= 0 ? null : placeOf(held, archiveOfText(held.archive), flux);
    return place ? [place] : [];
  });
}

function placeOf(
  { latitudeDeg, longitudeDeg }: { latitudeDeg: number; longitudeDeg: number },
  archive: string,
  flux: number,
): FluxPlace | null {
  if (!onGlobe(latitudeDeg, longitudeDeg)) return null;
  const [phi, lambda] = [latitudeDeg * RADIANS, longitudeDeg * RADIANS];
  const [x, y] = [Math.cos(phi) * Math.cos(lambda), Math.cos(phi) * Math.sin(lambda)];
  return { latitudeDeg, longitudeDeg, archive, log10Flux: Math.log10(flux), x, y, z: Math.sin(phi) };
}

function middleAndSpread(values: number[]): { medianLog10: number; deviationLog10: number } {
  if (values.length === 0) return { medianLog10: 0, deviationLog10: 0 };
  const sorted = Float64Array.from(values).sort();
  const middle = medianOfSorted(sorted);
  const deviations = sorted.map((value) => Math.abs(value - middle)).sort();
  return { medianLog10: middle, deviationLog10: medianOfSorted(deviations) };
}

function medianOfSorted(sorted: Float64Array): number {
  const half = sorted.length / 2;
  return (sorted[Math.ceil(half) - 1]! + sorted[Math.floor(half)]!) / 2;
}
