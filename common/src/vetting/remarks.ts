import type { SampleRow } from '../dataset/sample-row';
import type { VettingContext } from './context';
import { placeOf } from './place';
import type { RuleHit } from './rule';
import { countedRows } from './samples';

/** Findings for rows whose remark holds some words; `message` gets the remark and the row number. */
export function* remarkedRows(
  context: VettingContext,
  words: RegExp,
  say: (remark: string, row: SampleRow) => Pick<RuleHit, 'message' | 'remedy' | 'remedyKind'>,
): Iterable<RuleHit> {
  for (const row of countedRows(context)) {
    const remark = row.remark?.trim() ?? '';
    if (words.test(remark)) yield { ...placeOf(context, row, 'remark'), ...say(remark.slice(0, 80), row) };
  }
}
