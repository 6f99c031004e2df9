import type { SampleRow, TracedValue } from '../../dataset/sample-row';
import type { VettingContext } from '../context';
import { limitsOf } from '../limits';
import { filePlace, placeOf } from '../place';
import { pairRows } from '../row-pairs';
import type { Rule, RuleHit } from '../rule';
import { ageOf } from '../samples';
import { counted, shown } from '../wording';

const LIMITS = { mostListed: 1000 };

/** What a file uploaded again changes against the one before: every field cell by cell, then rows added and gone. */
export const differences: Rule = {
  id: 'V80',
  slug: 'differences',
  title: 'Differs from the upload before',
  severity: 'note',
  stage: 'submission',
  needs: ['earlierRows'],
  source: 'common practice, no source',
  why: 'A corrected file often changes more than its letter says; the list shows everything.',
  limits: LIMITS,

  *check(context) {
    if (!context.earlierRows) return;
    const { mostListed } = limitsOf(context, 'V80', LIMITS);
    const { both, added, gone } = pairRows(context.earlierRows, context.rows);
    const changes = both.flatMap(({ before, now }) => changedCells(context, before, now));
    const listed = [...changes, ...added.map((row) => cameHit(context, row)), ...gone.map(goneHit)];
    if (listed.length === 0) return;
    yield* listed.slice(0, mostListed);
    const rest = listed.length - mostListed;
    yield {
      ...filePlace(),
      message: `Against the upload before, ${counted(changes.length, 'cell')} changed, ${counted(added.length, 'row')} came and ${counted(gone.length, 'row')} went${rest > 0 ? `; the first ${mostListed} are listed` : ''}.`,
      remedy: 'Nothing to do if the changes are meant.',
      remedyKind: 'none',
    };
  },
};

function changedCells(context: VettingContext, before: SampleRow, now: SampleRow): RuleHit[] {
  const fields = new Set([...Object.keys(now.cells), ...Object.keys(before.cells)]);
  return [...fields].flatMap((field): RuleHit[] => {
    const [earlier, present] = [said(before.cells[field]), said(now.cells[field])];
    if (earlier === present) return [];
    return [
      {
        ...placeOf(context, now, field),
        message: `In row ${now.row}, ${field} was ${earlier} before (row ${before.row}) and is ${present} now.`,
        remedy: 'Nothing to do if the change is meant.',
        remedyKind: 'none',
      },
    ];
  });
}

/** What a cell says to a reader: its value in canonical units, a limit, or why there is none. */
function said(traced: TracedValue | undefined): string {
  if (!traced || (traced.value === null && traced.raw === '')) return 'empty';
  if (traced.belowDetection) return `below ${traced.value ?? 'detection'}`;
  if (traced.value === null) return `"${traced.raw.slice(0, 60)}" (no value)`;
  return typeof traced.value === 'number' ? number(traced.value) : `"${traced.value.slice(0, 60)}"`;
}

/** All figures where four would hide the change. */
const number = (value: number): string => String(Number(value.toPrecision(9)));

function cameHit(context: VettingContext, row: SampleRow): RuleHit {
  return {
    ...placeOf(context, row, 'site'),
    subject: 'row-came',
    message: `Row ${row.row} (${nameOf(row)}) was not in the upload before.`,
    remedy: 'Nothing to do if the row is meant.',
    remedyKind: 'none',
  };
}

function goneHit(row: SampleRow): RuleHit {
  return {
    ...filePlace(),
    subject: `row-gone ${row.sheet} ${row.row}`.slice(0, 100),
    message: `Row ${row.row} of sheet "${row.sheet}" before (${nameOf(row)}) is no longer there.`,
    remedy: 'Nothing to do if the row was meant to go.',
    remedyKind: 'none',
  };
}

function nameOf(row: SampleRow): string {
  const age = ageOf(row);
  return `${row.site ?? 'no site'}, ${age === null ? 'no age' : `${shown(age)} ka BP`}, ${row.quantity}`;
}
