import { DomainError } from '../physical/domain-error';
import { regularGrid } from '../sphere/regular-grid';
import {
  landFraction2Deg,
  LAND_FRACTION_COLUMNS,
  LAND_FRACTION_STEP_DEG,
} from '../tables/land-fraction-2deg';

/**
 * Present-day share of land [0 to 1] of each cell of a regular grid. The table has cells of 2°; finer cells
 * take the value of the cell around them.
 *
 * @param stepDeg 2 or a step that divides 2° evenly
 * @throws DomainError for a coarser or uneven step
 *
 * Limits: present coastline and shelves; a glacial one has about 3 % more land (common knowledge, no source).
 */
export function landFraction(stepDeg: number): Float64Array {
  const table = landFraction2Deg();
  const split = LAND_FRACTION_STEP_DEG / stepDeg;
  if (!Number.isInteger(split)) {
    throw new DomainError('uneven-step', {
      field: 'stepDeg',
      value: stepDeg,
      unit: '°',
      allowed: '2, 1, 0.5 or 0.25',
    });
  }
  if (split === 1) return table;
  const { rows, columns } = regularGrid(stepDeg);
  return Float64Array.from({ length: rows * columns }, (_, cell) => {
    const row = Math.floor(Math.floor(cell / columns) / split);
    return table[row * LAND_FRACTION_COLUMNS + Math.floor((cell % columns) / split)]!;
  });
}
