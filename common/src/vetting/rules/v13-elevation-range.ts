import type { VettingContext } from '../context';
import { limitsOf } from '../limits';
import { distinctCells, placeOf, refusedHit } from '../place';
import type { Rule, RuleHit } from '../rule';
import { countedRows } from '../samples';
import { shown } from '../wording';

const LIMITS = { elevationMinM: -430, elevationMaxM: 8850, waterDepthMinM: 0, waterDepthMaxM: 11000 };

/** Elevation from the Dead Sea shore to the highest summit; water depth, counted downwards, to the deepest trench. */
export const elevationRange: Rule = {
  id: 'V13',
  slug: 'elevation-range',
  title: 'Elevation or water depth impossible',
  severity: 'error',
  stage: 'file',
  needs: ['elevationM', 'waterDepthM'],
  source: 'physical bounds of the Earth, from memory',
  why: 'Values beyond the Earth are in feet, carry the wrong sign, or come from another column.',
  limits: LIMITS,

  *check(context) {
    const limits = limitsOf(context, 'V13', LIMITS);
    yield* outside(context, 'elevationM', 'elevation', limits.elevationMinM, limits.elevationMaxM);
    yield* outside(
      context,
      'waterDepthM',
      'water depth (positive downwards)',
      limits.waterDepthMinM,
      limits.waterDepthMaxM,
    );
  },
};

function* outside(
  context: VettingContext,
  field: 'elevationM' | 'waterDepthM',
  title: string,
  min: number,
  max: number,
): Iterable<RuleHit> {
  for (const { row } of distinctCells(countedRows(context), field)) {
    const refused = refusedHit(context, row, field, title);
    if (refused) yield refused;
    const value = row[field];
    if (value === null || (value >= min && value <= max)) continue;
    const sign = field === 'waterDepthM' && value < 0 ? ' Depth counts positive downwards.' : '';
    yield {
      ...placeOf(context, row, field),
      message: `The ${title} is ${shown(value)} m; it must lie within ${min} to ${max} m.`,
      remedy: `Type the right value over it, or leave the row out with a reason.${sign}`,
      remedyKind: 'mend',
      ...(sign ? { proposal: String(-value) } : {}),
    };
  }
}
