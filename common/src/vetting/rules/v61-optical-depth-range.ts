import { limitsOf } from '../limits';
import { opticalDepths } from '../optical-depth';
import { placeOf, refusedHit } from '../place';
import type { Rule } from '../rule';
import { shown } from '../wording';

const LIMITS = { noiseMin: -0.05, unusual: 3, max: 5 };

/** Optical depth of −0.05 (noise of the retrieval) to 5; above 3 is unusual for a mean. */
export const opticalDepthRange: Rule = {
  id: 'V61',
  slug: 'optical-depth-range',
  title: 'Optical depth impossible or unusual',
  severity: 'error',
  stage: 'file',
  needs: ['aod'],
  source: 'limits of retrievals: common practice, no source',
  why: 'Beyond 5 no retrieval sees the ground; a strongly negative value is a code or a wrong column.',
  limits: LIMITS,

  *check(context) {
    const { noiseMin, unusual, max } = limitsOf(context, 'V61', LIMITS);
    for (const row of context.kind === 'point-optical-depth' ? context.rows : []) {
      const refused = refusedHit(context, row, 'aod', 'optical depth');
      if (refused) yield refused;
    }
    for (const { row, opticalDepth } of opticalDepths(context)) {
      if (opticalDepth >= noiseMin && opticalDepth <= unusual) continue;
      const impossible = opticalDepth < noiseMin || opticalDepth > max;
      yield {
        ...placeOf(context, row, 'aod'),
        severity: impossible ? 'error' : 'warning',
        message: `The optical depth is ${shown(opticalDepth)}; ${impossible ? `it must lie within ${noiseMin} to ${max}` : `more than ${unusual} is unusual for a mean`}.`,
        remedy: impossible
          ? 'Type the right value over it, or leave the row out with a reason.'
          : 'Check the value, or waive it with a reason.',
        remedyKind: impossible ? 'mend' : 'waive',
      };
    }
  },
};
