import { RADIANS } from '../physical/constants';

/** Half the circumference along a degree of latitude is 10 000 km per 90°; a band of 10° is 1112 km. */
const BAND_DEG = 10;
const BANDS = 180 / BAND_DEG;
/** Of more places in a cell an even choice stands for all: with nine cells looked at, the work for a site is bounded. */
const MOST_A_CELL = 16;

interface Place {
  latitudeDeg: number;
  longitudeDeg: number;
  archive: string;
}

/**
 * Puts places of each archive in cells of 10° latitude by longitude at least as wide; each cell is thinned.
 *
 * @returns for a place, the cells of its archive that hold all of its archive within 1100 km
 */
export function thinnedCells<T extends Place>(places: readonly T[]): (place: Place) => Iterable<T[]> {
  const cells = new Map<string, T[]>();
  for (const place of places) {
    const band = bandOf(place);
    const key = cellKey(place.archive, band, columnOf(place, band));
    const cell = cells.get(key);
    if (cell) cell.push(place);
    else cells.set(key, [place]);
  }
  for (const [key, cell] of cells) cells.set(key, thinned(cell));
  return function* (place) {
    for (const [band, column] of cellsAround(place)) {
      const cell = cells.get(cellKey(place.archive, band, column));
      if (cell) yield cell;
    }
  };
}

function thinned<T>(cell: T[]): T[] {
  const stride = Math.ceil(cell.length / MOST_A_CELL);
  return stride === 1 ? cell : cell.filter((_, index) => index % stride === 0);
}

const bandOf = (place: Place): number => Math.min(BANDS - 1, Math.floor((place.latitudeDeg + 90) / BAND_DEG));

/** Cells of a band, each at least as wide as the band is high at its edge nearer to a pole; one for the polar caps. */
function columnsOf(band: number): number {
  const poleward = Math.max(Math.abs(band * BAND_DEG - 90), Math.abs((band + 1) * BAND_DEG - 90));
  return Math.max(1, Math.floor((360 / BAND_DEG) * Math.cos(poleward * RADIANS)));
}

const columnOf = (place: Place, band: number): number =>
  Math.floor(((((place.longitudeDeg % 360) + 360) % 360) / 360) * columnsOf(band)) % columnsOf(band);

const cellKey = (archive: string, band: number, column: number): string => `${archive},${band},${column}`;

function* cellsAround(place: Place): Iterable<[number, number]> {
  const own = bandOf(place);
  for (const band of [own - 1, own, own + 1]) {
    if (band < 0 || band >= BANDS) continue;
    const columns = columnsOf(band);
    const middle = columnOf(place, band);
    for (const column of new Set([-1, 0, 1].map((step) => (middle + step + columns) % columns)))
      yield [band, column];
  }
}
