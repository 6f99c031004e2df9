import type { SampleRow } from '../../dataset/sample-row';
import { limitsOf } from '../limits';
import { placeOf } from '../place';
import type { Rule } from '../rule';
import { archiveOf, countedRows } from '../samples';
import { shown } from '../wording';

const LIMITS = { tolerance: 0.05 };

/** 1 g cm⁻² kyr⁻¹ in g m⁻² yr⁻¹: 10⁴ cm² a square metre, 10³ years a kyr. */
const PER_CM2_KYR = 10;

/**
 * Where all its factors stand beside the flux, the flux equals their product:
 *
 *   flux [g m⁻² yr⁻¹] = 10 · sedimentation rate [cm kyr⁻¹] · dry bulk density [g cm⁻³] · dust fraction [1]
 */
export const fluxIdentity: Rule = {
  id: 'V37',
  slug: 'flux-identity',
  title: 'Flux differs from rate × density × fraction',
  severity: 'error',
  stage: 'file',
  needs: ['fluxGM2Yr', 'sedimentationRateCmKyr', 'densityGCm3', 'dustFraction'],
  source: 'definition of mass accumulation; tolerance: common practice, no source',
  why: 'The product catches every slip of a unit in any of its four columns.',
  limits: LIMITS,

  *check(context) {
    for (const row of countedRows(context)) {
      const { tolerance } = limitsOf(context, 'V37', LIMITS, archiveOf(context, row));
      const product = productOf(row);
      if (product === null || row.fluxGM2Yr === null) continue;
      if (Math.abs(row.fluxGM2Yr - product) <= tolerance * Math.abs(product)) continue;
      yield {
        ...placeOf(context, row, 'fluxGM2Yr'),
        message: `The flux is ${shown(row.fluxGM2Yr)} g m-2 yr-1, but rate × density × fraction gives ${shown(product)} (${shown(row.sedimentationRateCmKyr!)} cm/kyr × ${shown(row.densityGCm3!)} g cm-3 × ${shown(row.dustFraction!)}); they must agree within ${tolerance * 100} %.`,
        remedy:
          'Check the units of the four columns and type the right value, or leave the row out with a reason.',
        remedyKind: 'mend',
      };
    }
  },
};

function productOf({ sedimentationRateCmKyr, densityGCm3, dustFraction }: SampleRow): number | null {
  if (sedimentationRateCmKyr === null || densityGCm3 === null || dustFraction === null) return null;
  return PER_CM2_KYR * sedimentationRateCmKyr * densityGCm3 * dustFraction;
}
