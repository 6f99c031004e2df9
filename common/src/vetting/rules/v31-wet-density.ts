import { limitsOf } from '../limits';
import { bySheet, columnPlace } from '../place';
import type { Rule } from '../rule';
import { archiveOf } from '../samples';
import { counted, shown } from '../wording';

const LIMITS = { wetFromGCm3: 1.5 };

/** Marine mud of a high density was probably weighed wet. */
export const wetDensity: Rule = {
  id: 'V31',
  slug: 'wet-density',
  title: 'Density looks like that of wet sediment',
  severity: 'warning',
  stage: 'submission',
  needs: ['densityGCm3', 'archive'],
  source: 'common practice, no source',
  why: 'Wet bulk density counts the pore water as sediment and doubles the flux or worse.',
  limits: LIMITS,

  *check(context) {
    const { wetFromGCm3 } = limitsOf(context, 'V31', LIMITS, 'marine');
    for (const [sheet, rows] of bySheet(context.rows)) {
      const wet = rows.filter(
        (row) => (row.densityGCm3 ?? 0) > wetFromGCm3 && archiveOf(context, row) === 'marine',
      );
      if (wet.length === 0) continue;
      yield {
        ...columnPlace(context, sheet, 'densityGCm3'),
        message: `In marine mud of sheet "${sheet}", ${counted(wet.length, 'density value')} above ${wetFromGCm3} g cm-3 (first ${shown(wet[0]!.densityGCm3!)} in row ${wet[0]!.row}) look like wet density.`,
        remedy: 'Map the column of the dry bulk density, or waive it with a reason.',
        remedyKind: 'waive',
      };
    }
  },
};
