import type { SampleRow } from '../../dataset/sample-row';
import { unusualFlux } from '../flux-range';
import type { Rule } from '../rule';
import { archiveOf } from '../samples';
import { limitsOf } from '../limits';

const LIMITS = { min: 0.01, max: 100, nearSourcesMax: 1000 };

/** Dust flux to the open ocean; off Africa, Arabia and Asia more is believed. */
export const fluxMarine: Rule = {
  id: 'V34',
  slug: 'flux-marine',
  title: 'Flux unusual for the ocean',
  severity: 'warning',
  stage: 'submission',
  needs: ['fluxGM2Yr', 'archive'],
  source: 'common practice, no source',
  why: 'More than 100 g m-2 yr-1 far from a desert is mostly total sediment taken for dust.',
  limits: LIMITS,

  *check(context) {
    const { min, max, nearSourcesMax } = limitsOf(context, 'V34', LIMITS, 'marine');
    for (const row of context.rows) {
      if (archiveOf(context, row) !== 'marine') continue;
      yield* nearSources(row)
        ? unusualFlux(context, row, [min, nearSourcesMax], 'the ocean off the dust sources')
        : unusualFlux(context, row, [min, max], 'the open ocean');
    }
  },
};

/** A plain box round the seas off North Africa, Arabia and Asia: 10° S to 50° N, 30° W to 150° E. */
function nearSources({ latitudeDeg, longitudeDeg }: SampleRow): boolean {
  if (latitudeDeg === null || longitudeDeg === null) return false;
  const east = longitudeDeg > 180 ? longitudeDeg - 360 : longitudeDeg;
  return latitudeDeg >= -10 && latitudeDeg <= 50 && east >= -30 && east <= 150;
}
