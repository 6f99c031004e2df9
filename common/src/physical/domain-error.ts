/** A doubtful, not impossible, circumstance that a result must carry with it. */
export interface Caution {
  code: string;
  message: string;
}

export interface DomainErrorDetails {
  /** name of the quantity as the caller knows it, e.g. `latitudeDeg` */
  field: string;
  value: unknown;
  unit?: string;
  /** closed range, list of choices, or a phrase such as "finite number" */
  allowed: [number, number] | readonly string[] | string;
  remedy?: string;
}

/** Impossible input. Names the field, the value that came, its unit and what would be allowed. */
export class DomainError extends Error {
  readonly field: string;
  readonly value: unknown;
  readonly unit: string;
  readonly allowed: [number, number] | readonly string[] | string;
  readonly remedy: string | undefined;

  constructor(
    readonly code: string,
    details: DomainErrorDetails,
    message?: string,
  ) {
    super(message ?? describe(details));
    this.name = 'DomainError';
    this.field = details.field;
    this.value = details.value;
    this.unit = details.unit ?? '';
    this.allowed = details.allowed;
    this.remedy = details.remedy;
  }
}

function describe({ field, value, unit = '', allowed, remedy }: DomainErrorDetails): string {
  const withUnit = unit ? ` ${unit}` : '';
  const shown = typeof value === 'number' || typeof value === 'string' ? String(value) : JSON.stringify(value);
  const range =
    typeof allowed === 'string'
      ? `it must be ${allowed}`
      : typeof allowed[0] === 'number'
        ? `it must lie within ${allowed[0]} to ${allowed[1]}${withUnit}`
        : `it must be one of ${allowed.join(', ')}`;
  return `${field} is ${shown}${withUnit}; ${range}.${remedy ? ` ${remedy}` : ''}`;
}

/**
 * Refuses a number that is not finite or lies outside a closed range.
 *
 * @throws DomainError `not-a-number` or `outside-range`
 */
export function requireWithin(field: string, value: number, unit: string, min: number, max: number): number {
  if (typeof value !== 'number' || !Number.isFinite(value)) {
    throw new DomainError('not-a-number', { field, value: String(value), unit, allowed: [min, max] });
  }
  if (value < min || value > max) {
    throw new DomainError('outside-range', { field, value, unit, allowed: [min, max] });
  }
  return value;
}
