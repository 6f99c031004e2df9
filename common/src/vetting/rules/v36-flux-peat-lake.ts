import { unusualFlux } from '../flux-range';
import type { Rule } from '../rule';
import { archiveOf } from '../samples';
import { limitsOf } from '../limits';

const LIMITS = { min: 0.1, max: 300 };

/** Dust flux in peat and lakes. */
export const fluxPeatLake: Rule = {
  id: 'V36',
  slug: 'flux-peat-lake',
  title: 'Flux unusual for peat or lake',
  severity: 'warning',
  stage: 'submission',
  needs: ['fluxGM2Yr', 'archive'],
  source: 'common practice, no source',
  why: 'Beyond this range the mineral matter of a bog or lake is mostly washed in, or its unit is wrong.',
  limits: LIMITS,

  *check(context) {
    for (const row of context.rows) {
      const archive = archiveOf(context, row);
      if (archive !== 'peat' && archive !== 'lake') continue;
      const { min, max } = limitsOf(context, 'V36', LIMITS, archive);
      yield* unusualFlux(context, row, [min, max], archive);
    }
  },
};
