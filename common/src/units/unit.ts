/** Exponents over the base units gram, metre, Julian year and degree of arc. A missing key is 0. */
export interface Dimension {
  mass: number;
  length: number;
  time: number;
  angle: number;
}

/** A unit string as understood: value in base units = value in this unit × factor. */
export interface Unit {
  /** as typed, trimmed */
  text: string;
  factor: number;
  dimension: Dimension;
  /** what had to be decided or passed over while reading, in words */
  notes: string[];
}

export type UnitProblemCode = 'empty-unit' | 'unknown-unit' | 'ambiguous-unit' | 'not-convertible';

/** Why a unit cannot be used. The message names the unit as typed and what is wanted instead. */
export interface UnitProblem {
  code: UnitProblemCode;
  unitText: string;
  message: string;
}

export function isUnitProblem(result: object): result is UnitProblem {
  return 'code' in result && 'message' in result;
}

export const NO_DIMENSION: Readonly<Dimension> = { mass: 0, length: 0, time: 0, angle: 0 };

export const dimensionOf = (part: Partial<Dimension>): Dimension => ({ ...NO_DIMENSION, ...part });

export function sameDimension(a: Dimension, b: Dimension): boolean {
  return a.mass === b.mass && a.length === b.length && a.time === b.time && a.angle === b.angle;
}

export function addPower(to: Dimension, of: Dimension, exponent: number): Dimension {
  return {
    mass: to.mass + of.mass * exponent,
    length: to.length + of.length * exponent,
    time: to.time + of.time * exponent,
    angle: to.angle + of.angle * exponent,
  };
}
