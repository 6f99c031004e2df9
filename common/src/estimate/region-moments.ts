import type { BySurface } from '../fields/base-field';
import type { BackdropRow } from './backdrop-tiles';
import { type LightMoments, LIGHTS } from './light-moments';
import type { RegionGeometry } from './region-geometry';

/** Powers 0, 1, 2 of the surface albedo. */
export const ALBEDO_POWERS = 3;

/** Clear-sky sums, and the same weighted with the cloud fraction. */
export interface MomentSums {
  clear: Float64Array;
  cloudy: Float64Array;
}

/**
 * Sums of one slice over area (and months) from which every member of an ensemble follows by a few multiplications:
 *
 *   Z[region][light j][power k] = Σ area · τ_base · L_j · R_s^k
 *
 * once with weight one (clear sky) and once with the cloud fraction, so that all sky = clear − factor · cloudy.
 * The shortwave formulas are linear in these sums. Light 0 is the constant one: its sums give the optical depth.
 */
export interface RegionMoments extends MomentSums {
  /** numbers of one region: lights × powers */
  size: number;
  /** the same sums of each month alone, and the month's share of the year */
  monthly: MomentSums[];
  shareOfYear: number[];
}

const known = new Map<string, RegionMoments>();
const KEPT = 12;

/** Depends on nothing but its arguments, which change seldom beside optics and efficiencies: the last few are kept. */
export function regionMoments(
  geometry: RegionGeometry,
  backdrop: readonly BackdropRow[],
  baseOpticalDepth: BySurface,
  light: LightMoments,
): RegionMoments {
  const key = `${light.key} ${JSON.stringify(baseOpticalDepth)} ${JSON.stringify(backdrop)}`;
  const before = known.get(key);
  if (before) return before;
  const moments = sumMoments(geometry, tileSums(geometry, backdrop, baseOpticalDepth), light);
  if (known.size >= KEPT) known.delete(known.keys().next().value!);
  known.set(key, moments);
  return moments;
}

function sumMoments(geometry: RegionGeometry, tiles: MomentSums, light: LightMoments): RegionMoments {
  const size = LIGHTS * ALBEDO_POWERS;
  const empty = () => ({
    clear: new Float64Array(geometry.regionCount * size),
    cloudy: new Float64Array(geometry.regionCount * size),
  });
  const annual = empty();
  const monthly = light.months.map(({ byRow, shareOfYear }) => {
    const month = empty();
    addMonth(month, geometry, tiles, byRow);
    for (let i = 0; i < annual.clear.length; i++) {
      annual.clear[i]! += shareOfYear * month.clear[i]!;
      annual.cloudy[i]! += shareOfYear * month.cloudy[i]!;
    }
    return month;
  });
  return { size, ...annual, monthly, shareOfYear: light.months.map((month) => month.shareOfYear) };
}

function addMonth(month: MomentSums, geometry: RegionGeometry, tiles: MomentSums, byRow: Float64Array): void {
  const { entryRows, entryRegions } = geometry;
  for (let entry = 0; entry < entryRows.length; entry++) {
    const row = entryRows[entry]! * LIGHTS;
    const tile = entry * ALBEDO_POWERS;
    let at = entryRegions[entry]! * LIGHTS * ALBEDO_POWERS;
    for (let j = 0; j < LIGHTS; j++) {
      const strength = byRow[row + j]!;
      for (let k = 0; k < ALBEDO_POWERS; k++, at++) {
        month.clear[at]! += strength * tiles.clear[tile + k]!;
        month.cloudy[at]! += strength * tiles.cloudy[tile + k]!;
      }
    }
  }
}

/** Σ over land and sea of area · τ_base · R_s^k, and the same times the cloud fraction, for each entry. */
function tileSums(geometry: RegionGeometry, backdrop: readonly BackdropRow[], base: BySurface): MomentSums {
  const count = geometry.entryRows.length;
  const clear = new Float64Array(count * ALBEDO_POWERS);
  const cloudy = new Float64Array(count * ALBEDO_POWERS);
  geometry.entryRows.forEach((row, entry) => {
    const { albedoLand, albedoOcean, cloudLand, cloudOcean } = backdrop[row]!;
    const depth = base[geometry.latitudesDeg[row]! < 0 ? 'south' : 'north'];
    let land = geometry.land[entry]! * depth.land;
    let ocean = geometry.ocean[entry]! * depth.ocean;
    for (let k = 0; k < ALBEDO_POWERS; k++) {
      clear[entry * ALBEDO_POWERS + k] = land + ocean;
      cloudy[entry * ALBEDO_POWERS + k] = land * cloudLand + ocean * cloudOcean;
      land *= albedoLand;
      ocean *= albedoOcean;
    }
  });
  return { clear, cloudy };
}

/** Σ_j,k coefficient · Z over one region. */
export function dotMoments(coefficients: Float64Array, moments: Float64Array, region: number): number {
  const start = region * coefficients.length;
  let sum = 0;
  for (let i = 0; i < coefficients.length; i++) sum += coefficients[i]! * moments[start + i]!;
  return sum;
}
