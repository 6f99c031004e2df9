import type { SampleRow } from '../../dataset/sample-row';
import type { VettingContext } from '../context';
import { limitsOf } from '../limits';
import { columnPlace, groupBy } from '../place';
import type { Rule } from '../rule';
import { archiveOf } from '../samples';
import { shown } from '../wording';

/**
 * Usual size of a median flux by archive [g m⁻² yr⁻¹], from memory: middle, on a log scale, of the ranges of
 * V33 to V36; ice is parted because Antarctica gets some twenty times less than Greenland.
 */
const LIMITS = { iceAntarctica: 0.003, ice: 0.03, marine: 1, loess: 150, peat: 5, lake: 5, log10Width: 1.5 };
type Group = Exclude<keyof typeof LIMITS, 'log10Width'>;

/** The median of a flux column lies far from what its archive gives: a slip of 10 or 1000 in the unit. */
export const columnMedian: Rule = {
  id: 'V07',
  slug: 'column-median',
  title: 'Median flux far from that of the archive',
  severity: 'warning',
  stage: 'submission',
  needs: ['fluxGM2Yr', 'archive'],
  source: 'common practice, no source; medians from memory',
  why: 'Slips of a factor 10 or 1000 in the unit are the most frequent fault of submitted fluxes and leave every single value plausible.',
  limits: LIMITS,

  *check(context) {
    const positive = context.rows.filter((row) => (row.fluxGM2Yr ?? 0) > 0 && row.quantity === 'dust');
    const groups = groupBy(positive, (row) => `${row.sheet}\u0000${groupOf(context, row) ?? ''}`);
    for (const rows of groups.values()) {
      const group = groupOf(context, rows[0]!);
      if (group === null || rows.length < 3) continue;
      const limits = limitsOf(context, 'V07', LIMITS, archiveOf(context, rows[0]!));
      const median = middle(rows.map((row) => row.fluxGM2Yr!));
      const slip = Math.log10(median / limits[group]);
      if (Math.abs(slip) <= limits.log10Width) continue;
      yield {
        ...columnPlace(context, rows[0]!.sheet, 'fluxGM2Yr'),
        subject: group,
        message: `The median of ${rows.length} fluxes (${group}) is ${shown(median)} g m-2 yr-1; about ${limits[group]} is usual, within a factor of ${shown(10 ** limits.log10Width)}.`,
        remedy: `Check the unit of the column (a slip would be of about ${shown(10 ** Math.round(slip))}), or waive it with a reason.`,
        remedyKind: 'waive',
      };
    }
  },
};

function groupOf(context: VettingContext, row: SampleRow): Group | null {
  const archive = archiveOf(context, row);
  if (archive === 'ice') return row.latitudeDeg !== null && row.latitudeDeg < -60 ? 'iceAntarctica' : 'ice';
  return archive === null || archive === 'other' ? null : archive;
}

function middle(values: number[]): number {
  const sorted = values.sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)]!;
}
