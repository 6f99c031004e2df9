import { placeOf, refusedHit } from '../place';
import type { Rule } from '../rule';
import { countedRows } from '../samples';
import { shown } from '../wording';

/**
 * The dust fraction is a share of the mass, 0 to 1.
 *
 * Limit of the check: the sum with carbonate, opal and organic matter is not tested, for no dataset kind
 * has columns for these.
 */
export const dustFraction: Rule = {
  id: 'V42',
  slug: 'dust-fraction',
  title: 'Dust fraction impossible',
  severity: 'error',
  stage: 'file',
  needs: ['dustFraction'],
  source: 'mass balance',
  why: 'A fraction above 1 is in per cent, and makes the flux a hundred times too large.',

  *check(context) {
    for (const row of countedRows(context)) {
      const refused = refusedHit(context, row, 'dustFraction', 'dust fraction');
      if (refused) yield refused;
      const fraction = row.dustFraction;
      if (fraction === null || (fraction >= 0 && fraction <= 1)) continue;
      yield {
        ...placeOf(context, row, 'dustFraction'),
        message: `The dust fraction is ${shown(fraction)}; it must lie within 0 to 1.`,
        remedy:
          'Set the unit of the column to % in the mapping if it is in per cent, or type the right value.',
        remedyKind: 'mend',
      };
    }
  },
};
