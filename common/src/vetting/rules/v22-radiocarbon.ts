import { parseAgeUnit } from '../../units/age';
import { isUnitProblem } from '../../units/unit';
import { columnPlace, filePlace } from '../place';
import type { VettingContext } from '../context';
import type { Rule } from '../rule';
import { archiveOf } from '../samples';
import { statements } from '../wording';

const RADIOCARBON = /radio-?carbon|radiokohlenstoff|(?<!\d)14\s?C\b|¹⁴C/i;
const CURVE = /IntCal\s?\d\d|SHCal\s?\d\d|Marine\s?\d\d/i;
const RESERVOIR = /reservoir|ΔR|delta[- ]?R/i;

/** Radiocarbon ages are calibrated, name their curve and, at sea, the reservoir age. */
export const radiocarbon: Rule = {
  id: 'V22',
  slug: 'radiocarbon',
  title: 'Radiocarbon ages without calibration statement',
  severity: 'warning',
  stage: 'submission',
  needs: ['ageModel'],
  source: 'Reimer et al., Hogg et al., Heaton et al. 2020, Radiocarbon 62, from memory',
  why: 'Uncalibrated ages near the Last Glacial Maximum are some 3000 years too young; a marine reservoir age adds centuries.',

  *check(context) {
    for (const { sheet, column, heading, field, unit } of context.mapping.columns) {
      if (field === null || !field.startsWith('age')) continue;
      const age = parseAgeUnit(unit ?? '', heading);
      if (isUnitProblem(age) || !age.radiocarbon || CURVE.test(statements(context))) continue;
      yield {
        ...columnPlace(context, sheet, field),
        column,
        message: `Column ${column} ("${heading}") holds radiocarbon ages that are not said to be calibrated.`,
        remedy:
          'Map a column of calibrated ages, or name the curve (IntCal20, SHCal20, Marine20) in the age model.',
        remedyKind: 'answer',
      };
    }
    if (!RADIOCARBON.test(statements(context))) return;
    const lacking = [
      ...(CURVE.test(statements(context)) ? [] : ['the calibration curve']),
      ...(isMarine(context) && !RESERVOIR.test(statements(context)) ? ['the reservoir age'] : []),
    ];
    if (lacking.length === 0) return;
    yield {
      ...filePlace('ageModel'),
      message: `The ages rest on radiocarbon, but ${lacking.join(' and ')} is not named.`,
      remedy:
        'Name the curve (IntCal20, SHCal20, Marine20), and at sea the reservoir age, in the age model of the form.',
      remedyKind: 'answer',
    };
  },
};

const isMarine = (context: VettingContext): boolean =>
  context.rows.some((row) => archiveOf(context, row) === 'marine');
