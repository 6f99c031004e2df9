import type { SampleRow } from '../dataset/sample-row';
import type { VettingContext } from './context';
import { placeOf } from './place';
import type { RuleHit } from './rule';
import { shown } from './wording';

/** A row whose flux leaves the usual range of its archive, as a warning to decide on. */
export function unusualFlux(
  context: VettingContext,
  row: SampleRow,
  [min, max]: readonly [number, number],
  where: string,
): RuleHit[] {
  const flux = row.fluxGM2Yr;
  if (flux === null || flux <= 0 || row.quantity !== 'dust' || (flux >= min && flux <= max)) return [];
  return [
    {
      ...placeOf(context, row, 'fluxGM2Yr'),
      message: `The flux is ${shown(flux)} g m-2 yr-1; ${min} to ${max} is usual for ${where}.`,
      remedy: 'Check the value and the unit of its column, or waive it with a reason.',
      remedyKind: 'waive',
    },
  ];
}
