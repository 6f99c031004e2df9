import { limitsOf } from '../limits';
import { placeOf, refusedHit } from '../place';
import type { Rule } from '../rule';
import { archiveOf, countedRows } from '../samples';
import { shown } from '../wording';

const LIMITS = {
  min: 0.2,
  max: 2.7,
  peatMin: 0.02,
  peatMax: 0.4,
  loessMin: 1,
  loessMax: 1.9,
  marineMin: 0.2,
  marineMax: 1.6,
  lakeMin: 0.05,
  lakeMax: 1.8,
};

/**
 * Dry bulk density [g cm⁻³]: never beyond solid quartz, nor below 0.2 save for peat and lake mud,
 * whose own lower bounds stand instead; and within what is usual for its archive.
 */
export const densityRange: Rule = {
  id: 'V29',
  slug: 'density-range',
  title: 'Dry bulk density impossible or unusual',
  severity: 'error',
  stage: 'submission',
  needs: ['densityGCm3'],
  source: 'physical bounds (quartz 2.65 g cm-3, from memory); ranges by archive: common practice, no source',
  why: 'The flux is proportional to the density; values in kg m-3 or of wet sediment are the usual slips.',
  limits: LIMITS,

  *check(context) {
    for (const row of countedRows(context)) {
      const refused = refusedHit(context, row, 'densityGCm3', 'dry bulk density');
      if (refused) yield refused;
      const density = row.densityGCm3;
      if (density === null) continue;
      const archive = archiveOf(context, row);
      const limits = limitsOf(context, 'V29', LIMITS, archive);
      const own = archive === null || archive === 'ice' || archive === 'other' ? null : archive;
      const floor = own === null ? limits.min : Math.min(limits.min, limits[`${own}Min`]);
      const [min, max] = own === null ? [limits.min, limits.max] : [limits[`${own}Min`], limits[`${own}Max`]];
      const impossible = density < floor || density > limits.max;
      if (!impossible && density >= min && density <= max) continue;
      yield {
        ...placeOf(context, row, 'densityGCm3'),
        severity: impossible ? 'error' : 'warning',
        message: `The dry bulk density is ${shown(density)} g cm-3; ${impossible ? `it must lie within ${floor} to ${limits.max}` : `${min} to ${max} is usual for ${archive}`} g cm-3.`,
        remedy: impossible
          ? 'Check the unit (kg m-3 is 1000 times more) and type the right value, or leave the row out with a reason.'
          : 'Check that it is the dry density, or waive it with a reason.',
        remedyKind: impossible ? 'mend' : 'waive',
      };
    }
  },
};
