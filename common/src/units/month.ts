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
