import { RADIANS } from '../physical/constants';
import { bandLatitudes, longitudeAt, regionEdges, type RegionEdge } from './region-edges';
import { ar6Regions } from './region-set';
import { regularGrid, type RegularGrid } from './regular-grid';

/** Overlaps of grid cells with regions. One entry for each pair that overlaps. */
export interface RegionWeights {
  /** region codes; an entry's region is an index into this list */
  codes: string[];
  /** cell index of each entry: row × columns + column, rows from the South Pole, columns from 180° W */
  cells: Int32Array;
  /** region index of each entry, −1 where no region covers that piece */
  regions: Int16Array;
  /** share of the whole sphere of each entry; all add up to one */
  areaFraction: Float64Array;
}

const known = new Map<number, RegionWeights>();

/**
 * Partition of a regular grid into the AR6 regions: where regions overlap, the piece belongs to the first in
 * table order; where none is, to "none" (−1). Region means over it add up to the global mean.
 *
 * The plane is cut into bands in which no edge begins, ends or crosses another; between neighbouring edges of a
 * band lies a trapezoid of one region, whose area on the sphere inside each cell is an exact integral
 * ∫ width cos φ dφ. Nothing is sampled.
 *
 * @param stepDeg as regularGrid takes it
 */
export function regionWeights(stepDeg: number): RegionWeights {
  const before = known.get(stepDeg);
  if (before) return before;
  const weights = buildWeights(regularGrid(stepDeg));
  known.set(stepDeg, weights);
  return weights;
}

function buildWeights(grid: RegularGrid): RegionWeights {
  const regions = ar6Regions();
  const edges = regionEdges(regions);
  const rowEdges = Array.from({ length: grid.rows + 1 }, (_, row) => rowEdge(grid, row));
  const latitudes = bandLatitudes(edges, rowEdges);
  const entries: RowEntries = { cells: [], regions: [], areaFraction: [] };
  let band = 0;
  for (let row = 0; row < grid.rows; row++) {
    const areas = new Float64Array(grid.columns * (regions.length + 1));
    for (; band + 1 < latitudes.length && latitudes[band + 1]! <= rowEdges[row + 1]!; band++) {
      addBand(areas, grid, edges, latitudes[band]!, latitudes[band + 1]!);
    }
    collectRow(entries, areas, grid, row);
  }
  return {
    codes: regions.map((region) => region.code),
    cells: Int32Array.from(entries.cells),
    regions: Int16Array.from(entries.regions),
    areaFraction: Float64Array.from(entries.areaFraction),
  };
}

function rowEdge(grid: RegularGrid, row: number): number {
  return row === grid.rows ? 90 : -90 + row * grid.stepDeg;
}

/** Slices one band from west to east and adds each slice to its region's cells. */
function addBand(
  areas: Float64Array,
  grid: RegularGrid,
  edges: RegionEdge[],
  south: number,
  north: number,
): void {
  const middle = (south + north) / 2;
  const crossing = edges
    .filter((edge) => edge.lowLat < north && edge.highLat > south)
    .map((edge) => ({ edge, at: longitudeAt(edge, middle) }))
    .sort((a, b) => a.at - b.at);
  const inside = new Set<number>();
  let left = straight(-180);
  for (const { edge, at } of crossing) {
    const right = { west: longitudeAt(edge, south), east: longitudeAt(edge, north), at };
    addSlice(areas, grid, first(inside), left, right, south, north);
    if (!inside.delete(edge.region)) inside.add(edge.region);
    left = right;
  }
  addSlice(areas, grid, first(inside), left, straight(180), south, north);
}

/** A side of a slice: its longitude at the south and the north of the band, and half-way. */
interface Side {
  west: number;
  east: number;
  at: number;
}

function straight(lon: number): Side {
  return { west: lon, east: lon, at: lon };
}

/** 0 = none, otherwise region index + 1; the first in table order wins. */
function first(inside: Set<number>): number {
  let least = -1;
  for (const region of inside) if (least < 0 || region < least) least = region;
  return least + 1;
}

function addSlice(
  areas: Float64Array,
  { stepDeg, columns }: RegularGrid,
  slot: number,
  left: Side,
  right: Side,
  south: number,
  north: number,
): void {
  if (right.at <= left.at) return;
  const from = Math.max(0, Math.floor((Math.min(left.west, left.east) + 180) / stepDeg));
  const to = Math.min(columns - 1, Math.floor((Math.max(right.west, right.east) + 180) / stepDeg));
  for (let column = from; column <= to; column++) {
    const west = -180 + column * stepDeg;
    const width =
      widthIntegral(right, west, stepDeg, south, north) - widthIntegral(left, west, stepDeg, south, north);
    areas[slot * columns + column]! += width;
  }
}

/** ∫ clamp(x(φ) − west, 0, step) cos φ dφ over the band, as a share of the sphere; x is the side's longitude. */
function widthIntegral(side: Side, west: number, step: number, south: number, north: number): number {
  const atSouth = side.west - west;
  const atNorth = side.east - west;
  if (atSouth <= 0 && atNorth <= 0) return 0;
  if (atSouth >= step && atNorth >= step) return linearIntegral(step, step, south, north);
  // share of the way north at which the side passes the cell's two meridians
  const cuts = [0, step]
    .map((limit) => (limit - atSouth) / (atNorth - atSouth))
    .filter((share) => share > 0 && share < 1)
    .sort((a, b) => a - b);
  const shares = [0, ...cuts, 1];
  const widthAt = (share: number) => Math.min(step, Math.max(0, atSouth + share * (atNorth - atSouth)));
  const latAt = (share: number) => south + share * (north - south);
  let sum = 0;
  for (let i = 1; i < shares.length; i++) {
    const [a, b] = [shares[i - 1]!, shares[i]!];
    sum += linearIntegral(widthAt(a), widthAt(b), latAt(a), latAt(b));
  }
  return sum;
}

/** Share of the sphere under a width [°] that changes linearly from one latitude to the other. */
function linearIntegral(widthSouth: number, widthNorth: number, south: number, north: number): number {
  const half = ((north - south) / 2) * RADIANS;
  const middle = ((north + south) / 2) * RADIANS;
  if (half === 0) return 0;
  // ∫ (m + s t) cos(φ_m + t) dt over ±h = 2 m cos φ_m sin h − 2 s sin φ_m (sin h − h cos h)
  const mean = (widthSouth + widthNorth) / 2;
  const slope = (widthNorth - widthSouth) / 2 / half;
  const sum = mean * Math.cos(middle) * Math.sin(half) - slope * Math.sin(middle) * lag(half);
  return sum / 360;
}

/** sin h − h cos h, by its series where the difference would lose its digits. */
function lag(h: number): number {
  return Math.abs(h) > 0.02
    ? Math.sin(h) - h * Math.cos(h)
    : (h ** 3 / 3) * (1 - (h * h) / 10 + h ** 4 / 280);
}

interface RowEntries {
  cells: number[];
  regions: number[];
  areaFraction: number[];
}

function collectRow(entries: RowEntries, areas: Float64Array, grid: RegularGrid, row: number): void {
  const slots = areas.length / grid.columns;
  // an overlap below rounding of the cell's own area is a touch, not an overlap
  const touch = 1e-12 * grid.cellAreaFraction[row]!;
  for (let column = 0; column < grid.columns; column++) {
    for (let slot = 0; slot < slots; slot++) {
      const area = areas[slot * grid.columns + column]!;
      if (area <= touch) continue;
      entries.cells.push(row * grid.columns + column);
      entries.regions.push(slot - 1);
      entries.areaFraction.push(area);
    }
  }
}
