import { type Caution, DomainError, requireWithin } from '../physical/domain-error';
import { regularGrid } from '../sphere/regular-grid';
import { DUST_OPTICAL_DEPTH } from '../tables/dust-optical-depth';
import { landFraction } from './land-fraction';

export type Hemisphere = 'south' | 'north';
export type Surface = 'land' | 'ocean';
export type BySurface = Record<Hemisphere, Record<Surface, number>>;

export interface BaseField {
  title: string;
  source: string;
  wavelengthNm: 550;
  /** pre-industrial dust optical depth by hemisphere and surface */
  opticalDepth: BySurface;
  /** present-day values before the division */
  presentOpticalDepth: BySurface;
  /** present over pre-industrial dust */
  presentFactor: number;
  /** what the published land and ocean means were multiplied by to agree with the hemispheric ones */
  surfaceMarginalFactor: number;
  cautions: Caution[];
}

/** Share of the sphere by hemisphere and surface, from the land fractions of 2° cells. */
export function surfaceShares(): BySurface {
  const { rows, columns, latitudesDeg, cellAreaFraction } = regularGrid(2);
  const land = landFraction(2);
  const shares: BySurface = { south: { land: 0, ocean: 0 }, north: { land: 0, ocean: 0 } };
  for (let cell = 0; cell < rows * columns; cell++) {
    const row = Math.floor(cell / columns);
    const hemisphere = shares[latitudesDeg[row]! < 0 ? 'south' : 'north'];
    hemisphere.land += cellAreaFraction[row]! * land[cell]!;
    hemisphere.ocean += cellAreaFraction[row]! * (1 - land[cell]!);
  }
  return shares;
}

let shipped: BaseField | undefined;

/**
 * The coarse base field that ships with the product: dust optical depth at 550 nm, one value for each of land and
 * ocean in each hemisphere, before industry.
 *
 * The source prints four means (hemispheres, land, ocean), not the table between them. The table is found by
 * iterative proportional fitting: start from equal optical depths, scale rows and columns in turn until the
 * area-weighted means come back. The printed land and ocean means give a global mean 6 % above that of the
 * hemispheres; they are first scaled to it, and stay within their printed uncertainty.
 *
 * Sources: Gkikas et al. (2022), Atmos. Chem. Phys. 22, 3553, 2003–2017; divided by 1.55 (1.25 to 1.85, present
 * over pre-industrial dust: Kok et al. 2023, Nat. Rev. Earth Environ. 4, 71). Fitting: Deming & Stephan (1940),
 * Ann. Math. Stat. 11, 427 (from memory).
 * Limits: within one hemisphere every sea, and every land, has the same dust. Use it for global means and for
 * ratios, not as a map of dust.
 */
export function coarseBaseField(): BaseField {
  shipped ??= buildBaseField(1.55);
  return shipped;
}

/** The same with another factor between present and pre-industrial dust. */
export function buildBaseField(presentFactor: number): BaseField {
  requireWithin('presentFactor', presentFactor, '', 0.5, 5);
  const shares = surfaceShares();
  const { present, surfaceMarginalFactor } = fitPresent(shares);
  return {
    title: 'Coarse base field: dust by hemisphere, land and ocean',
    source:
      'Gkikas et al. (2022), Atmos. Chem. Phys. 22, 3553 (2003–2017), ' +
      `over ${presentFactor} to take out the industrial era (Kok et al. 2023, Nat. Rev. Earth Environ. 4, 71)`,
    wavelengthNm: 550,
    opticalDepth: mapBySurface(present, (value) => value / presentFactor),
    presentOpticalDepth: present,
    presentFactor,
    surfaceMarginalFactor,
    cautions: [
      {
        code: 'coarse-base-field',
        message:
          'The base field knows four values: land and ocean of each hemisphere. Regional optical depths show ' +
          'the ratio found from the sites, not where dust lies today.',
      },
    ],
  };
}

function fitPresent(shares: BySurface): { present: BySurface; surfaceMarginalFactor: number } {
  const area = (h: Hemisphere) => shares[h].land + shares[h].ocean;
  const rows = {
    south: published('southern hemisphere') * area('south'),
    north: published('northern hemisphere') * area('north'),
  };
  const columns = {
    land: published('land') * (shares.south.land + shares.north.land),
    ocean: published('ocean') * (shares.south.ocean + shares.north.ocean),
  };
  const surfaceMarginalFactor = (rows.south + rows.north) / (columns.land + columns.ocean);
  const sums = mapBySurface(shares, (share) => share);
  for (let round = 0; round < 200; round++) {
    for (const h of ['south', 'north'] as const) {
      const scale = rows[h] / (sums[h].land + sums[h].ocean);
      sums[h] = { land: sums[h].land * scale, ocean: sums[h].ocean * scale };
    }
    for (const s of ['land', 'ocean'] as const) {
      const scale = (columns[s] * surfaceMarginalFactor) / (sums.south[s] + sums.north[s]);
      sums.south[s] *= scale;
      sums.north[s] *= scale;
    }
  }
  const present = mapBySurface(sums, (sum, h, s) => sum / shares[h][s]);
  return { present, surfaceMarginalFactor };
}

function published(domain: string): number {
  const row = DUST_OPTICAL_DEPTH.find((entry) => entry.domain === domain);
  if (!row)
    throw new DomainError('missing-table-row', {
      field: 'domain',
      value: domain,
      allowed: 'a row of the table',
    });
  return row.opticalDepth;
}

function mapBySurface(
  table: BySurface,
  change: (value: number, h: Hemisphere, s: Surface) => number,
): BySurface {
  const half = (h: Hemisphere) => ({
    land: change(table[h].land, h, 'land'),
    ocean: change(table[h].ocean, h, 'ocean'),
  });
  return { south: half('south'), north: half('north') };
}
