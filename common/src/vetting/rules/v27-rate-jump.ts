import { limitsOf } from '../limits';
import { placeOf } from '../place';
import type { Rule } from '../rule';
import { archiveOf, cores } from '../samples';
import { sedimentationSteps } from '../sedimentation';
import { shown } from '../wording';

const LIMITS = { factor: 10 };

/** A jump of the sedimentation rate between neighbouring samples. */
export const rateJump: Rule = {
  id: 'V27',
  slug: 'rate-jump',
  title: 'Sedimentation rate jumps',
  severity: 'warning',
  stage: 'file',
  needs: ['sedimentationRateCmKyr'],
  source: 'common practice, no source',
  why: 'A jump of more than ten is mostly a tie point too close to the next or a gap in the record, and the flux jumps with it.',
  limits: LIMITS,

  *check(context) {
    for (const core of cores(context)) {
      const { factor } = limitsOf(context, 'V27', LIMITS, archiveOf(context, core[0]!));
      const steps = sedimentationSteps(core).filter(({ rateCmKyr }) => rateCmKyr > 0);
      for (const [i, { row, rateCmKyr, stated }] of steps.entries()) {
        const before = steps[i - 1];
        if (!before) continue;
        const jump = rateCmKyr / before.rateCmKyr;
        if (jump <= factor && jump >= 1 / factor) continue;
        yield {
          ...placeOf(context, row, stated ? 'sedimentationRateCmKyr' : 'depthM'),
          message: `The sedimentation rate goes from ${shown(before.rateCmKyr)} (row ${before.row.row}) to ${shown(rateCmKyr)} cm/kyr (row ${row.row}); a change of more than ${factor} times is unusual.`,
          remedy:
            'Check the tie points and name a gap in the record in the age model, or waive it with a reason.',
          remedyKind: 'waive',
        };
      }
    }
  },
};
