import type { SampleRow } from '../../dataset/sample-row';
import type { HeldSample } from '../context';
import { HeldValues } from '../held-values';
import { limitsOf } from '../limits';
import { groupBy, placeOf } from '../place';
import type { Rule } from '../rule';
import { countedRows, siteKey } from '../samples';
import { counted, shown } from '../wording';

const LIMITS = { withinDeg: 0.05, withinKa: 0.5, relative: 0.02 };

/**
 * Samples whose place, age and flux Holdings have already, under this or another name: said once a site and dataset.
 *
 * Limit of the check: without the bounds of a slice, ages within half a millennium count as the same slice.
 */
export const heldDuplicates: Rule = {
  id: 'V56',
  slug: 'held-duplicates',
  title: 'Same sample already in another compilation',
  severity: 'warning',
  stage: 'holdings',
  needs: ['site', 'ageKaBp', 'fluxGM2Yr', 'heldSamples'],
  source: 'common practice, no source',
  why: 'One core in two compilations counts twice in every regional mean.',
  limits: LIMITS,

  *check(context) {
    if (!context.heldSamples?.length) return;
    const { withinDeg, withinKa, relative } = limitsOf(context, 'V56', LIMITS);
    const held = new HeldValues(context.heldSamples, withinDeg, withinKa);
    const pairs: Pair[] = [];
    for (const row of countedRows(context)) {
      const flux = row.fluxGM2Yr;
      if (flux === null) continue;
      for (const other of held.near(row)) {
        if (Math.abs(flux - other.fluxGM2Yr) > relative * Math.abs(other.fluxGM2Yr)) continue;
        pairs.push({ row, other });
        break;
      }
    }
    for (const group of groupBy(pairs, pairKey).values()) {
      const { row, other } = group[0]!;
      yield {
        ...placeOf(context, row, 'fluxGM2Yr'),
        subject: `${siteKey(other.site)} ${other.datasetTitle}`.slice(0, 100),
        message: `Dataset "${other.datasetTitle}" has ${counted(group.length, 'value')} of ${row.site ?? 'this place'} already as "${other.site}", the first at ${shown(other.ageKaBp)} ka BP with ${shown(other.fluxGM2Yr)} g m-2 yr-1.`,
        remedy: 'Leave these rows out with a reason, or waive it if both datasets are never used together.',
        remedyKind: 'leave-out',
      };
    }
  },
};

interface Pair {
  row: SampleRow;
  other: HeldSample;
}

const pairKey = ({ row, other }: Pair): string =>
  [row.sheet, siteKey(row.site ?? ''), other.datasetTitle, siteKey(other.site)].join('\u0000');
