import type { SampleRow } from '../../dataset/sample-row';
import type { VettingContext } from '../context';
import { limitsOf } from '../limits';
import { numberOf, placeOf, refusedHit } from '../place';
import type { Rule, RuleHit } from '../rule';
import { archiveOf, countedRows } from '../samples';
import { shown } from '../wording';

const LIMITS = { sumMax: 1.05 };

/** Shares of the mass of a sediment that exclude one another, as their columns are named. */
const PARTS: [string, string][] = [
  ['dustFraction', 'dust'],
  ['carbonateFraction', 'carbonate'],
  ['opalFraction', 'opal'],
  ['organicFraction', 'organic matter'],
];

/**
 * The dust fraction is a share of the mass, 0 to 1; with carbonate, opal and organic matter it makes up the
 * whole and no more. 5 % above one are left to the errors of the parts. Caution: organic carbon in place of
 * organic matter makes the sum too small, never too large.
 */
export const dustFraction: Rule = {
  id: 'V42',
  slug: 'dust-fraction',
  title: 'Dust fraction impossible',
  severity: 'error',
  stage: 'file',
  needs: ['dustFraction'],
  source: 'mass balance',
  why: 'A fraction above 1 is in per cent, and makes the flux a hundred times too large; parts that add up to more than the whole were measured on different bases.',
  limits: LIMITS,

  *check(context) {
    for (const row of countedRows(context)) {
      const refused = refusedHit(context, row, 'dustFraction', 'dust fraction');
      if (refused) yield refused;
      const fraction = row.dustFraction;
      if (fraction === null || (fraction >= 0 && fraction <= 1)) {
        yield* massBalance(context, row);
        continue;
      }
      yield {
        ...placeOf(context, row, 'dustFraction'),
        message: `The dust fraction is ${shown(fraction)}; it must lie within 0 to 1.`,
        remedy:
          'Set the unit of the column to % in the mapping if it is in per cent, or type the right value.',
        remedyKind: 'mend',
      };
    }
  },
};

function* massBalance(context: VettingContext, row: SampleRow): Iterable<RuleHit> {
  const { sumMax } = limitsOf(context, 'V42', LIMITS, archiveOf(context, row));
  const given = PARTS.flatMap(([field, name]) => {
    const share = numberOf(row, field);
    return share === null ? [] : [{ field, name, share }];
  });
  const sum = given.reduce((total, { share }) => total + share, 0);
  if (given.length < 2 || sum <= sumMax) return;
  const largest = given.reduce((most, one) => (one.share > most.share ? one : most));
  yield {
    ...placeOf(context, row, largest.field),
    subject: 'sum',
    message: `The parts of row ${row.row} add up to ${shown(sum)} of the mass (${given.map(({ name, share }) => `${name} ${shown(share)}`).join(', ')}); at most ${sumMax} is possible.`,
    remedy:
      'Check that all parts are shares of the same dry mass and type the right values, or leave the row out with a reason.',
    remedyKind: 'mend',
  };
}
