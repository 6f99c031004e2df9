import { bySheet, columnPlace } from '../place';
import type { Rule } from '../rule';
import { counted } from '../wording';

/** Where some values of a column are marked as below detection, its zeros were probably below it too. */
export const belowDetection: Rule = {
  id: 'V39',
  slug: 'below-detection',
  title: 'Zeros beside values below detection',
  severity: 'warning',
  stage: 'file',
  needs: ['fluxGM2Yr'],
  source: 'common practice, no source',
  why: 'A value below detection is known to be small, not to be nothing; set to zero it drags the mean down.',

  *check(context) {
    for (const [sheet, rows] of bySheet(context.rows)) {
      const marked = rows.filter((row) => row.cells.fluxGM2Yr?.belowDetection);
      const zeros = rows.filter((row) => row.fluxGM2Yr === 0 && !row.cells.fluxGM2Yr?.belowDetection);
      if (marked.length === 0 || zeros.length === 0) continue;
      yield {
        ...columnPlace(context, sheet, 'fluxGM2Yr'),
        message: `The fluxes of sheet "${sheet}" hold ${counted(marked.length, 'value')} marked as below detection and ${counted(zeros.length, 'plain zero')}, the first in row ${zeros[0]!.row}.`,
        remedy: 'Type the detection limit over the zeros, as in "<0.02", or waive it if zero was measured.',
        remedyKind: 'waive',
      };
    }
  },
};
