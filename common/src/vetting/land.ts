import { LAND_FRACTION_COLUMNS, LAND_FRACTION_ROWS, landFraction2Deg } from '../tables/land-fraction-2deg';
import type { Archive } from './samples';

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

export const onGlobe = (latitudeDeg: number, longitudeDeg: number): boolean =>
  Math.abs(latitudeDeg) <= 90 && longitudeDeg >= -180 && longitudeDeg <= 360;
