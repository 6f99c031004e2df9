import { EARTH_RADIUS_M, RADIANS } from '../physical/constants';
import type { VettingContext } from './context';
import { onGlobe } from './land';
import { groupBy } from './place';
import { archiveOf, sitesOf, type Site } from './samples';

/** A site with the logarithm of its median flux and the sites of its archive around it. */
export interface NeighbouredSite {
  site: Site;
  log10Flux: number;
  neighbours: number[];
}

/** Beyond this many sites in a cell of the grid, an even choice of them stands for all: the work stays near n log n. */
const MOST_A_CELL = 40;
/** Half the circumference along a degree of latitude is 10 000 km per 90°; a band of 10° is 1112 km. */
const BAND_DEG = 10;

/**
 * Dust fluxes of the file's sites (median over their samples) beside those of the same archive within a radius.
 * Sites are put in cells of 10° latitude by longitude as wide as the radius there; a site looks into its own
 * and the adjoining cells.
 *
 * @param radiusKm up to 1100 km, the width of a band
 */
export function neighbouredSites(context: VettingContext, radiusKm: number): NeighbouredSite[] {
  const sites = sitesOf(context).flatMap((site) => withFlux(context, site));
  const cosRadius = Math.cos((radiusKm * 1000) / EARTH_RADIUS_M);
  const cells = groupBy(sites, (one) =>
    cellKey(one.archive, bandOf(one.site), columnOf(one.site, bandOf(one.site))),
  );
  for (const [key, cell] of cells) cells.set(key, thinned(cell));
  return sites.map((one) => {
    const near = [...cellsAround(one.site)].flatMap(
      ([band, column]) => cells.get(cellKey(one.archive, band, column)) ?? [],
    );
    const neighbours = near.filter((other) => other !== one && cosineBetween(one, other) >= cosRadius);
    return {
      site: one.site,
      log10Flux: one.log10Flux,
      neighbours: neighbours.map((other) => other.log10Flux),
    };
  });
}

interface SiteFlux {
  site: Site;
  archive: string;
  log10Flux: number;
  /** unit vector of the position: distances of many pairs then cost three products each */
  x: number;
  y: number;
  z: number;
}

function withFlux(context: VettingContext, site: Site): SiteFlux[] {
  const archive = archiveOf(context, site.rows[0]!);
  const fluxes = site.rows.filter((row) => row.quantity === 'dust').map((row) => row.fluxGM2Yr ?? 0);
  const positive = fluxes.filter((flux) => flux > 0).sort((a, b) => a - b);
  const median = positive[Math.floor(positive.length / 2)];
  if (archive === null || median === undefined || !onGlobe(site.latitudeDeg, site.longitudeDeg)) return [];
  const [phi, lambda] = [site.latitudeDeg * RADIANS, site.longitudeDeg * RADIANS];
  const [x, y] = [Math.cos(phi) * Math.cos(lambda), Math.cos(phi) * Math.sin(lambda)];
  return [{ site, archive, log10Flux: Math.log10(median), x, y, z: Math.sin(phi) }];
}

const thinned = (cell: SiteFlux[]): SiteFlux[] => {
  const stride = Math.ceil(cell.length / MOST_A_CELL);
  return stride === 1 ? cell : cell.filter((_, index) => index % stride === 0);
};

const cosineBetween = (a: SiteFlux, b: SiteFlux): number => a.x * b.x + a.y * b.y + a.z * b.z;

const bandOf = (site: Site): number => Math.min(17, Math.floor((site.latitudeDeg + 90) / BAND_DEG));

/** Cells of a band, each at least as wide as the band is high at its edge nearer to a pole; one for the polar caps. */
function columnsOf(band: number): number {
  const poleward = Math.max(Math.abs(band * BAND_DEG - 90), Math.abs((band + 1) * BAND_DEG - 90));
  return Math.max(1, Math.floor((360 / BAND_DEG) * Math.cos(poleward * RADIANS)));
}

const columnOf = (site: Site, band: number): number =>
  Math.floor(((((site.longitudeDeg % 360) + 360) % 360) / 360) * columnsOf(band)) % columnsOf(band);

const cellKey = (archive: string, band: number, column: number): string => `${archive},${band},${column}`;

function* cellsAround(site: Site): Iterable<[number, number]> {
  for (const band of [bandOf(site) - 1, bandOf(site), bandOf(site) + 1]) {
    if (band < 0 || band > 17) continue;
    const columns = columnsOf(band);
    const middle = columnOf(site, band);
    const wanted = new Set([-1, 0, 1].map((step) => (middle + step + columns) % columns));
    for (const column of wanted) yield [band, column];
  }
}
