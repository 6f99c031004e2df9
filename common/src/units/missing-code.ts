/** Texts that stand for "no value" in several languages; common practice, no source. */
const WORDS = new Set(
  [
    '', '-', '--', '---', '.', '..', '...', '?', '*', 'nan', 'na', 'n/a', 'n.a.', 'n.a', '#n/a', 'null', 'nil', 'none', 'nd', 'n.d.',
    'n.d', 'no data', 'missing', 'miss', 'unknown', 'unk', 'void', 'tbd', 'k.a.', 'k. a.', 'k.a', 'keine angabe', 'fehlt', 's/d', 'sin dato', 'sin datos', 'n.c.', 'n/c', 'absent', 'manquant',
  ],
); // prettier-ignore

/** Numbers that stand for "no value"; always far below any age, position or flux, apart from the largest ones. */
const NUMBERS = new Set([
  -999, -999.9, -999.99, -999.999, -9999, -9999.9, -9999.99, -9999.999, -99999, -999999, -9999999, 9.96921e36,
  1e20, -1e34,
]);

const LONGEST_CODE = 16;

/** The code as a key for counting ("NaN", "-999", "" for an empty cell), or null when the text is none. */
export function missingCodeOf(text: string): string | null {
  const trimmed = text.trim();
  if (trimmed.length > LONGEST_CODE) return null;
  if (WORDS.has(trimmed.toLowerCase())) return trimmed;
  return /^-?\d/.test(trimmed) && isMissingNumber(Number(trimmed.replace(',', '.'))) ? trimmed : null;
}

export const isMissingNumber = (value: number): boolean => NUMBERS.has(value);
