/** Pieces of a unit string: a symbol, a number, a power, a division, brackets. */
export type UnitToken =
  | { kind: 'symbol'; text: string }
  | { kind: 'number'; value: number }
  | { kind: 'power'; exponent: number }
  | { kind: 'divide' }
  | { kind: 'open' }
  | { kind: 'close' };

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹⁺⁻';
const PLAIN = '0123456789+-';
const PER_WORDS = /(?<![\p{L}])(per|pro|par|por|je|und|and)(?![\p{L}])/giu;
const AREA_WORDS: [RegExp, string][] = [
  [/\bsq(?:uare|\.)?[ -]?(cm|m|km|centimet(?:re|er)s?|met(?:re|er)s?|kilomet(?:re|er)s?)\b/gi, '$1^2'],
  [/\bcu(?:bic|\.)?[ -]?(cm|m|centimet(?:re|er)s?|met(?:re|er)s?)\b/gi, '$1^3'],
  [/\bquadrat(meter|zentimeter|kilometer)n?\b/gi, '$1^2'],
  [/\bkubik(meter|zentimeter)n?\b/gi, '$1^3'],
  [/\bm(?:è|e)tres? carr(?:é|e)s?/gi, 'm^2'],
  [/\bmetros? cuadrados?/gi, 'm^2'],
];

/**
 * Brings the spellings people use to one: superscripts to ^n, any minus to "-", any dot or cross of
 * multiplication to a space, TeX and HTML powers, square and cubic words, "per" in several languages to "/".
 */
export function plainUnitText(text: string): string {
  let plain = text.trim().replace(/[º˚]/gu, '°');
  plain = plain.replace(
    new RegExp(`[${SUPERSCRIPTS}]+`, 'gu'),
    (run) => `^${[...run].map((c) => PLAIN[SUPERSCRIPTS.indexOf(c)]).join('')}`,
  );
  plain = plain
    .normalize('NFKC')
    .replace(/µ/gu, 'μ')
    .replace(/[‐-―−]/gu, '-');
  plain = plain.replace(/per\s?cent\b/gi, '%').replace(/per\s?mil(?:le?)?\b/gi, '‰');
  plain = plain.replace(/\b(?:wt|vol|mass|gew)\.?[- ]?%/gi, '%').replace(/^x\s*(?=10)/i, '');
  for (const [words, power] of AREA_WORDS) plain = plain.replace(words, power);
  plain = plain.replace(/\\(?:mathrm|text|rm)|[${}\\~]/g, (found) => (found === '~' ? ' ' : ''));
  plain = plain.replace(/<\/?su[pb]>/gi, (tag) => (tag.toLowerCase() === '<sup>' ? '^' : ''));
  plain = plain
    .replace(/\*\*/g, '^')
    .replace(/[·⋅•∙×*]/gu, ' ')
    .replace(/÷/g, '/');
  plain = plain.replace(PER_WORDS, (word) => (/und|and/i.test(word) ? ' ' : '/'));
  return plain
    .replace(/(\p{L}|\d)\.(?=[\p{L}(])/gu, '$1 ')
    .replace(/\s*\/\s*/g, '/')
    .replace(/\/+/g, '/')
    .replace(/\s+/g, ' ')
    .trim();
}

const TOKEN =
  /\s*(?:(\^?\(?[+-]?\d+\)?(?![\d.]))|(\d+(?:[.,]\d+)?(?:[eE][+-]?\d+)?)|([\p{L}%‰°][\p{L}%‰°_]*)|(\/)|(\()|(\)))/uy;

/** Cuts plain unit text into tokens; null where a character belongs to no unit. */
export function unitTokens(plain: string): UnitToken[] | null {
  const tokens: UnitToken[] = [];
  TOKEN.lastIndex = 0;
  while (TOKEN.lastIndex < plain.length) {
    const found = TOKEN.exec(plain);
    if (!found) return null;
    const [whole, integer, decimal, symbol, slash, open] = found;
    if (symbol !== undefined) tokens.push({ kind: 'symbol', text: symbol });
    else if (integer !== undefined) tokens.push(integerToken(whole, integer, tokens));
    else if (decimal !== undefined) tokens.push({ kind: 'number', value: Number(decimal.replace(',', '.')) });
    else tokens.push({ kind: slash !== undefined ? 'divide' : open !== undefined ? 'open' : 'close' });
  }
  return tokens;
}

/** An integer is a power when it follows a symbol directly, or after a space with its sign ("m -2"), or bears "^". */
function integerToken(whole: string, integer: string, before: UnitToken[]): UnitToken {
  const value = Number(integer.replace(/[\^()]/g, ''));
  const previous = before.at(-1);
  const marked = integer.startsWith('^');
  const touching = !/^\s/.test(whole) || /^[+-]/.test(integer);
  const follows = previous !== undefined && (previous.kind === 'symbol' || previous.kind === 'close');
  const afterTen = previous?.kind === 'number' && (marked || /^[+-]/.test(integer));
  return (follows && touching) || marked || afterTen
    ? { kind: 'power', exponent: value }
    : { kind: 'number', value };
}
