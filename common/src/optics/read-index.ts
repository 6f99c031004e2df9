import { readNumber, readObject, refuseUnused } from '../physical/check-fields';
import { DomainError } from '../physical/domain-error';
import { MAX_INDEX_PART, MIN_REAL_INDEX, type RefractiveIndex } from './mie';

/**
 * A refractive index {real, imaginary} of a request, every value checked.
 *
 * @param prefix path in front of the field, e.g. `modes[0].`
 */
export function readIndex(given: object, prefix = ''): RefractiveIndex {
  const index = readObject(given, 'refractiveIndex');
  const path = `${prefix}refractiveIndex.`;
  refuseUnused(index, ['real', 'imaginary'], path);
  return {
    real: readNumber(index, { field: 'real', unit: '', min: MIN_REAL_INDEX, max: MAX_INDEX_PART }, path),
    imaginary: readNumber(index, { field: 'imaginary', unit: '', min: 0, max: MAX_INDEX_PART }, path),
  };
}

/** A list of objects of a request. @throws DomainError naming the list or the entry that is none */
export function readList(given: object, field: string, max: number): object[] {
  const list = (given as Record<string, unknown>)[field];
  if (!Array.isArray(list) || list.length < 1 || list.length > max) {
    throw new DomainError(list === undefined ? 'missing' : 'outside-range', {
      field,
      value: Array.isArray(list) ? list.length : list,
      allowed: `a list of 1 to ${max} entries`,
    });
  }
  return list.map((entry: unknown, i) => {
    if (typeof entry !== 'object' || entry === null || Array.isArray(entry)) {
      throw new DomainError('not-an-object', {
        field: `${field}[${i}]`,
        value: entry,
        allowed: 'an object with named values',
      });
    }
    return entry;
  });
}
