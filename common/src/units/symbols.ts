import { DAYS_PER_YEAR } from '../physical/constants';
import { type Dimension, dimensionOf } from './unit';

/**
 * Unit symbols and words, each with its factor to gram, metre, Julian year (365.25 days) or degree.
 * SI prefixes after the SI Brochure (9th edition, 2019); words of other languages from memory.
 */
export interface UnitSymbol {
  factor: number;
  dimension: Dimension;
}

const MASS = dimensionOf({ mass: 1 });
const LENGTH = dimensionOf({ length: 1 });
const AREA = dimensionOf({ length: 2 });
const VOLUME = dimensionOf({ length: 3 });
const TIME = dimensionOf({ time: 1 });
const ANGLE = dimensionOf({ angle: 1 });
const NONE = dimensionOf({});

const PREFIXES: Record<string, number> = {
  P: 1e15, T: 1e12, G: 1e9, M: 1e6, k: 1e3, h: 1e2, d: 1e-1, c: 1e-2, m: 1e-3, μ: 1e-6, u: 1e-6, n: 1e-9, p: 1e-12, f: 1e-15,
}; // prettier-ignore
/** "ha" is a hectare and "ma", "da" are no years: a year takes only prefixes that make it longer. */
const YEAR_PREFIXES: Record<string, number> = { k: 1e3, M: 1e6, G: 1e9 };

const DAY = 1 / DAYS_PER_YEAR;
const WORDS: [string, number, Dimension][] = [
  ['kilogram kilograms kilogramm kilogramme kilogrammes kilogramo kilogramos', 1e3, MASS],
  ['gram grams gramm gramme grammes gramo gramos grammi grama gramas', 1, MASS],
  ['milligram milligrams milligramm milligrammes', 1e-3, MASS],
  ['microgram micrograms mikrogramm microgrammes mcg', 1e-6, MASS],
  ['nanogram nanograms nanogramm', 1e-9, MASS],
  ['t tonne tonnes Tonnen tonelada toneladas', 1e6, MASS],
  ['kt', 1e9, MASS],
  ['Mt', 1e12, MASS],
  ['mbsf mcd mbs rmcd', 1, LENGTH],
  ['metre metres meter meters Meter mètre mètres metro metros', 1, LENGTH],
  ['centimetre centimetres centimeter centimeters Zentimeter', 1e-2, LENGTH],
  ['millimetre millimetres millimeter millimeters Millimeter', 1e-3, LENGTH],
  ['kilometre kilometres kilometer kilometers Kilometer', 1e3, LENGTH],
  ['micrometre micrometres micrometer micrometers micron microns', 1e-6, LENGTH],
  ['nanometre nanometres nanometer nanometers', 1e-9, LENGTH],
  ['ft foot feet', 0.3048, LENGTH],
  ['ha hectare hectares Hektar', 1e4, AREA],
  ['sqm', 1, AREA],
  ['L l litre litres liter liters Liter', 1e-3, VOLUME],
  ['cc ccm', 1e-6, VOLUME],
  ['year years yr yrs y a ann annum Jahr Jahre Jahren an ans année années año años ano anos anno anni jaar år год лет', 1, TIME],
  ['ky kyrs kiloyear kiloyears kilo-year kya millennium millennia Jahrtausend', 1e3, TIME],
  ['My Myrs Mya', 1e6, TIME],
  ['Gya Gyrs', 1e9, TIME],
  ['century centuries', 100, TIME],
  ['decade decades', 10, TIME],
  ['month months mo mon Monat Monate mois mes meses', 1 / 12, TIME],
  ['week weeks wk Woche', 7 * DAY, TIME],
  ['day days d Tag Tage Tagen jour jours día días dia dias dag giorno giorni', DAY, TIME],
  ['hour hours h hr hrs Stunde heure hora', DAY / 24, TIME],
  ['min minute minutes', DAY / 1440, TIME],
  ['second seconds s sec Sekunde seconde segundo', DAY / 86400, TIME],
  ['° deg degs degree degrees Grad degré degrés grado grados °N °E °S °W degN degE degrees_north degrees_east', 1, ANGLE],
  ['arcmin', 1 / 60, ANGLE],
  ['rad radian radians', 180 / Math.PI, ANGLE],
  ['% percent Prozent pct porcentaje pourcent', 1e-2, NONE],
  ['‰ permil permille Promille', 1e-3, NONE],
  ['ppm ppmv', 1e-6, NONE],
  ['ppb ppbv', 1e-9, NONE],
  ['ppt pptv', 1e-12, NONE],
  ['fraction unitless dimensionless ratio dimensionslos sans_dimension adimensional', 1, NONE],
]; // prettier-ignore

/** Symbols that take any SI prefix. */
const PREFIXED: [string, number, Dimension][] = [
  ['g', 1, MASS],
  ['m', 1, LENGTH],
  ['L', 1e-3, VOLUME],
  ['l', 1e-3, VOLUME],
];
const YEAR_SYMBOLS = ['a', 'yr', 'y', 'ann', 'yrs'];

function buildTable(): Map<string, UnitSymbol> {
  const table = new Map<string, UnitSymbol>();
  for (const [symbol, factor, dimension] of PREFIXED) {
    table.set(symbol, { factor, dimension });
    for (const [prefix, scale] of Object.entries(PREFIXES)) {
      table.set(prefix + symbol, { factor: factor * scale, dimension });
    }
  }
  for (const year of YEAR_SYMBOLS) {
    for (const [prefix, scale] of Object.entries(YEAR_PREFIXES))
      table.set(prefix + year, { factor: scale, dimension: TIME });
  }
  for (const [words, factor, dimension] of WORDS) {
    for (const word of words.split(' ')) table.set(word, { factor, dimension });
  }
  return table;
}

const TABLE = buildTable();

/** Lower-case spelling → the symbols that would be spelled so; more than one meaning is never guessed. */
const FOLDED = new Map<string, UnitSymbol[]>();
for (const [symbol, unit] of TABLE) {
  const same = FOLDED.get(symbol.toLowerCase()) ?? [];
  if (!same.some((other) => other.factor === unit.factor && other.dimension === unit.dimension))
    same.push(unit);
  FOLDED.set(symbol.toLowerCase(), same);
}

export const isExactSymbol = (name: string): boolean => TABLE.has(name);

/** @returns the symbol exactly as spelled, or by another case where only one meaning is possible; 'ambiguous' where several are */
export function lookUpSymbol(name: string): UnitSymbol | 'ambiguous' | null {
  const exact = TABLE.get(name);
  if (exact) return exact;
  const folded = FOLDED.get(name.toLowerCase());
  if (!folded) return null;
  return folded.length === 1 ? (folded[0] ?? null) : 'ambiguous';
}

/** Symbols run together ("gm-2yr-1"): a mass and another unit, when the name can be cut in one way only. */
export function splitRunTogether(name: string): [UnitSymbol, UnitSymbol] | null {
  let found: [UnitSymbol, UnitSymbol] | null = null;
  for (let cut = 1; cut < name.length; cut += 1) {
    const left = TABLE.get(name.slice(0, cut));
    const right = TABLE.get(name.slice(cut));
    if (!left || !right || left.dimension.mass !== 1) continue;
    if (found) return null;
    found = [left, right];
  }
  return found;
}
