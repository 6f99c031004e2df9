import { isExactSymbol, lookUpSymbol, splitRunTogether, type UnitSymbol } from './symbols';
import { plainUnitText, type UnitToken, unitTokens } from './tokens';
import { addPower, dimensionOf, isUnitProblem, type Unit, type UnitProblem } from './unit';

/** Words that say what is weighed, not in which unit; passed over and said so. */
const INERT = new Set(
  'dust staub ice eis snow water wasser sediment dry trocken sample of ca nssca fe al ti th dw eolian aeolian mineral'.split(
    ' ',
  ),
);

export interface ParseUnitOptions {
  /** true: everything after the first "/" divides ("g/m2 yr"), as people often mean it; false: only the next symbol, by the rule */
  slashCoversRest?: boolean;
}

/**
 * Reads a unit string as people type it: "g m-2 yr-1", "g/m2/a", "mg·m⁻²·d⁻¹", "µg per square metre per year",
 * "10-3 g/(m2 yr)", "g/cc". Left to right, a "/" divides by the next symbol or bracket only.
 *
 * @returns factor to g, m, Julian year (365.25 d), degree, and the dimension; or a UnitProblem
 *   `empty-unit`, `unknown-unit`, `ambiguous-unit` ("MG" may be mg or Mg). Never throws.
 * Cautions: case matters ("Mg" is a megagram); another case is taken only where it has one meaning.
 * Calendar words such as BP or b2k are no units: see age.ts.
 */
export function parseUnit(text: string, options: ParseUnitOptions = {}): Unit | UnitProblem {
  const typed = text.trim();
  const bare = stripOuterBrackets(plainUnitText(typed));
  if (bare === '') return problem('empty-unit', typed, 'No unit is given');
  if (bare === '-' || bare === '1' || bare === '[-]')
    return { text: typed, factor: 1, dimension: dimensionOf({}), notes: [] };
  const tokens = unitTokens(underscoresAsDivision(bare));
  if (!tokens) return problem('unknown-unit', typed, `"${typed}" holds a sign that belongs to no unit`);
  const unit = { text: typed, factor: 1, dimension: dimensionOf({}), notes: [] };
  return evaluate(tokens, unit, options);
}

/** "g_m2_yr" as column names of text files have it: what follows the first underscore divides. */
function underscoresAsDivision(text: string): string {
  if (!text.includes('_') || text.includes('/') || lookUpSymbol(text)) return text;
  return text.includes('-') ? text.replace(/_/g, ' ') : text.replace(/_(?:per_)?/g, '/');
}

function stripOuterBrackets(text: string): string {
  const inner = /^\[([^[\]]*)\]$|^\(([^()]*)\)$/.exec(text);
  return inner ? (inner[1] ?? inner[2] ?? '').trim() : text.replace(/\[/g, '(').replace(/\]/g, ')');
}

function problem(code: UnitProblem['code'], unitText: string, message: string): UnitProblem {
  return { code, unitText, message: `${message}.` };
}

function evaluate(tokens: UnitToken[], unit: Unit, options: ParseUnitOptions): Unit | UnitProblem {
  const signs: number[] = [1];
  let divideNext = false;
  let counted = 0;
  for (const [i, token] of tokens.entries()) {
    if (token.kind === 'power') continue;
    if (token.kind === 'divide') {
      divideNext = true;
      continue;
    }
    if (token.kind === 'close') {
      signs.pop();
      continue;
    }
    const sign = (signs.at(-1) ?? 1) * (divideNext ? -1 : 1);
    if (!options.slashCoversRest || token.kind === 'open') divideNext = false;
    if (token.kind === 'open') {
      signs.push(sign);
      continue;
    }
    const next = tokens[i + 1];
    const exponent = sign * (next?.kind === 'power' ? next.exponent : 1);
    const failed =
      token.kind === 'number'
        ? applyNumber(unit, token.value, exponent)
        : applySymbol(unit, token.text, exponent, sign);
    if (failed) return failed;
    if (token.kind === 'number' || !INERT.has(token.text.toLowerCase())) counted += 1;
  }
  if (counted === 0) return problem('unknown-unit', unit.text, `"${unit.text}" is no known unit`);
  return unit;
}

function applyNumber(unit: Unit, value: number, exponent: number): UnitProblem | null {
  if (value === 0)
    return problem('unknown-unit', unit.text, `"${unit.text}" is no known unit: its factor is 0`);
  unit.factor *= value ** exponent;
  return null;
}

function applySymbol(unit: Unit, name: string, exponent: number, sign: number): UnitProblem | null {
  if (INERT.has(name.toLowerCase())) {
    unit.notes.push(`"${name}" says what is measured and is passed over`);
    return null;
  }
  const parts = isExactSymbol(name) ? null : splitRunTogether(name);
  if (parts) {
    unit.notes.push(`"${name}" is read as two units run together`);
    return multiply(unit, [
      [parts[0], sign],
      [parts[1], exponent],
    ]);
  }
  const found = lookUpSymbol(name);
  if (found === 'ambiguous') {
    return problem(
      'ambiguous-unit',
      unit.text,
      `"${name}" in "${unit.text}" can mean more than one unit; write it in its exact case, such as mg or Mg`,
    );
  }
  if (found) return multiply(unit, [[found, exponent]]);
  const where = name === unit.text ? '' : ` in "${unit.text}"`;
  return problem('unknown-unit', unit.text, `"${name}"${where} is no known unit`);
}

function multiply(unit: Unit, parts: [UnitSymbol, number][]): null {
  for (const [symbol, exponent] of parts) {
    unit.factor *= symbol.factor ** exponent;
    unit.dimension = addPower(unit.dimension, symbol.dimension, exponent);
  }
  return null;
}

/** Both readings of a text with one "/" before several units: by the rule, and as often meant. */
export function bothReadings(text: string): (Unit | UnitProblem)[] {
  const byRule = parseUnit(text);
  const plain = plainUnitText(text);
  if (isUnitProblem(byRule) || !/\/[^/()]*[\p{L}\d]\s+\p{L}[^/]*$/u.test(plain)) return [byRule];
  return [byRule, parseUnit(text, { slashCoversRest: true })];
}
