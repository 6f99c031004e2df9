import type { SampleRow } from '../../dataset/sample-row';
import type { VettingContext } from '../context';
import { coreKey, heldByCore } from '../held-values';
import { groupBy, placeOf } from '../place';
import type { Rule, RuleHit } from '../rule';
import { ageOf, countedRows, depthOf, siteKey, valueOf } from '../samples';
import { counted, shown } from '../wording';

/**
 * The same core, depth, age, quantity and size cut-off twice in one file; and with another value in Holdings,
 * said once a site and dataset (the same value there is for V56).
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
    yield* heldWithOtherValue(context, complete);
  },
};

function* heldWithOtherValue(context: VettingContext, rows: SampleRow[]): Iterable<RuleHit> {
  const held = heldByCore(context);
  if (held.size === 0) return;
  const pairs = rows.flatMap((row) => {
    const flux = row.fluxGM2Yr;
    const known = held.get(coreKey(row.site ?? '', row.quantity, row.sizeCutoff, ageOf(row)!)) ?? [];
    const other = known.find(({ fluxGM2Yr }) => flux !== null && !agree(flux, fluxGM2Yr));
    return other ? [{ row, other }] : [];
  });
  const groups = groupBy(
    pairs,
    ({ row, other }) => `${row.sheet}\u0000${siteKey(row.site!)}\u0000${other.datasetTitle}`,
  );
  for (const group of groups.values()) {
    const { row, other } = group[0]!;
    yield {
      ...placeOf(context, row, 'fluxGM2Yr'),
      subject: `held ${other.datasetTitle}`.slice(0, 100),
      message: `${counted(group.length, 'sample')} of ${row.site} in dataset "${other.datasetTitle}" with another value: at ${shown(other.ageKaBp)} ka BP ${shown(other.fluxGM2Yr)} g m-2 yr-1 there and ${describe(row)} here.`,
      remedy:
        'Keep the values of the newest age model: name the older dataset in the note, or leave these rows out with a reason.',
      remedyKind: 'leave-out',
    };
  }
}

/** To 2 %, as V56 calls two values the same. */
const agree = (a: number, b: number): boolean => Math.abs(a - b) <= 0.02 * Math.abs(b);

const describe = (row: SampleRow): string =>
  row.fluxGM2Yr === null ? 'no flux' : `${shown(row.fluxGM2Yr)} g m-2 yr-1`;

const sampleKey = (row: SampleRow): string =>
  [siteKey(row.site ?? ''), row.quantity, row.sizeCutoff ?? '', ageOf(row), depthOf(row) ?? ''].join(
    '\u0000',
  );
