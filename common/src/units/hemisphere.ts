import type { Axis } from './coordinate';

export type EastLetter = 'east' | 'west';

export type Hemisphere =
  | { kind: 'none'; rest: string }
  | { kind: 'ambiguous'; rest: string }
  | { kind: 'found'; axis: Axis; negative: boolean; rest: string };

/** Hemisphere words and letters in English, German, French, Spanish, Italian, Portuguese, Dutch, Nordic languages and Russian; from memory. */
const WORDS: [RegExp, Axis, boolean][] = [
  [/(?<!\p{L})(?:n|north|nord|norte|noord|norr|с\.? ?ш)\.?(?!\p{L})/iu, 'latitude', false],
  [/(?<!\p{L})(?:south|süd|sued|sud|sur|sul|zuid|z|syd|söder|ю\.? ?ш)\.?(?!\p{L})/iu, 'latitude', true],
  [/(?<!\p{L})(?:e|east|ost|oost|est|este|leste|øst|ø|öst|в\.? ?д)\.?(?!\p{L})/iu, 'longitude', false],
  [/(?<!\p{L})(?:w|west|ouest|oeste|ovest|vest|väst|з\.? ?д)\.?(?!\p{L})/iu, 'longitude', true],
];
/** A lone S at either end; not the s of seconds, which follows a digit and is followed by nothing but a letter. */
const SOUTH = /^\s*s(?=[\s\d])|(?:[\d°'"″′”’ʹ]|\s)\s*S\s*$|[°'"″′]\s*s\s*$/u;
const LETTER_O = /(?<!\p{L})o\.?(?!\p{L})/iu;

/** Finds and takes off the hemisphere of a coordinate text. */
export function hemisphereOf(text: string, letterO?: EastLetter): Hemisphere {
  for (const [word, axis, negative] of WORDS) {
    if (word.test(text)) return { kind: 'found', axis, negative, rest: text.replace(word, ' ').trim() };
  }
  if (LETTER_O.test(text)) {
    const rest = text.replace(LETTER_O, ' ').trim();
    return letterO
      ? { kind: 'found', axis: 'longitude', negative: letterO === 'west', rest }
      : { kind: 'ambiguous', rest };
  }
  if (SOUTH.test(text) || /^\s*S/.test(text)) {
    return {
      kind: 'found',
      axis: 'latitude',
      negative: true,
      rest: text.replace(/^\s*s|s\s*$/iu, ' ').trim(),
    };
  }
  return { kind: 'none', rest: text };
}

/**
 * What the letter O stands for in a column of longitudes: west when E also occurs, east when W also occurs,
 * else by the language of the heading; undefined when nothing tells.
 */
export function letterOMeaning(texts: string[], heading: string): EastLetter | undefined {
  const letters = new Set(
    texts.flatMap((text) => text.toUpperCase().match(/(?<!\p{L})[EOW](?!\p{L})/gu) ?? []),
  );
  if (!letters.has('O')) return undefined;
  if (letters.has('W') && !letters.has('E')) return 'east';
  if (letters.has('E') && !letters.has('W')) return 'west';
  if (/länge|laenge|oost|ost/i.test(heading)) return 'east';
  return /longitud|longitudine/i.test(heading) ? 'west' : undefined;
}
