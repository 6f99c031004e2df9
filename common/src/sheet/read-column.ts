import type { FieldDeclaration } from '../dataset/field';
import type { TracedValue } from '../dataset/sample-row';
import { type Axis, foldCoordinate, isCoordinateProblem, parseCoordinate } from '../units/coordinate';
import { type EastLetter, letterOMeaning } from '../units/hemisphere';
import { isMissingNumber, missingCodeOf } from '../units/missing-code';
import { monthOf } from '../units/month';
import { type NumberReading, readNumber } from '../units/number';
import { DECIMAL_POINT, type NumberFormat } from '../units/number-format';
import { type ColumnScale, type ColumnSource, scaleOf } from './column-scale';
import type { RawCell } from './grid';

/** Everything needed to read the cells of one column, decided once. */
export interface ColumnReader {
  field: FieldDeclaration;
  scale: ColumnScale;
  format: NumberFormat;
  letterO: EastLetter | undefined;
  divisor: number;
}

export function columnReader(source: ColumnSource, format: NumberFormat, texts: string[]): ColumnReader {
  const { field, divisor } = source;
  const letterO = field.quantity === 'longitude' ? letterOMeaning(texts, source.heading) : undefined;
  return { field, scale: scaleOf(source), format, letterO, divisor };
}

export interface CellReading {
  value: number | string | null;
  traced: TracedValue;
  /** one standard error from "0.50 ± 0.04" in the same cell, canonical */
  plusMinus?: number;
  missing?: string;
}

/**
 * Reads one cell with its column's reader into a canonical value with its whole way.
 * A value outside the closed range of its field, in a unit that does not convert, or not readable is a problem
 * with a code and never a number.
 */
export function readCell(
  cell: RawCell | null,
  address: string | null,
  mended: string | undefined,
  reader: ColumnReader,
): CellReading {
  const traced: TracedValue = {
    cell: address,
    raw: cell?.text ?? '',
    value: null,
    unit: reader.field.canonicalUnit,
    rule: reader.scale.rule,
  };
  if (mended !== undefined) traced.mended = mended;
  const text = mended ?? traced.raw;
  if (text.trim() === '') return { value: null, traced: { ...traced, rule: 'empty' } };
  if (mended === undefined && cell?.kind === 'error')
    return refused(traced, 'error-cell', `"${text}" is an error of the spreadsheet; type the value.`);
  const { quantity } = reader.field;
  if (quantity === 'text') return readText(text, traced);
  if (quantity === 'month') return readMonth(text, traced);
  if (mended === undefined && cell?.kind === 'date')
    return refused(traced, 'date-cell', `"${text}" is a date where a number is wanted; type the number.`);
  if (quantity === 'latitude' || quantity === 'longitude')
    return readPosition(text, cell, mended, quantity, traced, reader);
  return readQuantity(
    text,
    mended === undefined ? cell?.number : undefined,
    mended !== undefined,
    traced,
    reader,
  );
}

/** "0.50 ± 0.04": the second number as a value of its own, the uncertainty of the first. */
export function spreadOf({ traced, plusMinus }: CellReading): Pick<CellReading, 'value' | 'traced'> {
  const value = plusMinus ?? null;
  const spread = { ...traced, value, rule: `behind ± in the same cell; ${traced.rule}` };
  return { value, traced: spread };
}

function refused(traced: TracedValue, code: string, message: string): CellReading {
  traced.problem = { code, message };
  return { value: null, traced };
}

function readText(text: string, traced: TracedValue): CellReading {
  const missing = missingCodeOf(text);
  traced.rule = missing === null ? 'as given' : 'missing code';
  traced.value = missing === null ? text.trim() : null;
  return { value: traced.value, traced };
}

function readMonth(text: string, traced: TracedValue): CellReading {
  if (missingCodeOf(text) !== null) return asMissing(text, traced);
  const month = monthOf(text);
  if (month === null)
    return refused(
      traced,
      'no-month',
      `"${text.trim()}" is no month; 1 to 12, a name or "annual" is wanted.`,
    );
  traced.rule = month === 'annual' ? 'the mean of the year' : 'number of the month';
  traced.value = month;
  return { value: month, traced };
}

function readPosition(
  text: string,
  cell: RawCell | null,
  mended: string | undefined,
  axis: Axis,
  traced: TracedValue,
  reader: ColumnReader,
): CellReading {
  const missing = missingCodeOf(text);
  if (missing !== null) return asMissing(text, traced);
  const options = {
    ...(mended === undefined ? { format: reader.format } : {}),
    ...(reader.letterO ? { letterO: reader.letterO } : {}),
  };
  const stored = mended === undefined && cell?.kind === 'number' ? cell.number : undefined;
  const result = stored === undefined ? parseCoordinate(text, axis, options) : foldCoordinate(stored, axis);
  if (isCoordinateProblem(result)) return refused(traced, result.code, result.message);
  traced.rule = result.rule;
  traced.value = result.degrees;
  return { value: result.degrees, traced };
}

function asMissing(text: string, traced: TracedValue): CellReading {
  traced.rule = 'missing code';
  return { value: null, traced, missing: text.trim() };
}

function readQuantity(
  text: string,
  stored: number | undefined,
  isMend: boolean,
  traced: TracedValue,
  reader: ColumnReader,
): CellReading {
  const reading = stored === undefined ? readTyped(text, isMend, reader.format) : readStored(stored, text);
  if (reading.missing !== undefined) return asMissing(text, traced);
  if (reading.problem) return refused(traced, reading.problem.code, reading.problem.message);
  if (reading.value === null) {
    traced.belowDetection = true;
    traced.rule = 'below detection, no limit given';
    return { value: null, traced, missing: text.trim() };
  }
  const scale = reading.unitText === undefined ? reader.scale : cellScale(reading.unitText, reader);
  if (scale.problem) return refused(traced, scale.problem.code, scale.problem.message);
  const value = canonical(reading.value, scale);
  const outside = rangeProblem(value, text, reader.field);
  if (outside) return refused(traced, 'outside-range', outside);
  traced.rule = reading.belowDetection ? `${scale.rule}; a detection limit, not a value` : scale.rule;
  traced.value = value;
  if (reading.belowDetection) {
    traced.belowDetection = true;
    return { value: null, traced, missing: text.trim() };
  }
  return {
    value,
    traced,
    ...(reading.plusMinus === undefined
      ? {}
      : { plusMinus: canonical(reading.plusMinus, { ...scale, offset: 0 }) }),
  };
}

const readStored = (stored: number, text: string): NumberReading =>
  isMissingNumber(stored) ? { value: null, missing: text } : { value: stored };

/** A mend is typed by a person who may write a decimal point whatever the file has; an ambiguous one is still refused. */
function readTyped(text: string, isMend: boolean, format: NumberFormat): NumberReading {
  const reading = readNumber(text, format);
  return isMend && reading.problem?.code === 'other-number-format'
    ? readNumber(text, DECIMAL_POINT)
    : reading;
}

/** A unit written behind the number counts for that cell. */
function cellScale(unitText: string, reader: ColumnReader): ColumnScale {
  return scaleOf({
    field: reader.field,
    heading: '',
    unit: unitText.replace(/^[([]|[)\]]$/g, ''),
    divisor: reader.divisor,
  });
}

/** 12 digits: what a double loses in a product, and more than any measurement has. */
const canonical = (value: number, scale: Pick<ColumnScale, 'factor' | 'offset'>): number =>
  scale.factor === 1 && scale.offset === 0
    ? value
    : Number((value * scale.factor + scale.offset).toPrecision(12));

function rangeProblem(
  value: number,
  text: string,
  { title, min, max, canonicalUnit }: FieldDeclaration,
): string | null {
  if ((min === undefined || value >= min) && (max === undefined || value <= max)) return null;
  const unit = canonicalUnit === '1' || canonicalUnit === '' ? '' : ` ${canonicalUnit}`;
  return `${title} is ${text.trim()}${unit === '' ? '' : `, that is ${value}${unit}`}; it must lie within ${min ?? '−∞'} to ${max ?? '∞'}${unit}.`;
}
