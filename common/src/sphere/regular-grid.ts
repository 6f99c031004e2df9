import { DomainError, requireWithin } from '../physical/domain-error';
import { cellAreaFraction } from './cell-area';

/**
 * Regular latitude–longitude grid. Rows run from the South Pole northwards, columns from 180° W eastwards;
 * cell index = row × columns + column.
 */
export interface RegularGrid {
  stepDeg: number;
  rows: number;
  columns: number;
  /** cell centres [°] */
  latitudesDeg: Float64Array;
  longitudesDeg: Float64Array;
  /** share of the sphere of one cell of each row, exact */
  cellAreaFraction: Float64Array;
}

const grids = new Map<number, RegularGrid>();

/**
 * @param stepDeg cell width and height [°], 0.25 to 30, a whole number of which makes 180°
 * @throws DomainError for another step
 */
export function regularGrid(stepDeg: number): RegularGrid {
  const known = grids.get(stepDeg);
  if (known) return known;
  const grid = buildGrid(stepDeg);
  grids.set(stepDeg, grid);
  return grid;
}

function buildGrid(stepDeg: number): RegularGrid {
  requireWithin('stepDeg', stepDeg, '°', 0.25, 30);
  const rows = Math.round(180 / stepDeg);
  if (Math.abs(rows * stepDeg - 180) > 1e-9) {
    throw new DomainError('uneven-step', {
      field: 'stepDeg',
      value: stepDeg,
      unit: '°',
      allowed: 'a step that divides 180° evenly, such as 2, 1 or 0.5',
    });
  }
  const columns = 2 * rows;
  const edge = (row: number) => -90 + row * stepDeg;
  return {
    stepDeg,
    rows,
    columns,
    latitudesDeg: Float64Array.from({ length: rows }, (_, row) => edge(row + 0.5)),
    longitudesDeg: Float64Array.from({ length: columns }, (_, column) => -180 + (column + 0.5) * stepDeg),
    cellAreaFraction: Float64Array.from({ length: rows }, (_, row) =>
      cellAreaFraction({
        westDeg: 0,
        eastDeg: stepDeg,
        southDeg: edge(row),
        northDeg: Math.min(90, edge(row + 1)),
      }),
    ),
  };
}
