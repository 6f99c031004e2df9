import { parseAgeUnit } from '../units/age';
import { isUnitProblem } from '../units/unit';
import type { Claim } from './claim';
import { cellAddress, type RawSheet } from './grid';
import type { RowSpan } from './positions';
import { isFilled } from './row-kind';

/** A sentence of the file that says from when its ages count. */
export interface ProseDatum {
  datum: 'b2k' | 'BP' | 'CE';
  quote: string;
  cell: string;
  sheet: string;
}

const AGES =
  /(?<!\p{L})(?:ages?|dates?|chronolog\p{L}*|time ?scales?|alters?(?:angaben)?|âges?|edades?)(?!\p{L})/iu;
/** In the order in which they are looked for; the words of one found are not read again as another ("before 2000 CE"). */
const DATA: [ProseDatum['datum'], RegExp][] = [
  [
    'b2k',
    /(?<!\p{L})b\s?2k(?!\p{L})|before (?:the year )?(?:AD )?2000(?: (?:CE|AD))?|vor 2000|avant 2000|antes de 2000/giu,
  ],
  [
    'BP',
    /(?<!\p{L})BP(?!\p{L})|before (?:the year )?(?:AD )?1950(?: (?:CE|AD))?|before present|vor 1950|avant 1950|antes de 1950/giu,
  ],
  ['CE', /(?<!\p{L})(?:CE|AD)(?!\p{L})|calendar years?/gu],
];
const LONGEST_SENTENCE = 300;

/**
 * The datum that the text above a table, or else the notes sheets, name for ages in general: "All ages are given in
 * b2k". Null where nothing is said, or two different things: then nobody can tell which is meant.
 */
export function datumInProse(sheet: RawSheet, span: RowSpan, notes: readonly RawSheet[]): ProseDatum | null {
  const own = sentences(sheet, span);
  const found =
    own.length > 0 ? own : notes.flatMap((one) => sentences(one, { from: 1, before: one.rows.length + 1 }));
  const data = new Set(found.map(({ datum }) => datum));
  return data.size === 1 ? (found[0] ?? null) : null;
}

function sentences(sheet: RawSheet, span: RowSpan): ProseDatum[] {
  const found: ProseDatum[] = [];
  for (let r = span.from - 1; r < Math.min(span.before - 1, sheet.rows.length); r += 1) {
    const cells = (sheet.rows[r] ?? []).filter(isFilled);
    // Text files cut at blanks give a word a cell, so the row is read as one text.
    const text = cells
      .map((cell) => cell.text.trim())
      .join(' ')
      .replace(/^#+\s*/, '');
    if (text.length > 5000 || /^Column\s+\d/i.test(text)) continue;
    for (const sentence of text.split(/(?<=[.;!?])\s+/)) {
      if (sentence.length > LONGEST_SENTENCE || !AGES.test(sentence)) continue;
      const named = dataNamed(sentence);
      const c = (sheet.rows[r] ?? []).findIndex(isFilled);
      if (named.length === 1 && named[0])
        found.push({
          datum: named[0],
          quote: sentence.trim().slice(0, 160),
          cell: cellAddress(c, r + 1),
          sheet: sheet.name,
        });
    }
  }
  return found;
}

function dataNamed(sentence: string): ProseDatum['datum'][] {
  let rest = sentence;
  return DATA.flatMap(([datum, words]) => {
    const without = rest.replace(words, ' ');
    const isNamed = without !== rest;
    rest = without;
    return isNamed ? [datum] : [];
  });
}

const AGE_FIELDS = new Set(['ageKaBp', 'ageYoungKaBp', 'ageOldKaBp']);
const YEARS: Record<number, string> = { 1: 'yr', 1000: 'kyr', 1000000: 'Ma' };

/** The error of an age without a unit of its own has that of the age. */
export function withUnitOfAge(claims: Claim[]): Claim[] {
  const age = claims.find(({ field }) => field === 'ageKaBp');
  if (!age || age.heading.unit === null) return claims;
  return claims.map((claim) =>
    claim.field !== 'ageSigmaKa' || claim.heading.unit !== null
      ? claim
      : {
          ...claim,
          heading: { ...claim.heading, unit: age.heading.unit },
          reason: `${claim.reason} It has no unit of its own; that of "${age.heading.text}" is taken.`,
        },
  );
}

/**
 * Adds the datum to ages whose column names none. A column without any unit takes it too where the datum is b2k,
 * which counts years by its definition (years before 2000 CE); years BP might be thousands and are left to a person.
 */
export function withProseDatum(claims: Claim[], prose: ProseDatum | null): Claim[] {
  if (!prose) return claims;
  return claims.map((claim) => {
    if (claim.field === null || !AGE_FIELDS.has(claim.field)) return claim;
    const { unit, text } = claim.heading;
    const parsed = parseAgeUnit(unit ?? '', `${text} `);
    const isOpen = isUnitProblem(parsed) ? unit === null && prose.datum === 'b2k' : parsed.datum === null;
    if (!isOpen) return claim;
    const years = isUnitProblem(parsed) ? 'yr' : (unit ?? YEARS[parsed.years] ?? 'yr');
    const counted = isUnitProblem(parsed) ? ' b2k counts years.' : '';
    return {
      ...claim,
      confidence: Math.max(claim.confidence, 0.7),
      heading: { ...claim.heading, unit: `${years} ${prose.datum}` },
      reason: `${claim.reason.replace(/ no unit of an age is given\./, ' the unit comes from the text.')} Cell ${prose.cell} of sheet "${prose.sheet}" says: "${prose.quote.replace(/\.$/, '')}".${counted}`,
    };
  });
}
