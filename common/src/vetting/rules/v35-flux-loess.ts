import { unusualFlux } from '../flux-range';
import { limitsOf } from '../limits';
import { placeOf } from '../place';
import type { Rule } from '../rule';
import { archiveOf } from '../samples';
import { shown } from '../wording';

const LIMITS = { min: 5, max: 1000, impossible: 20000 };

/** Mass accumulation of loess; beyond the greatest published rates it is a fault of units. */
export const fluxLoess: Rule = {
  id: 'V35',
  slug: 'flux-loess',
  title: 'Flux unusual for loess',
  severity: 'warning',
  stage: 'submission',
  needs: ['fluxGM2Yr', 'archive'],
  source: 'Roberts et al. 2003 (western Nebraska, above 10^4 g m-2 yr-1), from memory',
  why: 'Loess piles up fast close to rivers and ice; more than 20000 g m-2 yr-1 has not been published.',
  limits: LIMITS,

  *check(context) {
    const { min, max, impossible } = limitsOf(context, 'V35', LIMITS, 'loess');
    for (const row of context.rows) {
      if (archiveOf(context, row) !== 'loess') continue;
      if (row.quantity === 'dust' && (row.fluxGM2Yr ?? 0) > impossible) {
        yield {
          ...placeOf(context, row, 'fluxGM2Yr'),
          severity: 'error',
          message: `The flux is ${shown(row.fluxGM2Yr!)} g m-2 yr-1; in loess it must not exceed ${impossible}.`,
          remedy: 'Type the right value or unit, or leave the row out with a reason.',
          remedyKind: 'mend',
        };
      } else yield* unusualFlux(context, row, [min, max], 'loess');
    }
  },
};
