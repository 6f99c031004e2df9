import { hemisphereOf, type EastLetter } from './hemisphere';
import { readNumber } from './number';
import { type NumberFormat } from './number-format';

export type Axis = 'latitude' | 'longitude';

export interface Coordinate {
  /** latitude −90 to 90, north positive; longitude −180 to 180, east positive [°] */
  degrees: number;
  /** how the text became the number */
  rule: string;
}

export interface CoordinateProblem {
  code: 'not-a-coordinate' | 'outside-range' | 'ambiguous-hemisphere' | 'sign-and-letter' | 'wrong-axis';
  message: string;
}

export interface CoordinateOptions {
  /** number format of the column; without it a comma is read as decimal sign */
  format?: NumberFormat;
  /** what the letter O means, where the column or language tells: "Ost" or "Ouest/Oeste" */
  letterO?: EastLetter;
}

export const isCoordinateProblem = (result: Coordinate | CoordinateProblem): result is CoordinateProblem =>
  'code' in result;

/**
 * Reads one coordinate: decimal degrees with point or comma, degrees–minutes–seconds in many spellings
 * (75°06'S, 75 06 S, 75d06m00s S, S75:06:00, 123°21,5' Ost), hemisphere letters and words of several languages,
 * longitudes of 0–360 folded to −180…180.
 *
 * @returns a problem for the letter O alone (East in German, West in French and Spanish), a sign with a letter,
 *   minutes or seconds of 60 and more, or a value out of range. Never throws, never guesses.
 */
export function parseCoordinate(
  text: string,
  axis: Axis,
  options: CoordinateOptions = {},
): Coordinate | CoordinateProblem {
  const simple = SIMPLE.test(text) ? valueOf(text.replace('-', ''), options.format) : null;
  if (simple !== null) return withinRange(text.startsWith('-') ? -simple : simple, axis, text, 1);
  const plain = text
    .replace(/[º˚]/gu, '°')
    .normalize('NFKC')
    .replace(/[−‐-–—]/gu, '-')
    .trim();
  const hemisphere = hemisphereOf(plain, options.letterO);
  if (hemisphere.kind === 'ambiguous') {
    return {
      code: 'ambiguous-hemisphere',
      message: `"${text.trim()}": the letter O means east in German and west in French or Spanish; write E or W.`,
    };
  }
  if (hemisphere.kind === 'found' && hemisphere.axis !== axis) {
    return {
      code: 'wrong-axis',
      message: `"${text.trim()}" is a ${hemisphere.axis}, in a column of ${axis}s; look whether the two columns are swapped.`,
    };
  }
  const magnitude = sexagesimal(hemisphere.rest, options.format);
  if (magnitude === null)
    return {
      code: 'not-a-coordinate',
      message: `"${text.trim()}" is no ${axis}; decimal degrees such as ${axis === 'latitude' ? '-75.10' : '123.35'} are wanted.`,
    };
  if (hemisphere.kind === 'found' && magnitude.negative) {
    return {
      code: 'sign-and-letter',
      message: `"${text.trim()}" has a minus sign and a hemisphere letter; keep one of them.`,
    };
  }
  const signed =
    (magnitude.negative || (hemisphere.kind === 'found' && hemisphere.negative) ? -1 : 1) * magnitude.degrees;
  return withinRange(signed, axis, text, magnitude.parts);
}

/** The common case, read without looking for hemispheres and minutes. */
const SIMPLE = /^-?\d+(?:[.,]\d+)?$/;

/** Range check and folding of a number of degrees. */
export function foldCoordinate(degrees: number, axis: Axis): Coordinate | CoordinateProblem {
  return withinRange(degrees, axis, String(degrees), 1);
}

function withinRange(
  degrees: number,
  axis: Axis,
  text: string,
  parts: number,
): Coordinate | CoordinateProblem {
  const [low, high] = axis === 'latitude' ? [-90, 90] : [-180, 360];
  if (degrees < low || degrees > high) {
    return {
      code: 'outside-range',
      message: `${axis} is ${text.trim()}; it must lie within ${low} to ${high} °.`,
    };
  }
  const rounded = Math.round(degrees * 1e9) / 1e9 + 0;
  const how = parts > 1 ? 'degrees and minutes → decimal degrees' : 'decimal degrees';
  if (rounded > 180)
    return { degrees: Math.round((rounded - 360) * 1e9) / 1e9 + 0, rule: `${how}, 0–360 − 360 = −180…180` };
  return { degrees: rounded, rule: how };
}

interface Magnitude {
  degrees: number;
  negative: boolean;
  parts: number;
}

const COMMA_OR_POINT: NumberFormat = {
  decimalSign: '.',
  thousands: '',
  undecided: false,
  reason: 'single coordinate',
};

/** Degrees of "75 06 30", "75°06.5'", "75,10": up to three parts, only the last with decimals. */
function sexagesimal(text: string, format?: NumberFormat): Magnitude | null {
  const negative = /^-/.test(text);
  const body = text.replace(/^[+-]\s*/, '');
  const pieces = body
    .replace(/(\d)\s*(?:°|d(?:eg)?\.?|grad|:|'|min)\s*(?=[\d.,])/giu, '$1 ')
    .replace(/(?:°|deg\.?|''|["″”“'′’ʹm]|min|sec|s)\s*$/giu, '')
    .replace(/["″”'′’ʹ:ms]/giu, ' ')
    .trim()
    .split(/\s+/);
  if (pieces.length > 3 || pieces.some((piece) => !/^\d+(?:[.,]\d+)?$/.test(piece))) return null;
  if (pieces.slice(0, -1).some((piece) => /[.,]/.test(piece))) return null;
  const numbers = pieces.map((piece) => valueOf(piece, format));
  if (numbers.some((n) => n === null)) return null;
  const [degrees = 0, minutes = 0, seconds = 0] = numbers as number[];
  if (minutes >= 60 || seconds >= 60) return null;
  return { degrees: degrees + minutes / 60 + seconds / 3600, negative, parts: pieces.length };
}

function valueOf(piece: string, format?: NumberFormat): number | null {
  const reading = format ? readNumber(piece, format) : readNumber(piece.replace(',', '.'), COMMA_OR_POINT);
  return reading.value;
}
