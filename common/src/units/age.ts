import { DomainError } from '../physical/domain-error';
import { type UnitProblem } from './unit';

/** From which year an age counts, and in which direction. */
export interface AgeDatum {
  label: string;
  /** calendar year (CE, astronomical) of age 0; for calendar years themselves, 0 */
  zeroYear: number;
  /** 'back': larger is older; 'calendar': the value is a year CE; 'calendar-bce': the value counts years before CE */
  direction: 'back' | 'calendar' | 'calendar-bce';
}

export interface AgeUnit {
  text: string;
  years: 1 | 1e3 | 1e6;
  /** null: the text names none */
  datum: AgeDatum | null;
  /** true for uncalibrated radiocarbon years, which are no calendar ages */
  radiocarbon: boolean;
}

const BP: AgeDatum = { label: 'before 1950 CE', zeroYear: 1950, direction: 'back' };
const B2K: AgeDatum = { label: 'before 2000 CE', zeroYear: 2000, direction: 'back' };
const CE: AgeDatum = { label: 'CE', zeroYear: 0, direction: 'calendar' };
const BCE: AgeDatum = { label: 'BCE', zeroYear: 0, direction: 'calendar-bce' };

/** Words are those of English, German, French, Spanish, Italian, Portuguese and Dutch usage, from memory. */
const BEFORE_YEAR =
  /(?:before|bef\.?|b|vor|v\.?|prior to|avant|av\.?|antes de|prima del|bp)\s*(?:the year\s*)?(1[5-9]\d\d|20\d\d)(?!\d)/i;
const BEFORE_2K = /(?<![a-z])b\s?2\s?k(?![a-z])/i;
const BEFORE_PRESENT =
  /(?<![a-z])(?:cal)?\s?b\.?\s?p\.?(?![a-z])|before present|vor heute|avant (?:le )?présent|avant l'actuel|antes del presente|(?<![a-z])[kM]?a\s?AP(?![a-z])/i;
const BEFORE_CE =
  /(?<![a-z])b\.?\s?c\.?(?:\s?e\.?)?(?![a-z])|v\.?\s?chr|av\.?\s?j\.?-?\s?c|(?<![a-z])a\.\s?c\./i;
const COMMON_ERA =
  /(?<![a-z])(?:a\.?d\.?|c\.?e\.?)(?![a-z])|n\.?\s?chr|ap\.?\s?j\.?-?\s?c|(?<![a-z])d\.\s?c\.|calendar year/i;
const RADIOCARBON = /(?:14\s?c|¹⁴c|radiocarbon|radiokohlenstoff|c-?14)/i;

/** "kyrBP", "ab2k": unit and datum written as one word. */
const GLUED = /((?:[kM]?yrs?|[kM]?a|k?y|years?))(BP|b2k|B\.P\.)/g;
const MILLIONS =
  /(?<![\p{L}])(?:M\s?a(?:nn)?|M\.?y\.?r?s?|Mya|m\.y\.|million years?|Millionen Jahren?|Mio\.? ?J(?:ahre)?)(?![\p{L}])/u;
const THOUSANDS =
  /(?<![\p{L}])(?:k\s?a(?:nn)?|k\.?y\.?r?s?\.?|kya|kiloyears?|thousand years?|tausend Jahren?|10\^?3\s?(?:yr|a|years?)|Jahrtausende?|millénaires?|milenios?)(?![\p{L}])/iu;
const YEARS =
  /(?<![\p{L}])(?:a|y|yrs?|years?|ann(?:um)?|Jahren?|Jahr|J|ans?|années?|años?|anos?|anni|jaar|år|лет)(?![\p{L}])/iu;

/**
 * Reads unit and datum of an age from its unit text and, where that is silent, from the heading:
 * "ka BP", "yr b2k", "a v. 1950", "cal yr BP", "kyr BP", "Ma", "year CE"; heading "Age b2k" with unit "yr".
 * Case: "Ma" and "My" are millions of years.
 *
 * @returns a UnitProblem when neither names a unit of time; a datum without unit ("b2k") is no unit either,
 *   save for calendar years ("CE"), which are years
 */
export function parseAgeUnit(unitText: string, heading = ''): AgeUnit | UnitProblem {
  const texts = [unitText, heading].map((text) =>
    text.normalize('NFKC').replace(/_/g, ' ').replace(GLUED, '$1 $2'),
  );
  const datum = firstFound(texts, datumOf);
  const years = firstFound(texts, yearsOf) ?? (datum && datum.direction !== 'back' ? 1 : null);
  const shown = unitText.trim() || heading.trim();
  if (years === null) {
    const code = shown === '' ? 'empty-unit' : 'unknown-unit';
    const named =
      unitText.trim() === '' ? 'No unit of the age is given' : `"${unitText.trim()}" is no unit of an age`;
    return {
      code,
      unitText: unitText.trim(),
      message: `${named}; a unit with its datum is wanted, such as ka BP, yr BP, yr b2k or year CE.`,
    };
  }
  return {
    text: shown,
    years,
    datum,
    radiocarbon: texts.some((text) => RADIOCARBON.test(text) && !/cal/i.test(text)),
  };
}

function firstFound<T>(texts: string[], read: (text: string) => T | null): T | null {
  for (const text of texts) {
    const found = read(text);
    if (found !== null) return found;
  }
  return null;
}

function datumOf(text: string): AgeDatum | null {
  const year = BEFORE_YEAR.exec(text);
  if (year) return { label: `before ${year[1]} CE`, zeroYear: Number(year[1]), direction: 'back' };
  if (BEFORE_2K.test(text)) return B2K;
  if (BEFORE_PRESENT.test(text)) return BP;
  if (BEFORE_CE.test(text)) return BCE;
  return COMMON_ERA.test(text) ? CE : null;
}

function yearsOf(text: string): 1 | 1e3 | 1e6 | null {
  const bare = text.replace(BEFORE_YEAR, ' ').replace(BEFORE_2K, ' ');
  if (MILLIONS.test(bare)) return 1e6;
  if (THOUSANDS.test(bare)) return 1e3;
  return YEARS.test(bare) ? 1 : null;
}

/** How an age is converted: value [ka BP] = value × factor + offset. */
export interface AgeConversion {
  factor: number;
  offset: number;
  canonical: 'ka BP';
  explanation: string;
  /** true: no datum is named and 1950 CE is taken */
  datumAssumed: boolean;
  radiocarbon: boolean;
}

/**
 * Conversion of ages to ka before 1950 CE. Later than 1950 is negative. b2k minus 50 years is BP;
 * a year N CE is (1950 − N) years; N BCE is (1949 + N) years, for there was no year 0.
 * Cautions: without a datum 1950 CE is taken and `datumAssumed` set, which is 50 years off for an age b2k;
 * uncalibrated radiocarbon years are passed through and flagged, never calibrated.
 */
export function ageConversion(unit: AgeUnit): AgeConversion {
  const datum = unit.datum ?? BP;
  const scale = unit.years / 1e3;
  const [factor, offset] =
    datum.direction === 'back'
      ? [scale, (1950 - datum.zeroYear) / 1e3]
      : datum.direction === 'calendar'
        ? [-scale, 1.95]
        : [scale, 1.949];
  const shift = offset === 0 ? '' : offset < 0 ? ` − ${-offset}` : ` + ${offset}`;
  const assumed = unit.datum === null ? '; no datum is named, 1950 CE is taken' : `; ${datum.label}`;
  const scaled = factor === 1 ? unit.text : `${unit.text} × ${factor}`;
  const explanation = `${scaled}${shift} = ka BP${assumed}`;
  return {
    factor,
    offset,
    canonical: 'ka BP',
    explanation,
    datumAssumed: unit.datum === null,
    radiocarbon: unit.radiocarbon,
  };
}

/**
 * One age in ka before 1950 CE, to 1e-9 ka, so that 10800 yr b2k is 10.75 and not 10.750000000000002.
 *
 * @throws DomainError `not-a-number`
 */
export function toAgeKaBp(value: number, conversion: Pick<AgeConversion, 'factor' | 'offset'>): number {
  if (!Number.isFinite(value))
    throw new DomainError('not-a-number', { field: 'age', value: String(value), allowed: 'a finite number' });
  return Math.round((value * conversion.factor + conversion.offset) * 1e9) / 1e9 + 0;
}
