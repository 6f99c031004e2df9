import { fieldOf } from '../../dataset/field';
import { isRecordKind } from '../../dataset/record-kinds';
import type { SampleRow } from '../../dataset/sample-row';
import type { VettingContext } from '../context';
import { bySheet, filePlace, numberOf, placeOf, sheetPlace, textOf } from '../place';
import type { Rule, RuleHit } from '../rule';
import { archiveOf, isWithoutValue, kindOf } from '../samples';
import { asked, counted } from '../wording';

interface Wanted {
  field: string;
  title: string;
  /** any one of these gives it */
  fields: string[];
}

const PLACE_AND_TIME: Wanted[] = [
  { field: 'site', title: 'site name', fields: ['site'] },
  { field: 'latitudeDeg', title: 'latitude', fields: ['latitudeDeg'] },
  { field: 'longitudeDeg', title: 'longitude', fields: ['longitudeDeg'] },
];
const AGE: Wanted = {
  field: 'ageKaBp',
  title: 'age',
  fields: ['ageKaBp', 'ageYoungKaBp', 'ageOldKaBp'],
};

/**
 * What a sample cannot do without: site, position, value, age; and once for the file the archive and a reference.
 *
 * A column wanted and not mapped is one error of its sheet. A row with no value never enters a version:
 * it is noted, and nothing else is asked of it.
 */
export const requiredFields: Rule = {
  id: 'V05',
  slug: 'required-fields',
  title: 'Required field is missing',
  severity: 'error',
  stage: 'submission',
  needs: [],
  source: 'common practice, no source',
  why: 'Without place, age, value and origin a number can neither be averaged into a slice nor be cited.',
  kinds: 'all',

  *check(context) {
    for (const [sheet, rows] of bySheet(context.rows)) yield* checkSheet(context, sheet, rows);
    if (context.rows.length === 0) return;
    yield* checkForm(context);
  },
};

function* checkSheet(context: VettingContext, sheet: string, rows: SampleRow[]): Iterable<RuleHit> {
  const { value, wanted } = wantedOf(context);
  const absent = [...wanted, value].filter((one) => !isOffered(context, sheet, rows, one));
  for (const one of absent) {
    yield {
      ...sheetPlace(sheet, one.field),
      message: `No column of sheet "${sheet}" is mapped to the ${one.title}, which every sample needs.`,
      remedy: `Assign the ${one.title} to its column in the mapping, or give one ${one.title} for the whole sheet there.`,
      remedyKind: 'answer',
    };
  }
  if (absent.includes(value)) return;
  yield* noteRowsWithoutValue(context, sheet, rows, value);
  for (const row of rows) {
    if (isWithoutValue(context, row)) continue;
    for (const one of wanted) {
      if (absent.includes(one) || one.fields.some((field) => isGiven(row, field))) continue;
      if (one.fields.some((field) => row.cells[field]?.problem)) continue; // said by the rule of that problem
      yield {
        ...placeOf(context, row, one.field),
        message: `Row ${row.row} has a value but no ${one.title}.`,
        remedy: `Type the ${one.title} into the cell, or leave the row out with a reason.`,
        remedyKind: 'mend',
      };
    }
  }
}

function wantedOf(context: VettingContext): { value: Wanted; wanted: Wanted[] } {
  const kind = kindOf(context);
  if (isRecordKind(kind)) {
    const title = (field: string): string => fieldOf(kind, field)!.title.toLowerCase();
    const values = [kind.valueField, ...(kind.usableWith ?? []).flat()];
    const required = kind.fields.filter(({ field, required }) => required && !values.includes(field));
    return {
      value: { field: kind.valueField, title: title(kind.valueField), fields: values },
      wanted: required.map(({ field }) => ({ field, title: title(field), fields: [field] })),
    };
  }
  return context.kind === 'point-optical-depth'
    ? { value: { field: 'aod', title: 'optical depth', fields: ['aod'] }, wanted: PLACE_AND_TIME }
    : {
        value: { field: 'fluxGM2Yr', title: 'dust flux', fields: ['fluxGM2Yr'] },
        wanted: [...PLACE_AND_TIME, AGE],
      };
}

function* noteRowsWithoutValue(
  context: VettingContext,
  sheet: string,
  rows: SampleRow[],
  value: Wanted,
): Iterable<RuleHit> {
  const empty = rows.filter((row) => isWithoutValue(context, row));
  if (empty.length === 0) return;
  const remedy = 'Nothing to do, or type the value into the cell if it is known.';
  yield {
    ...sheetPlace(sheet, value.field),
    severity: 'note',
    subject: 'rows-without-value',
    message: `On sheet "${sheet}", ${counted(empty.length, 'row')} of ${rows.length} without ${value.title} will not enter the version.`,
    remedy,
    remedyKind: 'none',
  };
  for (const row of empty) {
    yield {
      ...placeOf(context, row, value.field),
      severity: 'note',
      message: `Row ${row.row} has no ${value.title}; it stays visible and does not enter the version.`,
      remedy,
      remedyKind: 'none',
    };
  }
}

function* checkForm(context: VettingContext): Iterable<RuleHit> {
  const { publicationDoi, publicationCitation } = context.metadata;
  if (!publicationDoi?.trim() && !publicationCitation?.trim()) {
    yield {
      ...filePlace('publicationDoi'),
      ...asked(context, 'The reference', 'give the DOI of the publication, or its full citation.'),
    };
  }
  const open = context.rows.some((row) => !isWithoutValue(context, row) && archiveOf(context, row) === null);
  if (open && (context.kind ?? 'dust-flux') === 'dust-flux') {
    yield {
      ...filePlace('archive'),
      ...asked(context, 'The archive', 'choose ice, marine, loess, lake, peat or other.'),
    };
  }
}

/** Mapped, given for the whole table, or present in any row. */
function isOffered(context: VettingContext, sheet: string, rows: SampleRow[], { fields }: Wanted): boolean {
  const { columns, constants } = context.mapping;
  return (
    columns.some((c) => c.sheet === sheet && c.field !== null && fields.includes(c.field)) ||
    constants.some((c) => c.sheet === sheet && fields.includes(c.field)) ||
    rows.some((row) => fields.some((field) => isGiven(row, field)))
  );
}

const isGiven = (row: SampleRow, field: string): boolean =>
  field === 'site' ? row.site !== null : numberOf(row, field) !== null || textOf(row, field) !== null;
