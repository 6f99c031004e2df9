import type { SampleRow } from '../../dataset/sample-row';
import { filePlace, placeOf } from '../place';
import type { Rule } from '../rule';
import { ageOf, depthOf, siteKey } from '../samples';
import { counted, limitsOf, shown } from '../wording';

const LIMITS = { mostListed: 1000 };
const COMPARED = ['fluxGM2Yr', 'fluxSigmaGM2Yr', 'latitudeDeg', 'longitudeDeg', 'ageSigmaKa'] as const;

/** What a file uploaded again changes against the one before: cell by cell, then rows added and gone. */
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
    const before = numbered(context.earlierRows);
    const now = numbered(context.rows);
    let changes = 0;
    for (const [key, row] of now) {
      const earlier = before.get(key);
      if (!earlier) continue;
      for (const field of COMPARED) {
        if (row[field] === earlier[field]) continue;
        changes += 1;
        if (changes > mostListed) continue;
        yield {
          ...placeOf(context, row, field),
          message: `In row ${row.row}, ${field} was ${valueText(earlier[field])} before and is ${valueText(row[field])} now.`,
          remedy: 'Nothing to do if the change is meant.',
          remedyKind: 'none',
        };
      }
    }
    const added = [...now.keys()].filter((key) => !before.has(key)).length;
    const gone = [...before.keys()].filter((key) => !now.has(key)).length;
    if (changes + added + gone === 0) return;
    yield {
      ...filePlace(),
      message: `Against the upload before, ${counted(changes, 'value')} changed, ${counted(added, 'row')} came and ${counted(gone, 'row')} went.`,
      remedy: 'Nothing to do if the changes are meant.',
      remedyKind: 'none',
    };
  },
};

const valueText = (value: number | null): string => (value === null ? 'empty' : shown(value));

/** Rows by site, quantity, size cut-off, age and depth; a repeated sample gets a running number. */
function numbered(rows: readonly SampleRow[]): Map<string, SampleRow> {
  const found = new Map<string, SampleRow>();
  const times = new Map<string, number>();
  for (const row of rows) {
    const key = [siteKey(row.site ?? ''), row.quantity, row.sizeCutoff, ageOf(row), depthOf(row)].join(
      '\u0000',
    );
    const time = (times.get(key) ?? 0) + 1;
    times.set(key, time);
    found.set(`${key}\u0000${time}`, row);
  }
  return found;
}
