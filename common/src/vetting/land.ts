import { regionAt } from '../sphere/region-set';
import { LAND_FRACTION_COLUMNS, LAND_FRACTION_ROWS, landFraction2Deg } from '../tables/land-fraction-2deg';
import type { Archive } from './archive';

/** Looks up the present-day land share of the 2° cell of a position. */
export type LandShare = (latitudeDeg: number, longitudeDeg: number) => number;

/** Decodes the table at the first look-up of a run. Longitudes of −180 to 360° are taken; the poles belong to the last row. */
export function landShare(): LandShare {
  let fractions: Float64Array | undefined;
  return (latitudeDeg, longitudeDeg) => {
    fractions ??= landFraction2Deg();
    const row = Math.min(LAND_FRACTION_ROWS - 1, Math.max(0, Math.floor((latitudeDeg + 90) / 2)));
    const eastward = (((longitudeDeg + 180) % 360) + 360) % 360;
    return fractions[row * LAND_FRACTION_COLUMNS + Math.floor(eastward / 2)]!;
  };
}

/**
 * Whether an archive can lie in a cell with this share of land: marine where there is any sea,
 * the others where there is any land. Coarse on purpose: a coastal cell fits both.
 */
export function fitsSurface(archive: Archive, share: number): boolean {
  if (archive === 'other') return true;
  return archive === 'marine' ? share < 1 : share > 0;
}

/** AR6 regions with the two ice sheets; GIC also holds Iceland and the bare coasts of Greenland. */
const ICE_SHEET_REGIONS: ReadonlySet<string> = new Set(['GIC', 'EAN', 'WAN']);

/** Whether a position lies in a region with an ice sheet: coarse, and mountain glaciers and small caps lie elsewhere. */
export function nearIceSheet(latitudeDeg: number, longitudeDeg: number): boolean {
  if (latitudeDeg > -60 && latitudeDeg < 58) return false; // south of Greenland and north of Antarctica
  return ICE_SHEET_REGIONS.has(regionAt(longitudeDeg, latitudeDeg) ?? '');
}

export const onGlobe = (latitudeDeg: number, longitudeDeg: number): boolean =>
  Math.abs(latitudeDeg) <= 90 && longitudeDeg >= -180 && longitudeDeg <= 360;
