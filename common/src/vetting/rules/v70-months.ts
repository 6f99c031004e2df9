import { monthOfDate } from '../../units/month';
import { limitsOf } from '../limits';
import { opticalDepths } from '../optical-depth';
import { groupBy, placeOf, textOf } from '../place';
import type { Rule } from '../rule';
import { siteKey } from '../samples';
import { statements } from '../wording';

const LIMITS = { minMonths: 9 };

/**
 * Optical depths of a site from fewer than nine months of the year, without a word on the season: said once a site.
 *
 * Limit of the check: months are told from the dates; a site with years alone is not asked.
 */
export const months: Rule = {
  id: 'V70',
  slug: 'months',
  title: 'Annual mean from fewer than nine months',
  severity: 'warning',
  stage: 'submission',
  needs: ['aod', 'date'],
  source: 'common practice, no source',
  why: 'Dust is seasonal: half a year may hold nearly all or hardly any of it.',
  limits: LIMITS,

  *check(context) {
    const { minMonths } = limitsOf(context, 'V70', LIMITS);
    if (/season|spring|summer|autumn|winter|monthly|saison|\b(DJF|MAM|JJA|SON)\b/i.test(statements(context)))
      return;
    const rows = opticalDepths(context).map(({ row }) => row);
    for (const ofSite of groupBy(rows, (row) => siteKey(row.site ?? '')).values()) {
      const given = ofSite.map((row) => monthOfDate(textOf(row, 'date') ?? ''));
      const found = new Set(given.filter((month) => month !== null));
      if (found.size === 0 || found.size >= minMonths) continue;
      yield {
        ...placeOf(context, ofSite[0]!, 'date'),
        subject: siteKey(ofSite[0]!.site ?? ''),
        message: `The ${ofSite.length} optical depths of ${ofSite[0]!.site ?? 'a site without name'} come from ${found.size} of 12 months; at least ${minMonths} make a mean of the year.`,
        remedy: 'Say in the method which season the values stand for, or waive it with a reason.',
        remedyKind: 'answer',
      };
    }
  },
};
