import type { SampleRow } from '../../dataset/sample-row';
import { limitsOf } from '../limits';
import { columnPlace, groupBy, numberOf } from '../place';
import type { Rule } from '../rule';
import { archiveOf, valueOf } from '../samples';
import { sigmaField } from '../uncertainty';
import { counted, firstFew, shown } from '../wording';

const LIMITS = { min: 0.03, max: 3 };

/** Errors too small for the method or larger than the value: said once a column, with the rows. */
export const relativeUncertainty: Rule = {
  id: 'V55',
  slug: 'relative-uncertainty',
  title: 'Relative uncertainty implausible',
  severity: 'warning',
  stage: 'file',
  needs: ['fluxGM2Yr', 'fluxSigmaGM2Yr'],
  source: 'common practice, no source',
  why: 'An error below 3 % is mostly that of counting alone and gives the sample too much weight; one of 300 % is mostly a slip of columns.',
  limits: LIMITS,

  *check(context) {
    const field = sigmaField(context);
    const relative = (row: SampleRow): number | null => {
      const [value, sigma] = [valueOf(context, row), numberOf(row, field)];
      return value === null || sigma === null || value <= 0 || sigma <= 0 ? null : sigma / value;
    };
    const groups = groupBy(context.rows, (row) => `${row.sheet}\u0000${archiveOf(context, row) ?? ''}`);
    for (const rows of groups.values()) {
      const { sheet } = rows[0]!;
      const { min, max } = limitsOf(context, 'V55', LIMITS, archiveOf(context, rows[0]!));
      const small = rows.filter((row) => (relative(row) ?? min) < min);
      const large = rows.filter((row) => (relative(row) ?? max) > max);
      for (const [found, what] of [
        [small, `below ${min * 100} %`],
        [large, `above ${max * 100} %`],
      ] as const) {
        if (found.length === 0) continue;
        yield {
          ...columnPlace(context, sheet, field),
          subject: what,
          message: `On sheet "${sheet}", ${counted(found.length, 'standard error')} ${what} of the value (first ${shown(relative(found[0]!)! * 100)} %), in row ${firstFew(found.map((row) => row.row))}.`,
          remedy:
            'Check what the errors hold and that their column is the right one, or waive it with a reason.',
          remedyKind: 'waive',
        };
      }
    }
  },
};
