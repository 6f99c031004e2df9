import type { SampleRow } from '../../dataset/sample-row';
import { unusualFlux } from '../flux-range';
import type { Rule } from '../rule';
import { archiveOf } from '../samples';
import { limitsOf } from '../limits';

const LIMITS = { min: 1e-4, max: 10, plateauMin: 1e-4, plateauMax: 3e-2, plateauFromM: 2500 };

/** Dust flux in ice, and the narrower range of the Antarctic plateau. */
export const fluxIce: Rule = {
  id: 'V33',
  slug: 'flux-ice',
  title: 'Flux unusual for ice',
  severity: 'warning',
  stage: 'submission',
  needs: ['fluxGM2Yr', 'archive'],
  source:
    'common practice, no source; Dome C lies about 4e-4 to 1e-2 g m-2 yr-1 (own arithmetic from Lambert et al. 2008)',
  why: 'Ice records span five decades, and slips of a thousand still look like numbers: only the place tells.',
  limits: LIMITS,

  *check(context) {
    const limits = limitsOf(context, 'V33', LIMITS, 'ice');
    for (const row of context.rows) {
      if (archiveOf(context, row) !== 'ice') continue;
      yield* onPlateau(row, limits.plateauFromM)
        ? unusualFlux(context, row, [limits.plateauMin, limits.plateauMax], 'the Antarctic plateau')
        : unusualFlux(context, row, [limits.min, limits.max], 'ice');
    }
  },
};

/** By elevation where it is given; else south of 75° S, inland of which little but the plateau was cored. */
function onPlateau({ latitudeDeg, elevationM }: SampleRow, fromM: number): boolean {
  if (latitudeDeg === null || latitudeDeg > -66) return false;
  return elevationM === null ? latitudeDeg <= -75 : elevationM >= fromM;
}
