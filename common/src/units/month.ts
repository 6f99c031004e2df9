/** Beginnings of month names in English, German, French, Spanish, Italian and Portuguese; from memory. */
const MONTHS = [
  'jan|ene|gen', 'feb|fev|fév', 'mar|mär|mrz|maer', 'apr|avr|abr', 'may|mai|mag', 'jun|juin|giu',
  'jul|juil|lug', 'aug|aou|aoû|ago', 'sep|set', 'oct|okt|ott|out', 'nov', 'dec|dez|déc|dic',
].map((names) => new RegExp(`^(?:${names})\\p{L}*\\.?$`, 'iu')); // prettier-ignore

const ANNUAL = /^(?:annual(?: mean)?|ann\.?|year(?:ly)?|mean|jahr(?:esmittel)?|annuel(?:le)?|anual|all)$/i;

/** 1 to 12, 'annual', or null when the text names neither: "Jan", "März", "03", "m7", "annual mean". */
export function monthOf(text: string): number | 'annual' | null {
  const plain = text.trim();
  const number = /^(?:m(?:onth)?\s?)?0?(\d{1,2})(?:\.0*)?$/i.exec(plain);
  if (number) {
    const month = Number(number[1]);
    return month >= 1 && month <= 12 ? month : null;
  }
  if (ANNUAL.test(plain)) return 'annual';
  const found = MONTHS.findIndex((names) => names.test(plain));
  return found < 0 ? null : found + 1;
}

/**
 * The month a date falls in, 1 to 12; null for a year alone and for what is no date.
 * "2001-06", "2001-06-15", "15.06.2001", "01:06:2000" (day first, unless only the other way is possible), "15 June 2001".
 */
export function monthOfDate(text: string): number | null {
  const plain = text.trim();
  const yearFirst = /^\d{4}[-/.:](\d{1,2})(?!\d)/.exec(plain);
  if (yearFirst) return inYear(Number(yearFirst[1]));
  const dayFirst = /^(\d{1,2})[-/.:](\d{1,2})[-/.:]\d{2,4}(?!\d)/.exec(plain);
  if (dayFirst) return inYear(Number(dayFirst[2])) ?? inYear(Number(dayFirst[1]));
  const named = (plain.match(/\p{L}{3,}\.?/gu) ?? []).map(monthOf).find((month) => typeof month === 'number');
  if (typeof named === 'number') return named;
  const month = monthOf(plain);
  return typeof month === 'number' ? month : null;
}

const inYear = (month: number): number | null => (month >= 1 && month <= 12 ? month : null);
