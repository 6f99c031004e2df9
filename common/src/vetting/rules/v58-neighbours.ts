import { neighbouredSites } from '../neighbours';
import { placeOf } from '../place';
import type { Rule } from '../rule';
import { limitsOf, shown } from '../wording';

const LIMITS = { radiusKm: 1000, robustSigmas: 3, minNeighbours: 3, floorLog10: 0.15 };

/** Median absolute deviation to standard deviation of a normal distribution. */
const MAD_TO_SIGMA = 1.4826;

/**
 * A site's median flux beside those of its archive within 1000 km, in logarithms.
 *
 * Robust sigma is 1.4826 times the median absolute deviation, not below 0.15 (a factor of 1.4), for
 * a handful of sites may agree by chance. Cautions: sites of the file alone are compared, over all their ages.
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
    const { radiusKm, robustSigmas, minNeighbours, floorLog10 } = limitsOf(context, 'V58', LIMITS);
    for (const { site, log10Flux, neighbours: around } of neighbouredSites(
      context,
      Math.min(radiusKm, 1100),
    )) {
      if (around.length < minNeighbours) continue;
      const middle = median(around);
      const sigma = Math.max(
        floorLog10,
        MAD_TO_SIGMA * median(around.map((value) => Math.abs(value - middle))),
      );
      if (Math.abs(log10Flux - middle) <= robustSigmas * sigma) continue;
      yield {
        ...placeOf(context, site.rows[0]!, 'fluxGM2Yr'),
        subject: 'neighbours',
        message: `The median flux of ${site.name} is ${shown(10 ** log10Flux)} g m-2 yr-1; ${around.length} sites of its archive within ${radiusKm} km have ${shown(10 ** middle)}, within a factor of ${shown(10 ** (robustSigmas * sigma))}.`,
        remedy: 'Check the unit and position of the site, or waive it with a reason.',
        remedyKind: 'waive',
      };
    }
  },
};

function median(values: number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const half = sorted.length / 2;
  return (sorted[Math.ceil(half) - 1]! + sorted[Math.floor(half)]!) / 2;
}
