import { remarkedRows } from '../remarks';
import type { Rule } from '../rule';

/**
 * Samples remarked as holding volcanic ash.
 *
 * Limit of the check: it reads remarks; cores near volcanic arcs are not recognised by position.
 */
export const volcanicAsh: Rule = {
  id: 'V48',
  slug: 'volcanic-ash',
  title: 'Sample remarked as volcanic ash',
  severity: 'warning',
  stage: 'file',
  needs: ['remark'],
  source: 'common practice, no source',
  why: 'A tephra layer counts as dust in every method that weighs or counts particles.',

  *check(context) {
    yield* remarkedRows(context, /tephra|volcan|vulkan|\bash\b|\basche\b|cendre|ceniza/i, (remark, row) => ({
      message: `Row ${row.row} is remarked "${remark}": its flux may hold volcanic ash.`,
      remedy: 'Leave the row out with a reason, or waive it if the ash was taken out.',
      remedyKind: 'waive',
    }));
  },
};
