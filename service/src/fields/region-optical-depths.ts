import type { BaseField } from '@siltlight/common/fields/base-field';
import { landFraction } from '@siltlight/common/fields/land-fraction';
import { regionWeights } from '@siltlight/common/sphere/region-weights';
import { regularGrid } from '@siltlight/common/sphere/regular-grid';

export const FIELD_STEP_DEG = 2;

export interface OpticalDepthGrid {
  stepDeg: number;
  /** row-major from 90° S, 180° W northwards and eastwards */
  opticalDepthSlice: Float64Array;
  opticalDepthReference: Float64Array;
}

/** Optical depth at 550 nm of each cell: the base field, and the base field times the ratio of the cell's region. */
export function opticalDepthGrid(
  base: Pick<BaseField, 'opticalDepth'>,
  lnRatios: ReadonlyMap<string, number>,
  globalLnRatio: number,
): OpticalDepthGrid {
  const grid = regularGrid(FIELD_STEP_DEG);
  const land = landFraction(FIELD_STEP_DEG);
  const reference = Float64Array.from(land, (share, cell) => {
    const hemisphere = grid.latitudesDeg[Math.floor(cell / grid.columns)]! < 0 ? 'south' : 'north';
    const { land: overLand, ocean: overSea } = base.opticalDepth[hemisphere];
    return share * overLand + (1 - share) * overSea;
  });
  const factors = cellFactors(lnRatios, globalLnRatio, reference.length);
  return {
    stepDeg: FIELD_STEP_DEG,
    opticalDepthSlice: reference.map((value, cell) => value * factors[cell]!),
    opticalDepthReference: reference,
  };
}

/** A cell that several regions share takes their ratios by area. */
function cellFactors(
  lnRatios: ReadonlyMap<string, number>,
  globalLnRatio: number,
  cells: number,
): Float64Array {
  const weights = regionWeights(FIELD_STEP_DEG);
  const sums = new Float64Array(cells);
  const areas = new Float64Array(cells);
  weights.cells.forEach((cell, i) => {
    const code = weights.codes[weights.regions[i]!];
    const lnRatio = (code === undefined ? undefined : lnRatios.get(code)) ?? globalLnRatio;
    sums[cell]! += weights.areaFraction[i]! * Math.exp(lnRatio);
    areas[cell]! += weights.areaFraction[i]!;
  });
  return sums.map((sum, cell) => sum / areas[cell]!);
}

/** Area means of a grid by region code, and of the whole sphere. */
export function areaMeans(values: Float64Array): { byRegion: Map<string, number>; global: number } {
  const weights = regionWeights(FIELD_STEP_DEG);
  const sums = new Map<string, { sum: number; area: number }>();
  let global = 0;
  weights.cells.forEach((cell, i) => {
    const part = weights.areaFraction[i]! * values[cell]!;
    global += part;
    const code = weights.codes[weights.regions[i]!];
    if (code === undefined) return;
    const entry = sums.get(code) ?? { sum: 0, area: 0 };
    sums.set(code, { sum: entry.sum + part, area: entry.area + weights.areaFraction[i]! });
  });
  return { byRegion: new Map([...sums].map(([code, { sum, area }]) => [code, sum / area])), global };
}

/** Share of the sphere of each region code. */
export function areaShares(): Map<string, number> {
  const weights = regionWeights(FIELD_STEP_DEG);
  const shares = new Map<string, number>();
  weights.regions.forEach((region, i) => {
    const code = weights.codes[region];
    if (code !== undefined) shares.set(code, (shares.get(code) ?? 0) + weights.areaFraction[i]!);
  });
  return shares;
}
