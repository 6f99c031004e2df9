import type { SampleRow } from '../dataset/sample-row';
import type { HeldSample, VettingContext } from './context';
import { ageOf, siteKey } from './samples';

/** Values of Holdings in cells of position and age, so that a look-up reads 27 cells and never the whole list. */
export class HeldValues {
  private readonly cells = new Map<string, HeldSample[]>();

  /**
   * @param withinDeg half-width of the search in latitude and longitude [°]
   * @param withinKa half-width of the search in age [ka]
   */
  constructor(
    held: readonly HeldSample[],
    private readonly withinDeg: number,
    private readonly withinKa: number,
  ) {
    for (const one of held) {
      const key = this.key(one.latitudeDeg, one.longitudeDeg, one.ageKaBp, 0, 0, 0);
      const cell = this.cells.get(key);
      if (cell) cell.push(one);
      else this.cells.set(key, [one]);
    }
  }

  /** Held values of the same quantity and size cut-off near a sample in place and age. */
  *near(row: SampleRow): Iterable<HeldSample> {
    const age = ageOf(row);
    const { latitudeDeg, longitudeDeg } = row;
    if (age === null || latitudeDeg === null || longitudeDeg === null) return;
    for (const [dy, dx, dt] of AROUND) {
      for (const held of this.cells.get(this.key(latitudeDeg, longitudeDeg, age, dy, dx, dt)) ?? []) {
        const near =
          Math.abs(held.latitudeDeg - latitudeDeg) <= this.withinDeg &&
          Math.abs(eastward(held.longitudeDeg - longitudeDeg)) <= this.withinDeg &&
          Math.abs(held.ageKaBp - age) <= this.withinKa;
        if (near && held.quantity === row.quantity && sizeKey(held.sizeCutoff) === sizeKey(row.sizeCutoff))
          yield held;
      }
    }
  }

  private key(lat: number, lon: number, age: number, dy: number, dx: number, dt: number): string {
    const around = Math.max(1, Math.floor(360 / this.withinDeg));
    const column = Math.floor((((lon % 360) + 360) % 360) / this.withinDeg) + dx;
    return `${Math.floor(lat / this.withinDeg) + dy},${(column + around) % around},${Math.floor(age / this.withinKa) + dt}`;
  }
}

const STEPS = [-1, 0, 1];
const AROUND = STEPS.flatMap((dy) => STEPS.flatMap((dx) => STEPS.map((dt) => [dy, dx, dt] as const)));

const eastward = (degrees: number): number => (((((degrees % 360) + 540) % 360) + 360) % 360) - 180;

/** "bulk" and nothing said are the same; spaces and the sign of micro do not matter. */
const sizeKey = (size: string | null): string =>
  (size ?? 'bulk').toLowerCase().replace(/[\s_]/g, '').replace(/[µμ]/g, 'u');

/** Held values by core, quantity, size and age as compared exactly: the same sample in another version. */
export function heldByCore(context: VettingContext): Map<string, HeldSample[]> {
  const cores = new Map<string, HeldSample[]>();
  for (const held of context.heldSamples ?? []) {
    const key = coreKey(held.site, held.quantity, held.sizeCutoff, held.ageKaBp);
    const same = cores.get(key);
    if (same) same.push(held);
    else cores.set(key, [held]);
  }
  return cores;
}

/** Ages are compared to a year: beyond that, versions of one table round differently. */
export const coreKey = (site: string, quantity: string, size: string | null, ageKaBp: number): string =>
  [siteKey(site), quantity, sizeKey(size), Math.round(ageKaBp * 1000)].join('\u0000');
