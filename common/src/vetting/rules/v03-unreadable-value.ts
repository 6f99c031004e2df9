import type { TracedValue } from '../../dataset/sample-row';
import { isRefusedNegative, presentText, problemKind, RANGE_RULE_FIELDS } from '../cell-problems';
import { placeOf } from '../place';
import type { Rule } from '../rule';
import { isWithoutValue } from '../samples';

/** Text in a column of numbers that could not be resolved: a unit in the cell, two separators, a word. */
export const unreadableValue: Rule = {
  id: 'V03',
  slug: 'unreadable-value',
  title: 'Cell could not be read as its field',
  severity: 'error',
  stage: 'file',
  needs: [],
  source: 'common practice, no source',
  why: 'Decimal commas, thousands separators and units in cells are settled once for a column; what then still does not read as a number would be a guess.',
  kinds: 'all',

  *check(context) {
    const said = new Set<string>();
    for (const row of context.rows) {
      for (const [field, traced] of Object.entries(row.cells)) {
        const kind = problemKind(traced);
        const mine = kind === 'unreadable' || (kind === 'outside-range' && !hasRangeRule(field, traced));
        if (!mine) continue;
        const source = `${row.sheet}\u0000${traced.cell ?? row.row}\u0000${field}`;
        if (said.has(source)) continue;
        said.add(source);
        yield {
          ...placeOf(context, row, field),
          severity: isWithoutValue(context, row) ? 'note' : 'error',
          message: `"${shortened(presentText(traced))}" in ${field} could not be used${reason(traced.problem?.message)}.`,
          remedy: 'Type the value over it (the raw text is kept), or leave the row out with a reason.',
          remedyKind: 'mend',
        };
      }
    }
  },
};

/** A negative flux is V32's, all else that is impossible in a flux is said here. */
const hasRangeRule = (field: string, traced: TracedValue): boolean =>
  RANGE_RULE_FIELDS.has(field) || (field === 'fluxGM2Yr' && isRefusedNegative(traced));

const shortened = (text: string): string => (text.length > 60 ? `${text.slice(0, 60)}…` : text);
const reason = (message: string | undefined): string => (message ? `: ${message.replace(/\.$/, '')}` : '');
