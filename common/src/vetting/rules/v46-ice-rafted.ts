import { limitsOf } from '../limits';
import { marineRows } from '../marine';
import { groupBy, placeOf } from '../place';
import type { Rule } from '../rule';
import { statements } from '../wording';
import type { SampleRow } from '../../dataset/sample-row';

const LIMITS = { northFromDeg: 40, southFromDeg: -45 };
const IRD = /ice[\s-]*rafted|\bIRD\b|eisfracht/i;

/** North Atlantic and Southern Ocean cores say what was done about ice-rafted debris. */
export const iceRafted: Rule = {
  id: 'V46',
  slug: 'ice-rafted',
  title: 'Ice-rafted debris not spoken of',
  severity: 'warning',
  stage: 'submission',
  needs: ['latitudeDeg', 'longitudeDeg', 'archive', 'note'],
  source: 'flagged in global compilations; latitudes: common practice, no source',
  why: 'Icebergs drop sand and silt that a chemical or weighed dust flux counts as dust.',
  limits: LIMITS,

  *check(context) {
    if (IRD.test(statements(context))) return;
    const limits = limitsOf(context, 'V46', LIMITS, 'marine');
    const exposed = marineRows(context).filter((row) => isExposed(row, limits));
    for (const rows of groupBy(exposed, (row) => `${row.sheet}\u0000${row.site ?? ''}`).values()) {
      if (rows.some((row) => IRD.test(row.remark ?? ''))) continue;
      const first = rows[0]!;
      yield {
        ...placeOf(context, first, 'site'),
        message: `${first.site ?? 'A core'} at ${first.latitudeDeg}°, ${first.longitudeDeg}° lies where icebergs melt, and ice-rafted debris is not spoken of.`,
        remedy:
          'Say in the method or the note how ice-rafted debris was taken out, or waive it with a reason.',
        remedyKind: 'answer',
      };
    }
  },
};

/** North Atlantic: 80° W to 20° E. */
function isExposed({ latitudeDeg, longitudeDeg }: SampleRow, limits: typeof LIMITS): boolean {
  if (latitudeDeg === null || longitudeDeg === null) return false;
  const east = longitudeDeg > 180 ? longitudeDeg - 360 : longitudeDeg;
  return latitudeDeg < limits.southFromDeg || (latitudeDeg > limits.northFromDeg && east > -80 && east < 20);
}
