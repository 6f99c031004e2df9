import { bySheet, columnPlace } from '../place';
import type { Rule } from '../rule';

/** Densities are said to be measured, modelled or assumed; one value for all samples is an assumption. */
export const densityBasis: Rule = {
  id: 'V30',
  slug: 'density-basis',
  title: 'Origin of the density not stated',
  severity: 'warning',
  stage: 'submission',
  needs: ['densityGCm3', 'densityBasis'],
  source: 'common practice; assumed densities carry 10 to 15 % of error, from memory',
  why: 'An assumed density adds an error of its own to every flux, the same for all samples of a core.',

  *check(context) {
    const basis = context.metadata.densityBasis?.trim() ?? '';
    for (const [sheet, rows] of bySheet(context.rows)) {
      const densities = rows.flatMap((row) => (row.densityGCm3 === null ? [] : [row.densityGCm3]));
      if (densities.length === 0) continue;
      const place = columnPlace(context, sheet, 'densityGCm3');
      if (basis === '') {
        yield {
          ...place,
          message: `Sheet "${sheet}" gives ${densities.length} densities, and it is not said whether they are measured, modelled or assumed.`,
          remedy: 'Answer in the form: measured, modelled or assumed.',
          remedyKind: 'answer',
        };
      } else if (densities.length >= 5 && new Set(densities).size === 1 && !/assum|angenomm/i.test(basis)) {
        yield {
          ...place,
          subject: 'constant',
          message: `All ${densities.length} densities of sheet "${sheet}" are ${densities[0]} g cm-3, though they are said to be ${basis}.`,
          remedy: 'Answer "assumed" in the form if one value was taken for all, or waive it with a reason.',
          remedyKind: 'answer',
        };
      }
    }
  },
};
