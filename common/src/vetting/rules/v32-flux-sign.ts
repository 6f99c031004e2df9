import { isRefusedNegative } from '../cell-problems';
import { placeOf, refusedHit } from '../place';
import type { Rule } from '../rule';
import { countedRows } from '../samples';
import { shown } from '../wording';

/** A deposition flux is not negative; an exact zero is mostly a value below detection. */
export const fluxSign: Rule = {
  id: 'V32',
  slug: 'flux-sign',
  title: 'Flux is negative or exactly zero',
  severity: 'error',
  stage: 'file',
  needs: ['fluxGM2Yr'],
  source: 'physical: deposition adds mass',
  why: 'A negative flux is a code or a slip; a zero has no logarithm and pulls means down where the truth is "below detection".',

  *check(context) {
    for (const row of countedRows(context)) {
      const refused = isRefusedNegative(row.cells.fluxGM2Yr) && refusedHit(context, row, 'fluxGM2Yr', 'flux');
      if (refused) yield refused;
      const flux = row.fluxGM2Yr;
      if (flux === null || flux > 0) continue;
      const negative = flux < 0;
      if (!negative && row.cells.fluxGM2Yr?.belowDetection) continue;
      yield {
        ...placeOf(context, row, 'fluxGM2Yr'),
        severity: negative ? 'error' : 'warning',
        message: negative
          ? `The flux is ${shown(flux)} g m-2 yr-1; it must not be negative.`
          : 'The flux is exactly 0 g m-2 yr-1; it may stand for a value below detection.',
        remedy: negative
          ? 'Type the right value over it, or leave the row out with a reason.'
          : 'Type the detection limit as in "<0.02", or waive it if zero was measured.',
        remedyKind: negative ? 'mend' : 'waive',
      };
    }
  },
};
