import { isMissingNumber, missingCodeOf } from './missing-code';
import { type NumberFormat } from './number-format';

/** What one cell's text says. `value` null: missing, below detection without a limit, or unreadable (then `problem`). */
export interface NumberReading {
  value: number | null;
  /** code that stands for "no value", as typed; '' for an empty cell */
  missing?: string;
  /** "<0.02": `value` is the limit; "bdl": no limit is given */
  belowDetection?: boolean;
  /** "0.50 ± 0.04" */
  plusMinus?: number;
  /** unit text found after the number */
  unitText?: string;
  /** footnote mark taken off, e.g. "*" */
  footnote?: string;
  problem?: { code: string; message: string };
}

const SIMPLE_POINT = /^-?\d+(?:\.\d+)?$/;
const SIMPLE_COMMA = /^-?\d+(?:,\d+)?$/;
const BELOW_WORDS =
  /^(?:<\s*)?(?:b\.?\s?d\.?\s?l\.?|l\.?o\.?d\.?|d\.?l\.?|below detection(?: limit)?|u\.?\s?n\.?\s?g\.?|unter nachweisgrenze|n\.?\s?n\.?)$/i;
const FOOTNOTE = /\s*([*†‡§¶#]+|\^?[¹²³⁴⁵⁶⁷⁸⁹]+)$/u;
const NUMBER =
  /^([+-]?)((?:\d[\d.,' ]*)?\d(?:[.,](?!\d))?|[.,]\d+)(?:\s*(?:[eE]|[x×*·]\s*10\s*\^?\s*)([+-]?\d+))?/u;

/**
 * Reads one number by the format decided for its column. Knows true minus signs, spaces that do not break,
 * powers of ten, "<0.02", "±", footnote marks, missing codes and a unit written behind the number.
 * A text that the format does not allow is a problem, never a guess.
 */
export function readNumber(text: string, format: NumberFormat): NumberReading {
  const simple = simpleNumber(text, format);
  if (simple !== null) return { value: simple };
  const plain = plainNumberText(text);
  const missing = missingCodeOf(plain);
  if (missing !== null) return { value: null, missing: text.trim() };
  if (BELOW_WORDS.test(plain)) return { value: null, belowDetection: true };
  const below = /^(?:<|≤|<=|&lt;)\s*/u.exec(plain);
  if (below) {
    const limit = readNumber(plain.slice(below[0].length), format);
    return limit.value === null ? unreadable(text) : { value: limit.value, belowDetection: true };
  }
  const halves = plain.split(/\s*(?:±|\+\/-|\+-)\s*/u);
  if (halves.length === 2) return withPlusMinus(text, halves[0] ?? '', halves[1] ?? '', format);
  return readPlain(text, plain, format);
}

/** The common case, without the work of the general one: digits with at most the decimal sign of the column. */
function simpleNumber(text: string, { decimalSign, undecided }: NumberFormat): number | null {
  const isSimple = decimalSign === '.' ? SIMPLE_POINT.test(text) : SIMPLE_COMMA.test(text);
  if (!isSimple || undecided) return null;
  const value = Number(decimalSign === '.' ? text : text.replace(',', '.'));
  return isMissingNumber(value) ? null : value + 0;
}

function plainNumberText(text: string): string {
  return text
    .replace(/[\u00a0\u2000-\u200a\u202f\u205f]/gu, ' ')
    .replace(/[−‐‑‒–—﹣-]/gu, '-')
    .replace(/[’´`]/gu, "'")
    .trim();
}

function withPlusMinus(text: string, left: string, right: string, format: NumberFormat): NumberReading {
  const value = readPlain(text, left, format);
  const spread = readPlain(text, right, format);
  if (value.problem || spread.problem || value.value === null || spread.value === null)
    return unreadable(text);
  const unitText = spread.unitText ?? value.unitText;
  return { value: value.value, plusMinus: spread.value, ...(unitText ? { unitText } : {}) };
}

function readPlain(text: string, plain: string, format: NumberFormat): NumberReading {
  const mark = FOOTNOTE.exec(plain);
  const body = mark ? plain.slice(0, mark.index) : plain;
  const found = NUMBER.exec(body);
  if (!found) return unreadable(text);
  const [whole, sign, digits = '', power] = found;
  const rest = body.slice(whole.length).trim();
  if (rest !== '' && !/^[\p{L}°%‰µμ(/[]/u.test(rest)) return unreadable(text);
  if (rest !== '' && /^[\p{L}]/u.test(rest) && /\d$/.test(whole) && /^[eE]\d/.test(rest))
    return unreadable(text);
  if (format.undecided && OPEN.test(digits.trim())) return ambiguous(text);
  const mantissa = digitsByFormat(digits.trim(), format);
  if (mantissa === null) return wrongFormat(text, format);
  const value = Number(`${sign}${mantissa}e${power ?? '0'}`) + 0;
  if (!Number.isFinite(value)) return unreadable(text);
  return { value, ...(mark?.[1] ? { footnote: mark[1] } : {}), ...(rest !== '' ? { unitText: rest } : {}) };
}

/** Three digits behind the only sign: decimal or thousands. */
const OPEN = /^(?!0)\d{1,3}[.,]\d{3}$/;

/** Digits with "." as decimal sign, by the format; null when the separators do not fit it. */
function digitsByFormat(digits: string, format: NumberFormat): string | null {
  if (/^\d+$/.test(digits)) return digits;
  const [whole = '', fraction, more] = digits.split(format.decimalSign);
  if (more !== undefined || (fraction !== undefined && /\D/.test(fraction))) return null;
  const plainWhole = ungroup(whole);
  return plainWhole === null || (/[.,]/.test(whole) && !fits(whole, format))
    ? null
    : `${plainWhole || '0'}.${fraction || '0'}`;
}

function fits(whole: string, format: NumberFormat): boolean {
  return [...whole].every((sign) => /\d/.test(sign) || sign === format.thousands);
}

/** "1 234 567" → "1234567"; null when the groups are not of three digits or the signs differ. */
function ungroup(whole: string): string | null {
  if (/^\d*$/.test(whole)) return whole;
  const grouped = /^\d{1,3}([.,' ])\d{3}(?:\1\d{3})*$/.test(whole);
  return grouped ? whole.replace(/\D/g, '') : null;
}

const unreadable = (text: string): NumberReading => ({
  value: null,
  problem: {
    code: 'not-a-number',
    message: `"${text.trim()}" is no number; type a number, or leave the cell empty if there is no value.`,
  },
});

const ambiguous = (text: string): NumberReading => ({
  value: null,
  problem: {
    code: 'ambiguous-number',
    message: `"${text.trim()}" can be read in two ways: its ${text.includes(',') ? 'comma' : 'point'} may be a decimal sign or part thousands. State the decimal sign of the column, or type the number without thousands separator.`,
  },
});

const wrongFormat = (text: string, format: NumberFormat): NumberReading => ({
  value: null,
  problem: {
    code: 'other-number-format',
    message: `"${text.trim()}" does not fit the decimal sign "${format.decimalSign}" of its column; type it with that sign and without thousands separators.`,
  },
});
