import type { SampleRow } from '../../dataset/sample-row';
import type { VettingContext } from '../context';
import { placeOf } from '../place';
import type { Rule, Severity } from '../rule';
import { ageOf, archiveOf, cores, depthOf } from '../samples';
import { shown } from '../wording';

/**
 * In one core a deeper sample is not younger than the one above it.
 * Ice flow and lake slumps do turn layers over: with a stated age model these archives get a warning.
 */
export const ageOrder: Rule = {
  id: 'V17',
  slug: 'age-order',
  title: 'Age falls with depth',
  severity: 'error',
  stage: 'submission',
  needs: ['ageKaBp', 'depthM'],
  source: 'law of superposition (Steno 1669), from memory',
  why: 'Where age falls with depth, the sedimentation rate is negative and the flux means nothing.',

  *check(context) {
    for (const core of cores(context)) {
      const dated = core.filter((row) => ageOf(row) !== null && depthOf(row) !== null);
      dated.sort((a, b) => depthOf(a)! - depthOf(b)! || ageOf(a)! - ageOf(b)!);
      let above: SampleRow | undefined; // the oldest so far
      for (const row of dated) {
        if (above && ageOf(row)! < ageOf(above)! && depthOf(row)! > depthOf(above)!) {
          const severity = severityOf(context, row);
          yield {
            ...placeOf(context, row, row.ageKaBp === null ? 'ageYoungKaBp' : 'ageKaBp'),
            severity,
            message: `The age is ${shown(ageOf(row)!)} ka BP at ${shown(depthOf(row)!)} m, but ${shown(ageOf(above)!)} ka BP stands above it at ${shown(depthOf(above)!)} m (row ${above.row}).`,
            remedy:
              'Correct the age or the depth, or leave the row out with a reason; for ice and lakes, say in the age model why the order is reversed.',
            remedyKind: severity === 'error' ? 'mend' : 'waive',
          };
        } else above = row;
      }
    }
  },
};

function severityOf(context: VettingContext, row: SampleRow): Severity {
  const archive = archiveOf(context, row);
  const mayTurn = archive === 'ice' || archive === 'lake';
  return mayTurn && context.metadata.ageModel?.trim() ? 'warning' : 'error';
}
