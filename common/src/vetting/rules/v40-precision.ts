import type { TracedValue } from '../../dataset/sample-row';
import { presentText } from '../cell-problems';
import { limitsOf } from '../limits';
import { columnPlace, groupBy } from '../place';
import type { Rule } from '../rule';
import { archiveOf } from '../samples';
import { counted, statements } from '../wording';

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
    if (/digiti[sz]ed|from (a |the )?figure|recomputed|recalculated/i.test(statements(context))) return;
    const groups = groupBy(context.rows, (row) => `${row.sheet}\u0000${archiveOf(context, row) ?? ''}`);
    for (const rows of groups.values()) {
      const { sheet } = rows[0]!;
      const { significantFigures } = limitsOf(context, 'V40', LIMITS, archiveOf(context, rows[0]!));
      const long = rows.filter(
        (row) => row.fluxGM2Yr !== null && significantFiguresOf(row.cells.fluxGM2Yr) > significantFigures,
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

/**
 * Significant figures of a value as the file writes it, not as it was converted: those of its first number alone,
 * without thousands separators, power of ten, uncertainty behind ± and unit. Zeros before the first other digit
 * do not count, nor those that end a number without decimal or thousands sign.
 */
function significantFiguresOf(traced: TracedValue | undefined): number {
  const number = /\d[\d.,'’\u00a0\u202f ]*/u.exec(traced ? presentText(traced) : '')?.[0] ?? '';
  const digits = number.replace(/\D/g, '').replace(/^0+/, '');
  return (/[.,]/.test(number) ? digits : digits.replace(/0+$/, '')).length;
}
