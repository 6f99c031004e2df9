import type { SampleRow } from '../dataset/sample-row';
import { numberOf, textOf } from './place';
import { ageOf, depthOf, siteKey } from './samples';

export interface RowPairs {
  /** the same sample before and now */
  both: { before: SampleRow; now: SampleRow }[];
  added: SampleRow[];
  gone: SampleRow[];
}

/**
 * Which row of an upload is which row of the one before. Rows are paired by what names a sample, best first: core,
 * quantity, size, age and depth; its label; core and depth; core and age; place on the sheet. Rows with the same key are paired in
 * their order. Five look-ups a row, whatever the number of rows.
 */
export function pairRows(before: readonly SampleRow[], now: readonly SampleRow[]): RowPairs {
  const pairs: RowPairs = { both: [], added: [...now], gone: [...before] };
  for (const keyOf of KEYS) {
    const waiting = new Map<string, SampleRow[]>();
    for (const row of pairs.gone) {
      const key = keyOf(row);
      if (key === null) continue;
      const same = waiting.get(key);
      if (same) same.push(row);
      else waiting.set(key, [row]);
    }
    for (const queue of waiting.values()) queue.reverse();
    const paired = new Set<SampleRow>();
    for (const row of pairs.added) {
      const earlier = waiting.get(keyOf(row) ?? '')?.pop();
      if (!earlier) continue;
      pairs.both.push({ before: earlier, now: row });
      paired.add(row).add(earlier);
    }
    pairs.added = pairs.added.filter((row) => !paired.has(row));
    pairs.gone = pairs.gone.filter((row) => !paired.has(row));
  }
  return pairs;
}

const core = (row: SampleRow): string =>
  [siteKey(row.site ?? ''), row.quantity, row.sizeCutoff ?? ''].join('\u0000');

const KEYS: ((row: SampleRow) => string | null)[] = [
  (row) => [core(row), ageOf(row), depthOf(row)].join('\u0000'),
  (row) => joined(row, textOf(row, 'sampleId') ?? numberOf(row, 'sampleId')),
  (row) => joined(row, depthOf(row)),
  (row) => joined(row, ageOf(row)),
  (row) => [row.sheet, row.row, row.quantity].join('\u0000'),
];

const joined = (row: SampleRow, part: string | number | null): string | null =>
  part === null ? null : `${core(row)}\u0000${part}`;
