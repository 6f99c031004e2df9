import { DomainError, requireWithin } from './domain-error';

/**
 * Refuses a name that the computation does not use. A misspelt or misplaced input would otherwise be left out in
 * silence, and its default used.
 *
 * @throws DomainError `unused-input`
 */
export function refuseUnused(given: object, used: readonly string[], prefix = ''): void {
  for (const [name, value] of Object.entries(given)) {
    if (value === undefined || used.includes(name)) continue;
    throw new DomainError('unused-input', {
      field: prefix + name,
      value,
      allowed: `left out: it is not used here (used: ${used.map((field) => prefix + field).join(', ')})`,
    });
  }
}

export interface NumberField {
  readonly field: string;
  /** unit as written, empty for a pure number */
  readonly unit: string;
  readonly min: number;
  readonly max: number;
  /** taken when the field is absent; without it the field is required */
  readonly default?: number;
}

/**
 * A finite number within its range, or its default when absent.
 *
 * @param prefix path in front of the name, e.g. `orbit.`
 * @throws DomainError `missing`, `not-a-number` or `outside-range`
 */
export function readNumber(given: object, spec: NumberField, prefix = ''): number {
  const value = (given as Record<string, unknown>)[spec.field] ?? spec.default;
  const field = prefix + spec.field;
  if (value === undefined) throw missing(field, spec.unit, [spec.min, spec.max]);
  return requireWithin(field, value as number, spec.unit, spec.min, spec.max);
}

/** @throws DomainError `missing` or `unknown-choice` */
export function readChoice<T extends string>(
  given: object,
  field: string,
  choices: readonly T[],
  fallback?: T,
): T {
  const value = (given as Record<string, unknown>)[field] ?? fallback;
  if (value === undefined) throw missing(field, '', choices);
  if (!choices.includes(value as T))
    throw new DomainError('unknown-choice', { field, value, allowed: choices });
  return value as T;
}

/** The one of two fields that is given. @throws DomainError `missing` or `contradictory-input` */
export function readEither<A extends string, B extends string>(given: object, first: A, second: B): A | B {
  const values = given as Record<string, unknown>;
  const has = (field: string) => values[field] !== undefined && values[field] !== null;
  if (has(first) && has(second)) {
    throw new DomainError('contradictory-input', {
      field: second,
      value: values[second],
      allowed: `left out when ${first} is given: give one of the two`,
    });
  }
  if (has(first)) return first;
  if (has(second)) return second;
  throw new DomainError('missing', {
    field: first,
    value: undefined,
    allowed: `given, or ${second} instead of it`,
  });
}

/** A nested object. @throws DomainError `not-an-object` */
export function readObject(given: object, field: string): object {
  const value = (given as Record<string, unknown>)[field];
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    throw new DomainError('not-an-object', { field, value, allowed: 'an object with named values' });
  }
  return value;
}

function missing(field: string, unit: string, allowed: [number, number] | readonly string[]): DomainError {
  const range =
    typeof allowed[0] === 'number'
      ? `a number from ${allowed[0]} to ${allowed[1]}`
      : `one of ${allowed.join(', ')}`;
  return new DomainError(
    'missing',
    { field, value: undefined, unit, allowed: [...allowed] },
    `${field} is missing; it must be ${range}${unit ? ` ${unit}` : ''}.`,
  );
}
