import { limitsOf } from '../limits';
import { neighbouredSites } from '../neighbours';
import { filePlace } from '../place';
import type { Rule } from '../rule';
import { counted, firstFew } from '../wording';

const LIMITS = { radiusKm: 1000, minNeighbours: 3 };

/** Says for which sites the comparison with neighbours could not be made. */
export const fewNeighbours: Rule = {
  id: 'V59',
  slug: 'few-neighbours',
  title: 'Too few neighbours to compare with',
  severity: 'note',
  stage: 'submission',
  needs: ['fluxGM2Yr', 'latitudeDeg', 'longitudeDeg', 'archive'],
  source: 'common practice, no source',
  why: 'No finding of V58 means nothing where V58 could not look.',
  limits: LIMITS,

  *check(context) {
    const { radiusKm, minNeighbours } = limitsOf(context, 'V59', LIMITS);
    const all = neighbouredSites(context, Math.min(radiusKm, 1100));
    const alone = all.filter(({ count }) => count < minNeighbours);
    if (alone.length === 0) return;
    yield {
      ...filePlace('fluxGM2Yr'),
      message: `Of ${counted(all.length, 'site')}, ${alone.length} with fewer than ${minNeighbours} neighbours of the same archive within ${radiusKm} km were not compared (${firstFew(alone.map(({ site }) => site.name))}).`,
      remedy: 'Nothing to do; look at these fluxes by eye.',
      remedyKind: 'none',
    };
  },
};
