import { landFraction } from '../fields/land-fraction';
import { regionWeights } from '../sphere/region-weights';
import { regularGrid } from '../sphere/regular-grid';

/**
 * How much land and sea of each row of the grid belongs to each region. One entry for each pair of region and row.
 * Light, backdrop and base field depend on row, land and sea alone, so this is all that an estimate needs of the grid.
 */
export interface RegionGeometry {
  /** region codes; the index after the last stands for "none" */
  codes: string[];
  regionCount: number;
  rows: number;
  latitudesDeg: Float64Array;
  entryRegions: Int16Array;
  entryRows: Int16Array;
  /** share of the sphere [1] */
  land: Float64Array;
  ocean: Float64Array;
  /** share of the sphere of each region, "none" last */
  regionArea: Float64Array;
}

const known = new Map<number, RegionGeometry>();

/** @param stepDeg 2, 1, 0.5 or 0.25 */
export function regionGeometry(stepDeg: number): RegionGeometry {
  const before = known.get(stepDeg);
  if (before) return before;
  const geometry = buildGeometry(stepDeg);
  known.set(stepDeg, geometry);
  return geometry;
}

function buildGeometry(stepDeg: number): RegionGeometry {
  const { codes, cells, regions, areaFraction } = regionWeights(stepDeg);
  const { rows, columns, latitudesDeg } = regularGrid(stepDeg);
  const landShare = landFraction(stepDeg);
  const regionCount = codes.length + 1;
  const land = new Float64Array(regionCount * rows);
  const ocean = new Float64Array(regionCount * rows);
  const regionArea = new Float64Array(regionCount);
  cells.forEach((cell, i) => {
    const region = regions[i]! < 0 ? codes.length : regions[i]!;
    const slot = region * rows + Math.floor(cell / columns);
    land[slot]! += areaFraction[i]! * landShare[cell]!;
    ocean[slot]! += areaFraction[i]! * (1 - landShare[cell]!);
    regionArea[region]! += areaFraction[i]!;
  });
  const slots = [...land.keys()].filter((slot) => land[slot]! + ocean[slot]! > 0);
  return {
    codes,
    regionCount,
    rows,
    latitudesDeg,
    entryRegions: Int16Array.from(slots, (slot) => Math.floor(slot / rows)),
    entryRows: Int16Array.from(slots, (slot) => slot % rows),
    land: Float64Array.from(slots, (slot) => land[slot]!),
    ocean: Float64Array.from(slots, (slot) => ocean[slot]!),
    regionArea,
  };
}
