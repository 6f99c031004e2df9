import { bothReadings, parseUnit } from './parse-unit';
import {
  dimensionOf,
  type Dimension,
  isUnitProblem,
  sameDimension,
  type Unit,
  type UnitProblem,
} from './unit';

/** Kinds of quantity a column can hold that convert by a factor alone (ages and positions: age.ts, coordinate.ts). */
export type UnitKind =
  | 'massFlux'
  | 'accumulation'
  | 'concentration'
  | 'massFraction'
  | 'dimensionless'
  | 'length'
  | 'wavelength'
  | 'grainSize'
  | 'density'
  | 'sedimentationRate'
  | 'duration'
  | 'angle'
  | 'massExtinction'
  | 'temperature'
  | 'moleFractionPpm'
  | 'moleFractionPpb';

interface KindDeclaration {
  canonical: string;
  dimension: Dimension;
  /** quantity in words, and examples, for messages */
  wanted: string;
}

const FLUX = dimensionOf({ mass: 1, length: -2, time: -1 });

export const UNIT_KINDS: Record<UnitKind, KindDeclaration> = {
  massFlux: { canonical: 'g m-2 yr-1', dimension: FLUX, wanted: 'a mass per area and time, such as g m-2 yr-1, mg m-2 d-1 or g cm-2 kyr-1' },
  accumulation: { canonical: 'kg m-2 yr-1', dimension: FLUX, wanted: 'a mass per area and time, such as kg m-2 yr-1, or a water or ice equivalent such as cm w.e. yr-1' },
  concentration: { canonical: 'ng/g', dimension: dimensionOf({}), wanted: 'a mass per mass, such as ng/g, µg/kg or ppb' },
  massFraction: { canonical: '1', dimension: dimensionOf({}), wanted: 'a fraction or per cent' },
  dimensionless: { canonical: '1', dimension: dimensionOf({}), wanted: 'a plain number without unit' },
  length: { canonical: 'm', dimension: dimensionOf({ length: 1 }), wanted: 'a length, such as m or cm' },
  wavelength: { canonical: 'nm', dimension: dimensionOf({ length: 1 }), wanted: 'a wavelength in nm or µm' },
  grainSize: { canonical: 'µm', dimension: dimensionOf({ length: 1 }), wanted: 'a diameter in µm' },
  density: { canonical: 'g cm-3', dimension: dimensionOf({ mass: 1, length: -3 }), wanted: 'a mass per volume, such as g cm-3 or kg m-3' },
  sedimentationRate: { canonical: 'cm kyr-1', dimension: dimensionOf({ length: 1, time: -1 }), wanted: 'a thickness per time, such as cm kyr-1 or mm/yr' },
  duration: { canonical: 'ka', dimension: dimensionOf({ time: 1 }), wanted: 'a length of time, such as yr, kyr or Ma' },
  angle: { canonical: '°', dimension: dimensionOf({ angle: 1 }), wanted: 'degrees' },
  massExtinction: { canonical: 'm2 g-1', dimension: dimensionOf({ length: 2, mass: -1 }), wanted: 'an area per mass, such as m2 g-1' },
  temperature: { canonical: 'K', dimension: dimensionOf({}), wanted: 'K, °C or °F' },
  moleFractionPpm: { canonical: 'ppm', dimension: dimensionOf({}), wanted: 'a mole fraction, such as ppm, ppb or µmol/mol' },
  moleFractionPpb: { canonical: 'ppb', dimension: dimensionOf({}), wanted: 'a mole fraction, such as ppb, ppm or nmol/mol' },
}; // prettier-ignore

/** value in canonical unit = value × factor + offset; `offset` is 0 for every kind but temperatures. */
export interface Conversion {
  factor: number;
  offset: number;
  canonical: string;
  /** shown to people: "mg m-2 yr-1 × 0.001 = g m-2 yr-1", and what had to be assumed */
  explanation: string;
  assumptions: string[];
}

/**
 * How to bring values in a unit, as typed, to the canonical unit of a kind of quantity. A year is 365.25 days.
 *
 * @returns factor and its explanation; or a UnitProblem naming the unit and what is wanted. Never throws.
 * Cautions: "g/m2 yr" is read by the rule first (g yr m-2); where that is no flux, as g/(m2 yr), and said so.
 */
export function convertTo(kind: UnitKind, unitText: string): Conversion | UnitProblem {
  const { canonical, dimension, wanted } = UNIT_KINDS[kind];
  if (kind === 'accumulation') {
    const equivalent = waterEquivalent(unitText);
    if (equivalent) return equivalent;
  }
  if (kind === 'temperature') return temperature(unitText, wanted);
  const isMoleFraction = kind === 'moleFractionPpm' || kind === 'moleFractionPpb';
  const readings = bothReadings(isMoleFraction ? plainMoleFraction(unitText) : unitText);
  const problem = readings.find(isUnitProblem);
  if (problem) return { ...problem, message: `${problem.message.replace(/\.$/, '')}; ${wanted} is wanted.` };
  const units = readings as Unit[];
  const fitting = units.find((unit) => sameDimension(unit.dimension, dimension));
  if (fitting) {
    const meant = fitting === units[0] ? [] : ['everything after "/" is taken as divisor'];
    return conversion(kind, fitting, [...fitting.notes, ...meant]);
  }
  if (kind === 'concentration') {
    const melt = units.find((unit) => sameDimension(unit.dimension, dimensionOf({ mass: 1, length: -3 })));
    // 1 g cm-3 = 1e6 g m-3: meltwater is analysed by volume and reported either way (common practice, no source).
    if (melt)
      return conversion(kind, { ...melt, factor: melt.factor / 1e6 }, ['meltwater is taken as 1 g cm-3']);
  }
  return {
    code: 'not-convertible',
    unitText: unitText.trim(),
    message: `"${unitText.trim()}" cannot be brought to ${canonical === '1' ? 'a plain number' : canonical}: ${wanted} is wanted.`,
  };
}

function conversion(kind: UnitKind, unit: Unit, assumptions: string[]): Conversion {
  const { canonical } = UNIT_KINDS[kind];
  const base = parseUnit(canonical) as Unit;
  const factor = tidy(unit.factor / base.factor);
  return {
    factor,
    offset: 0,
    canonical,
    explanation: explain(unit.text, factor, canonical, assumptions),
    assumptions,
  };
}

/** Takes the last bits of rounding off, so that 1e-3 × 1e4 is 10 and not 10.000000000000002. */
const tidy = (factor: number): number => Number(factor.toPrecision(15));

function explain(text: string, factor: number, canonical: string, assumptions: string[]): string {
  const name = canonical === '1' ? 'plain number' : canonical;
  const rule =
    text === canonical
      ? `${name}, as given`
      : factor === 1
        ? `${text} = ${name}`
        : `${text} × ${Number(factor.toPrecision(7))} = ${name}`;
  return [rule, ...assumptions].join('; ');
}

/** Density of glacier ice [kg m⁻³] behind "ice equivalent"; common practice, no source. */
const ICE_DENSITY_KG_M3 = 917;
const EQUIVALENT =
  /(?:w\.? ?e(?:q|quiv)?\.?|water[ -]eq(?:uiv(?:alent)?)?\.?|i\.? ?e(?:q|quiv)?\.?|ice[ -]eq(?:uiv(?:alent)?)?\.?)(?![\p{L}])/iu;

/** "cm w.e. yr-1", "m ice eq. a-1": a thickness per time of water (1000 kg m⁻³) or ice. */
function waterEquivalent(unitText: string): Conversion | null {
  const found = EQUIVALENT.exec(unitText);
  if (!found) return null;
  const unit = parseUnit(unitText.replace(EQUIVALENT, ' '));
  if (isUnitProblem(unit) || !sameDimension(unit.dimension, UNIT_KINDS.sedimentationRate.dimension))
    return null;
  const density = /^i/i.test(found[0]) ? ICE_DENSITY_KG_M3 : 1000;
  const assumptions = [`${density} kg m-3`];
  const factor = tidy(unit.factor * density);
  return {
    factor,
    offset: 0,
    canonical: 'kg m-2 yr-1',
    explanation: explain(unitText.trim(), factor, 'kg m-2 yr-1', assumptions),
    assumptions,
  };
}

/** Spellings of kelvin, degrees Celsius and degrees Fahrenheit, with the way to K; 273.15 K is 0 °C by definition. */
const TEMPERATURES: [RegExp, number, number][] = [
  [/^(?:K|°K|kelvins?)$/i, 1, 0],
  [/^(?:°\s?C|deg\.?\s?C|C|celsius|degrees? c(?:elsius)?|grad celsius)$/i, 1, 273.15],
  [/^(?:°\s?F|deg\.?\s?F|F|fahrenheit|degrees? f(?:ahrenheit)?)$/i, 5 / 9, 273.15 - (32 * 5) / 9],
];

function temperature(unitText: string, wanted: string): Conversion | UnitProblem {
  const text = unitText
    .trim()
    .replace(/[º˚]/gu, '°')
    .replace(/^℃$/u, '°C')
    .replace(/^\[(.*)\]$/, '$1');
  const found = TEMPERATURES.find(([spelling]) => spelling.test(text));
  if (!found) {
    const named = text === '' ? 'No unit is given' : `"${text}" is no unit of a temperature`;
    const code = text === '' ? 'empty-unit' : 'unknown-unit';
    return { code, unitText: text, message: `${named}; ${wanted} is wanted.` };
  }
  const [, factor, offset] = found;
  const shift = offset === 0 ? '' : ` + ${Number(offset.toFixed(4))}`;
  const explanation =
    factor === 1 && offset === 0 ? 'K, as given' : `${text} × ${Number(factor.toPrecision(7))}${shift} = K`;
  return { factor, offset, canonical: 'K', explanation, assumptions: [] };
}

/** "ppmv", "ppm by volume", "µmol/mol", "nmol mol-1" → "ppm", "ppb": in air a fraction of volume is one of molecules. */
function plainMoleFraction(unitText: string): string {
  const bare = unitText.trim().replace(/^[[(](.*)[\])]$/, '$1');
  const parts = /^pp(m|b|t)\s?v?(?:\s*\(?by vol(?:ume|\.)?\)?)?$/i.exec(bare);
  if (parts) return `pp${parts[1]!.toLowerCase()}`;
  const moles = /^([µμun])mol\s?(?:\/\s?mol|mol\^?[-−]1|mol⁻¹)$/u.exec(bare);
  return moles ? (moles[1] === 'n' ? 'ppb' : 'ppm') : unitText;
}

export { parseUnit };
