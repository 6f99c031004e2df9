import { parseAgeUnit } from '../units/age';
import { parseUnit } from '../units/parse-unit';
import { isUnitProblem } from '../units/unit';

/** A column heading taken apart. */
export interface Heading {
  /** as typed, the header rows joined */
  text: string;
  /** without its unit */
  name: string;
  /** lower case, without accents and punctuation, as synonyms are declared */
  key: string;
  /** unit found in the heading itself */
  unit: string | null;
}

/** Words of statistics that happen to look like units or stand in a second header row. */
const STATISTIC =
  /^(?:n|mean|average|mittel|mittelwert|moyenne|media|s\.?d\.?|sd|se|s\.?e\.?m?\.?|std\.?|error|err|min|max|median|count|±|[12]\s?(?:σ|s|sd|sigma).*)$/iu;

/** True for a text a person would put into a units row: "ng/g", "ka BP", "°"; false for "mean" or "s.d.". */
export function looksLikeUnit(text: string): boolean {
  const trimmed = text.trim().replace(/^[[(]|[\])]$/g, '');
  if (trimmed === '' || trimmed.length > 40 || STATISTIC.test(trimmed) || /^\d+\s?\p{L}?$/u.test(trimmed))
    return false;
  if (/^(?:(?:°|º|deg\.?)\s?[CF]|℃|K|[Kk]elvin|[Cc]elsius)$/u.test(trimmed)) return true;
  return !isUnitProblem(parseUnit(trimmed)) || (isAgeText(trimmed) && !isUnitProblem(parseAgeUnit(trimmed)));
}

const AGE_WORDS = new Set(
  'cal calibrated c bp b2k b 2k p k y r ka kyr kyrs ky kya yr yrs year years a ma myr my mya ann ce ad bce bc d e before present ago prior to the vor v heute n chr avant av antes de del an ans jc j jahr jahre jahren ano anos año años année années calendar million thousand tausend millionen'.split(
    ' ',
  ),
);

/** True when every word belongs to an age: "cal kyr BP", "a v. 1950"; a unit among other words is no unit text. */
const isAgeText = (text: string): boolean =>
  (text.toLowerCase().match(/\p{L}[\p{L}\d]*/gu) ?? []).every(
    (word) => AGE_WORDS.has(word) || /^(?:k?yrs?|k?a)(?:bp|b2k)$/.test(word),
  ) && !/[/^]/.test(text);

/** A text in unit position that is meant as a unit though it is none that we know: it has a slash or a power. */
const looksAttempted = (text: string): boolean => /\p{L}\s?\/|\p{L}\s?\^?[-−]\d|[⁻²³]/u.test(text);

/** "Laser Dust", "lange", "ca2": the form in which headings are compared. */
export function headingKey(text: string): string {
  return text
    .replace(/([a-z\d])([A-Z])/g, '$1 $2')
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/ß/g, 'ss')
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}

/** Takes a unit out of a heading: "Breite (°)", "Flux [g/m2/a]", "Depth / m", "Age / kyr, EDC3", "flux_g_m2_yr". */
export function splitHeading(text: string): Heading {
  const typed = text.replace(/\s+/g, ' ').trim();
  const found = bracketedUnit(typed) ?? slashedUnit(typed) ?? underscoredUnit(typed);
  const name = (found?.name ?? typed).trim();
  return { text: typed, name, key: headingKey(name), unit: found?.unit ?? null };
}

interface Split {
  name: string;
  unit: string;
}

function bracketedUnit(text: string): Split | null {
  for (const found of text.matchAll(/\(([^()]*(?:\([^()]*\)[^()]*)?)\)|\[([^\]]*)\]/g)) {
    const inner = (found[1] ?? found[2] ?? '').trim();
    if (!looksLikeUnit(inner) && (STATISTIC.test(inner) || !looksAttempted(inner))) continue;
    return {
      name: `${text.slice(0, found.index)} ${text.slice(found.index + found[0].length)}`,
      unit: inner,
    };
  }
  return null;
}

function slashedUnit(text: string): Split | null {
  const found = /^(.*?\p{L}.*?)(?:\s+\/\s*|,\s*|\s+in\s+)([^,]+)(,.*)?$/u.exec(text);
  if (!found || !looksLikeUnit(found[2] ?? '')) return null;
  return { name: `${found[1]}${found[3] ?? ''}`, unit: (found[2] ?? '').trim() };
}

function underscoredUnit(text: string): Split | null {
  for (let at = text.indexOf('_'); at > 0; at = text.indexOf('_', at + 1)) {
    const unit = text.slice(at + 1);
    if (/^\p{L}/u.test(unit) && looksLikeUnit(unit)) return { name: text.slice(0, at), unit };
  }
  return null;
}

export interface Uncertainty {
  /** the heading without the words of uncertainty, as a key; '' when it is nothing else */
  baseKey: string;
  /** how many standard errors the number is */
  sigmas: 1 | 2;
  /** true: a standard deviation of samples, not the error of their mean */
  deviation: boolean;
}

const UNCERTAINTY =
  /±|[12]?\s?σ|(?<![\p{L}\d])[12]\s?(?:s|se|sd|sigma)(?![\p{L}])|sigma|(?<!\p{L})err(?:or|eur|ore|o)?s?(?!\p{L})|uncert\p{L}*|fehler|unsicherheit|incertitude|incertidumbre|incerte\p{L}*|(?<!\p{L})s\.?\s?[de]\.?m?\.?(?!\p{L})|(?<!\p{L})std(?:ev|dev|err)?\.?(?!\p{L})|standard(?:abweichung| deviation| error)|ecart[- ]type|écart[- ]type/giu;

/** @returns what a heading of an uncertainty says, or null when it heads no uncertainty */
export function uncertaintyOf(heading: Heading): Uncertainty | null {
  const found = heading.text.match(UNCERTAINTY);
  if (!found) return null;
  const words = found.join(' ');
  return {
    baseKey: headingKey(
      heading.name
        .replace(UNCERTAINTY, ' ')
        .replace(/(?<!\p{L})(?:of|der|des|de|the|standard|mean)(?!\p{L})/giu, ' ')
        .replace(/\(\s*\)/g, ' '),
    ),
    sigmas: /2\s?(?:σ|s|sigma)/iu.test(words) ? 2 : 1,
    deviation: /s\.?\s?d|std(?!err)|abweichung|deviation|cart/iu.test(words),
  };
}
