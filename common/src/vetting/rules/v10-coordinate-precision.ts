import { presentText } from '../cell-problems';
import { limitsOf } from '../limits';
import { filePlace, placeOf } from '../place';
import type { Rule } from '../rule';
import { sitesOf } from '../samples';
import { counted } from '../wording';

const LIMITS = { decimals: 2, wholeDegreeShare: 0.5 };

/**
 * Positions rounded so far that the site may lie in another cell or on the other side of a coast.
 * A spreadsheet drops trailing zeros (75.10 becomes 75.1), so a site counts as rounded only when
 * neither coordinate shows the wanted decimals.
 */
export const coordinatePrecision: Rule = {
  id: 'V10',
  slug: 'coordinate-precision',
  title: 'Coordinates are coarsely rounded',
  severity: 'warning',
  stage: 'file',
  needs: ['latitudeDeg', 'longitudeDeg'],
  source: 'common practice, no source',
  why: 'One decimal of a degree is 11 km; whole degrees at most sites mean that a table was rounded, or columns swapped.',
  limits: LIMITS,

  *check(context) {
    const { decimals, wholeDegreeShare } = limitsOf(context, 'V10', LIMITS);
    const sites = sitesOf(context);
    for (const { name, rows, latitudeDeg, longitudeDeg } of sites) {
      const texts = [rows[0]!.cells.latitudeDeg, rows[0]!.cells.longitudeDeg].map((cell) =>
        cell ? presentText(cell) : '',
      );
      if (Math.max(...texts.map(decimalsOf)) >= decimals) continue;
      yield {
        ...placeOf(context, rows[0]!, 'latitudeDeg'),
        message: `The position of ${name} is given as ${latitudeDeg}°, ${longitudeDeg}°: fewer than ${decimals} decimals.`,
        remedy: 'Type the position as published, or waive it if it is known no better.',
        remedyKind: 'waive',
      };
    }
    const whole = sites.filter((s) => Number.isInteger(s.latitudeDeg) && Number.isInteger(s.longitudeDeg));
    if (sites.length >= 4 && whole.length > wholeDegreeShare * sites.length) {
      yield {
        ...filePlace('latitudeDeg'),
        message: `Of ${counted(sites.length, 'site')}, ${whole.length} lie on whole degrees.`,
        remedy: 'Check that the table was not rounded; map the columns with the full positions, or waive it.',
        remedyKind: 'waive',
      };
    }
  },
};

/** Decimals of a coordinate as written; minutes count for two, seconds for four. */
function decimalsOf(text: string): number {
  if (/["″]|''/.test(text)) return 4;
  if (/['′’]/.test(text)) return 2;
  return /[.,](\d+)/.exec(text)?.[1]?.length ?? 0;
}
