import type { VettingContext } from '../context';
import { distinctCells, placeOf, refusedHit } from '../place';
import type { Rule, RuleHit } from '../rule';
import { countedRows } from '../samples';
import { shown } from '../wording';

/** Latitude −90 to 90°, longitude −180 to 360°, and not the empty pair 0, 0. */
export const coordinateRange: Rule = {
  id: 'V09',
  slug: 'coordinate-range',
  title: 'Coordinate out of range',
  severity: 'error',
  stage: 'file',
  needs: ['latitudeDeg', 'longitudeDeg'],
  source: 'common practice, no source',
  why: 'A position off the globe, or the 0, 0 of an empty form, puts the sample into no region or the wrong one.',
  kinds: ['dust-flux', 'point-optical-depth', 'gridded-field', 'backdrop-table', 'gas-record'],

  *check(context) {
    yield* outside(context, 'latitudeDeg', 'latitude', -90, 90);
    yield* outside(context, 'longitudeDeg', 'longitude', -180, 360);
    for (const { row } of distinctCells(countedRows(context), 'latitudeDeg')) {
      if (row.latitudeDeg !== 0 || row.longitudeDeg !== 0) continue;
      yield {
        ...placeOf(context, row, 'latitudeDeg'),
        subject: 'null-island',
        message:
          'Latitude and longitude are both 0°, which is open sea off Africa and mostly an empty position.',
        remedy: 'Type the position over it, or leave the row out with a reason.',
        remedyKind: 'mend',
      };
    }
  },
};

function* outside(
  context: VettingContext,
  field: 'latitudeDeg' | 'longitudeDeg',
  title: string,
  min: number,
  max: number,
): Iterable<RuleHit> {
  for (const { row } of distinctCells(countedRows(context), field)) {
    const value = row[field];
    const refused = refusedHit(context, row, field, title);
    if (refused) yield refused;
    if (value === null || (value >= min && value <= max)) continue;
    yield {
      ...placeOf(context, row, field),
      message: `The ${title} is ${shown(value)}°; it must lie within ${min} to ${max}°.`,
      remedy: `Type the right ${title} over it, or leave the row out with a reason.`,
      remedyKind: 'mend',
    };
  }
}
