import { remarkedRows } from '../remarks';
import type { Rule } from '../rule';

/** Samples remarked as local: blown sand, slope wash, reworked loess. It reads remarks and nothing else. */
export const localMaterial: Rule = {
  id: 'V49',
  slug: 'local-material',
  title: 'Sample remarked as local material',
  severity: 'warning',
  stage: 'file',
  needs: ['remark'],
  source: 'common practice, no source',
  why: 'What came from the next slope or lake shore says nothing about the dust that crosses a region.',

  *check(context) {
    yield* remarkedRows(
      context,
      /\blocal|rework|umgelagert|slope ?wash|dune|\bsand\b|slump/i,
      (remark, row) => ({
        message: `Row ${row.row} is remarked "${remark}": its flux may be of local or reworked material.`,
        remedy: 'Leave the row out with a reason, or waive it if far-travelled dust was told apart.',
        remedyKind: 'waive',
      }),
    );
  },
};
