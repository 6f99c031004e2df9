import { missingCodeOf } from '../units/missing-code';
import type { RawCell } from './grid';

/** One row of a sheet, counted: what decides whether it holds data, headings, totals or prose. */
export interface RowShape {
  kind: 'blank' | 'numbers' | 'some-numbers' | 'text' | 'totals' | 'labels';
  filled: number;
  numbers: number;
  texts: number;
}

type Row = readonly (RawCell | null)[];

const TOTALS = new Set(
  'mean,average,avg,total,totals,sum,summe,gesamt,gesamtsumme,mittel,mittelwert,durchschnitt,moyenne,somme,total general,total général,media,promedio,suma,somma,gemiddelde,totaal,min,max,minimum,maximum,median,mediane,std,stdev,standard deviation,sd,count,n,standardabweichung,ecart type,écart type,ecart-type,écart-type,geometric mean,grand total,subtotal,zwischensumme,sous total,overall'.split(
    ',',
  ),
);
const LABELS = new Set(
  'latitude,lat,breite,latitud,latitudine,longitude,lon,long,länge,lange,laenge,longitud,longitudine,elevation,altitude,höhe,hoehe,hohe,coordinates,position,koordinaten,site,core,station'.split(
    ',',
  ),
);
const SIMPLE = /^-?\d+(?:[.,]\d+)?$/;
const NUMBER =
  /^[<≤~]?\s*[+\-−]?(?:\d|[.,]\d)[\d.,' \u00a0\u202f]*(?:[eE][+-]?\d+)?(?:\s*(?:±|\+\/-).*)?[*†‡§#]*$/u;

export const textOf = (cell: RawCell | null | undefined): string => cell?.text ?? '';
export const isFilled = (cell: RawCell | null | undefined): cell is RawCell =>
  cell != null && cell.text.trim() !== '';

/** True for a stored number or a text that reads as one. */
const isNumber = (cell: RawCell): boolean =>
  cell.kind === 'number' || cell.kind === 'error' || SIMPLE.test(cell.text) || NUMBER.test(cell.text.trim());

/** A number, or a missing code, for it stands where a number would. */
export const isNumberLike = (cell: RawCell): boolean => isNumber(cell) || missingCodeOf(cell.text) !== null;

export function shapeOf(row: Row | undefined): RowShape {
  let [filled, numbers, missing, texts] = [0, 0, 0, 0];
  let first: RawCell | null = null;
  for (const cell of row ?? []) {
    if (!isFilled(cell)) continue;
    first ??= cell;
    filled += 1;
    if (isNumber(cell)) numbers += 1;
    else if (missingCodeOf(cell.text) !== null) missing += 1;
    else if (cell.kind === 'text') texts += 1;
  }
  return { kind: kindOf(row ?? [], first, filled, numbers, missing), filled, numbers, texts };
}

function kindOf(
  row: Row,
  first: RawCell | null,
  filled: number,
  numbers: number,
  missing: number,
): RowShape['kind'] {
  if (first === null) return 'blank';
  if (first.text.trimStart().startsWith('#') || first.text.trimStart().startsWith('//')) return 'text';
  if (isTotalsLabel(first.text)) return numbers > 0 || filled === 1 ? 'totals' : 'text';
  if (numbers === 0) return 'text';
  if (hasLabel(row)) return 'labels';
  return numbers + missing >= 2 && (numbers + missing) / filled >= 0.25 ? 'numbers' : 'some-numbers';
}

/** A label as compared: lower case, without a unit, dots or a colon. Plain, for it is asked of every row. */
function labelKey(text: string): string {
  if (text.length > 40) return '';
  return text
    .replace(/\s*[([].*$/, '')
    .replace(/[.:=*]/g, '')
    .trim()
    .toLowerCase();
}

const isTotalsLabel = (text: string): boolean => TOTALS.has(labelKey(text));

/** "Latitude | 75°06'S", "lat | 75.1": a label with its value to the right. */
function hasLabel(row: Row): boolean {
  for (const [i, cell] of row.entries()) {
    if (!isFilled(cell) || cell.kind !== 'text' || !LABELS.has(labelKey(cell.text))) continue;
    const next = row.slice(i + 1).find(isFilled);
    if (next && /\d/.test(next.text)) return true;
  }
  return false;
}
