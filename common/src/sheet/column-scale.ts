import type { FieldDeclaration } from '../dataset/field';
import { ageConversion, parseAgeUnit } from '../units/age';
import { convertTo } from '../units/convert';
import { isUnitProblem } from '../units/unit';

/** How values of one column become canonical: value × factor + offset, or why they cannot. */
export interface ColumnScale {
  factor: number;
  offset: number;
  rule: string;
  problem?: { code: string; message: string };
  /** what a person should know of the whole column */
  notes: { code: string; message: string }[];
}

export interface ColumnSource {
  field: FieldDeclaration;
  heading: string;
  unit: string | null;
  /** numbers are divided by it: 2 for a column headed 2σ */
  divisor: number;
  /** datum of ages that name none, as the form says it: "b2k", "CE", "BP 1950" */
  ageDatum?: string;
}

/** Settles unit and datum of a column once; a unit that does not fit becomes the problem of every cell. */
export function scaleOf({ field, heading, unit, divisor, ageDatum }: ColumnSource): ColumnScale {
  const halved = divisor === 1 ? '' : ` ÷ ${divisor}`;
  const { quantity } = field;
  if (quantity === 'text' || quantity === 'count' || quantity === 'month')
    return { factor: 1, offset: 0, rule: 'as given', notes: [] };
  if (quantity === 'asGiven')
    return {
      factor: 1 / divisor,
      offset: 0,
      rule: `as given${unit === null ? '' : `, in ${unit}`}${halved}`,
      notes: [],
    };
  if (quantity === 'latitude' || quantity === 'longitude')
    return { factor: 1, offset: 0, rule: 'decimal degrees', notes: [] };
  if (quantity === 'age') return ageScale(unit, heading, ageDatum);
  const wanted = unit ?? (field.canonicalUnit === '1' ? '1' : '');
  // The error of an age has the unit of the age itself, datum and all: "yr b2k" counts years.
  const age = quantity === 'duration' ? parseAgeUnit(wanted) : null;
  const conversion =
    age && !isUnitProblem(age)
      ? {
          factor: age.years / 1e3,
          offset: 0,
          explanation: `${age.text} × ${age.years / 1e3} = ka`,
          assumptions: [],
        }
      : convertTo(quantity, wanted);
  if (isUnitProblem(conversion))
    return { factor: 1, offset: 0, rule: 'unit not understood', problem: conversion, notes: [] };
  const notes = conversion.assumptions.map((message) => ({
    code: 'unit-assumption',
    message: `${unit}: ${message}.`,
  }));
  return {
    factor: conversion.factor / divisor,
    offset: conversion.offset,
    rule: `${conversion.explanation}${halved}`,
    notes,
  };
}

function ageScale(unit: string | null, heading: string, ageDatum?: string): ColumnScale {
  const parsed = parseAgeUnit(unit ?? '', `${heading} `);
  if (isUnitProblem(parsed))
    return { factor: 1, offset: 0, rule: 'unit not understood', problem: parsed, notes: [] };
  const answered =
    parsed.datum === null && ageDatum ? parseAgeUnit(`yr ${ageDatum.replace(/^BP ?1950$/, 'BP')}`) : null;
  const withDatum = answered && !isUnitProblem(answered) ? { ...parsed, datum: answered.datum } : parsed;
  const conversion = ageConversion(withDatum);
  const notes = [];
  if (conversion.datumAssumed)
    notes.push({
      code: 'datum-assumed',
      message: `"${heading}" names no datum; ages are taken before 1950 CE.`,
    });
  if (conversion.radiocarbon)
    notes.push({
      code: 'uncalibrated-radiocarbon',
      message: `"${heading}" holds radiocarbon years that are not calibrated.`,
    });
  return { factor: conversion.factor, offset: conversion.offset, rule: conversion.explanation, notes };
}
