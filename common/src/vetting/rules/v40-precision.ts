import { presentText } from '../cell-problems';
import { bySheet, columnPlace } from '../place';
import type { Rule } from '../rule';
import { counted, limitsOf, statements } from '../wording';

const LIMITS = { significantFigures: 5 };

/** More figures than a measurement has: mostly the output of a computation, or points read off a figure. */
export const precision: Rule = {
  id: 'V40',
  slug: 'precision',
  title: 'More figures than a measurement has',
  severity: 'note',
  stage: 'submission',
  needs: ['fluxGM2Yr'],
  source: 'common practice, no source',
  why: 'Many figures hint at recomputed or digitised values, whose origin a user wants to know.',
  limits: LIMITS,

  *check(context) {
    const { significantFigures } = limitsOf(context, 'V40', LIMITS);
    if (/digiti[sz]ed|from (a |the )?figure|recomputed|recalculated/i.test(statements(context))) return;
    for (const [sheet, rows] of bySheet(context.rows)) {
      const long = rows.filter(
        (row) => row.fluxGM2Yr !== null && figuresOf(row.cells.fluxGM2Yr) > significantFigures,
      );
      if (long.length === 0) continue;
      yield {
        ...columnPlace(context, sheet, 'fluxGM2Yr'),
        message: `On sheet "${sheet}", ${counted(long.length, 'flux value')} with more than ${significantFigures} significant figures, the first in row ${long[0]!.row}.`,
        remedy: 'Say in the method whether the values are measured, recomputed or digitised from a figure.',
        remedyKind: 'none',
      };
    }
  },
};

/** Significant figures as written; zeros before the first other digit do not count. */
function figuresOf(traced: Parameters<typeof presentText>[0] | undefined): number {
  const mantissa = traced ? presentText(traced).replace(/e.*$/i, '') : '';
  return mantissa.replace(/\D/g, '').replace(/^0+/, '').length;
}
