import type { SampleRow } from '../dataset/sample-row';
import type { VettingContext } from './context';
import { numberOf } from './place';

/** Rows with an optical depth, with its value; none in a file of another kind. */
export function opticalDepths(context: VettingContext): { row: SampleRow; opticalDepth: number }[] {
  if (context.kind !== 'point-optical-depth') return [];
  return context.rows.flatMap((row) => {
    const opticalDepth = numberOf(row, 'aod');
    return opticalDepth === null ? [] : [{ row, opticalDepth }];
  });
}
