import { parseAgeUnit } from '../../units/age';
import { isUnitProblem } from '../../units/unit';
import { columnPlace } from '../place';
import type { Rule } from '../rule';
import { asked } from '../wording';

const AGE_FIELDS = ['ageKaBp', 'ageYoungKaBp', 'ageOldKaBp'];

/** Unit and datum of the ages: read from the units row and the heading, else asked in the form. */
export const ageDatum: Rule = {
  id: 'V18',
  slug: 'age-datum',
  title: 'Unit or datum of the age not stated',
  severity: 'error',
  stage: 'submission',
  needs: ['ageKaBp'],
  source: 'common practice, no source: BP counts from 1950 CE, b2k from 2000 CE',
  why: 'BP and b2k lie 50 years apart and years and kyr a factor of 1000: enough to move a sample out of its slice.',

  *check(context) {
    const { mapping, metadata } = context;
    for (const { sheet, column, heading, field, unit } of [
      ...mapping.columns,
      ...constantsOf(mapping.constants),
    ]) {
      const isUsed = mapping.tables.some((table) => table.sheet === sheet && table.used);
      if (!isUsed || field === null || !AGE_FIELDS.includes(field)) continue;
      const age = parseAgeUnit(unit ?? '', heading);
      const noUnit = isUnitProblem(age);
      if (!noUnit && (age.datum !== null || metadata.ageDatum?.trim())) continue;
      const place = { ...columnPlace(context, sheet, field), column };
      const what = `The ${noUnit ? 'unit' : 'datum'} of the ages ("${heading}"${unit ? `, ${unit}` : ''})`;
      if (noUnit) {
        yield {
          ...place,
          message: `${what} is not stated or not understood.`,
          remedy: 'Type the unit of the column in the mapping, e.g. ka BP, yr BP, yr b2k or year CE.',
          remedyKind: 'answer',
        };
      } else {
        yield {
          ...place,
          field: 'ageDatum',
          ...asked(context, what, 'choose BP (1950 CE), b2k (2000 CE) or years CE.'),
        };
      }
    }
  },
};

const constantsOf = (constants: { sheet: string; field: string; unit: string | null; text: string }[]) =>
  constants.map(({ sheet, field, unit, text }) => ({ sheet, column: null, heading: text, field, unit }));
