import { limitsOf } from '../limits';
import { neighbouredSites } from '../neighbours';
import { placeOf } from '../place';
import type { Rule } from '../rule';
import { archiveOf } from '../samples';
import { shown } from '../wording';

const LIMITS = { radiusKm: 1000, robustSigmas: 3, minNeighbours: 3, floorLog10: 0.15 };

/** Median absolute deviation to standard deviation of a normal distribution. */
const MAD_TO_SIGMA = 1.4826;

/**
 * A site's median flux beside those of its archive within 1000 km, in logarithms.
 *
 * Robust sigma is 1.4826 times the median absolute deviation, not below 0.15 (a factor of 1.4), for
 * a handful of sites may agree by chance. Sites of the file and of Holdings are compared, over all their ages;
 * of more than 16 sites in a cell of 10° an even choice stands for all. The radius is one for all archives.
 */
export const neighbours: Rule = {
  id: 'V58',
  slug: 'neighbours',
  title: 'Flux far from that of neighbouring sites',
  severity: 'warning',
  stage: 'submission',
  needs: ['fluxGM2Yr', 'latitudeDeg', 'longitudeDeg', 'archive'],
  source: 'common practice, no source; median absolute deviation after Hampel 1974, from memory',
  why: 'Dust falls in wide smooth patterns: a site ten times above all around it has a slip or local dust.',
  limits: LIMITS,

  *check(context) {
    const { radiusKm } = limitsOf(context, 'V58', LIMITS);
    for (const one of neighbouredSites(context, Math.min(radiusKm, 1100))) {
      const { site, log10Flux, count, medianLog10, deviationLog10 } = one;
      const limits = limitsOf(context, 'V58', LIMITS, archiveOf(context, site.rows[0]!));
      if (count < limits.minNeighbours) continue;
      const reach = limits.robustSigmas * Math.max(limits.floorLog10, MAD_TO_SIGMA * deviationLog10);
      if (Math.abs(log10Flux - medianLog10) <= reach) continue;
      yield {
        ...placeOf(context, site.rows[0]!, 'fluxGM2Yr'),
        subject: 'neighbours',
        message: `The median flux of ${site.name} is ${shown(10 ** log10Flux)} g m-2 yr-1; ${count} sites of its archive within ${radiusKm} km have ${shown(10 ** medianLog10)}, within a factor of ${shown(10 ** reach)}.`,
        remedy: 'Check the unit and position of the site, or waive it with a reason.',
        remedyKind: 'waive',
      };
    }
  },
};
