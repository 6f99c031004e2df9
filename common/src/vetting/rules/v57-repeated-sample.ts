import type { SampleRow } from '../../dataset/sample-row';
import { groupBy, placeOf } from '../place';
import type { Rule } from '../rule';
import { ageOf, countedRows, depthOf, siteKey, valueOf } from '../samples';
import { shown } from '../wording';

/**
 * The same core, depth, age, quantity and size cut-off twice in one file.
 *
 * Limit of the check: it looks within the file; the same core in two datasets is for V56, with Holdings.
 */
export const repeatedSample: Rule = {
  id: 'V57',
  slug: 'repeated-sample',
  title: 'Sample given twice',
  severity: 'warning',
  stage: 'file',
  needs: ['site', 'ageKaBp', 'fluxGM2Yr'],
  source: 'common practice, no source',
  why: 'A sample that stands twice counts twice; with two values, one of them is from an older age model or a slip.',

  *check(context) {
    if (context.kind === 'point-optical-depth') return; // one station has many days, and dates are not compared here
    const complete = countedRows(context).filter((row) => row.site !== null && ageOf(row) !== null);
    for (const rows of groupBy(complete, sampleKey).values()) {
      const first = rows[0]!;
      for (const row of rows.slice(1)) {
        const same = valueOf(context, row) === valueOf(context, first);
        const values = same ? 'the same flux' : `${describe(row)} here and ${describe(first)} there`;
        yield {
          ...placeOf(context, row, 'fluxGM2Yr'),
          message: `Row ${row.row} repeats row ${first.row} of sheet "${first.sheet}" (${first.site}, ${shown(ageOf(first)!)} ka BP) with ${values}.`,
          remedy:
            'Leave one of the rows out with a reason (keep the newest age model), or waive it if both are measurements.',
          remedyKind: 'leave-out',
        };
      }
    }
  },
};

const describe = (row: SampleRow): string =>
  row.fluxGM2Yr === null ? 'no flux' : `${shown(row.fluxGM2Yr)} g m-2 yr-1`;

const sampleKey = (row: SampleRow): string =>
  [siteKey(row.site ?? ''), row.quantity, row.sizeCutoff ?? '', ageOf(row), depthOf(row) ?? ''].join(
    '\u0000',
  );
