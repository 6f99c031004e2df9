import { limitsOf } from '../limits';
import { opticalDepths } from '../optical-depth';
import { bySheet, columnPlace, numberOf } from '../place';
import type { Rule } from '../rule';
import { counted, firstFew } from '../wording';

const LIMITS = { minDays: 5 };

/** Means of fewer than five days or retrievals, where their number is given: said once a sheet. */
export const days: Rule = {
  id: 'V71',
  slug: 'days',
  title: 'Mean from too few days',
  severity: 'warning',
  stage: 'file',
  needs: ['aod', 'sampleCount'],
  source: 'common practice, no source',
  why: 'A few clear days do not stand for a month.',
  limits: LIMITS,

  *check(context) {
    const { minDays } = limitsOf(context, 'V71', LIMITS);
    const rows = opticalDepths(context).map(({ row }) => row);
    for (const [sheet, ofSheet] of bySheet(rows)) {
      const few = ofSheet.filter((row) => (numberOf(row, 'sampleCount') ?? minDays) < minDays);
      if (few.length === 0) continue;
      yield {
        ...columnPlace(context, sheet, 'sampleCount'),
        message: `On sheet "${sheet}", ${counted(few.length, 'mean')} of fewer than ${minDays} days or retrievals, in row ${firstFew(few.map(({ row }) => row))}.`,
        remedy: 'Leave these rows out with a reason, or waive it with a reason.',
        remedyKind: 'leave-out',
      };
    }
  },
};
