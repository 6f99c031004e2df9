import { createHash } from 'node:crypto';

/**
 * The one text that stands for a JSON value, after RFC 8785: no white space, members sorted by the UTF-16 code
 * units of their names, numbers in the shortest form that reads back the same, strings with the fewest escapes.
 * Written down, with an example to check against, in reference/decisions/0010-canonical-form-and-checksum.md.
 * A member that is undefined is left out, as JSON.stringify does.
 *
 * @throws TypeError for what JSON cannot say: NaN, Infinity, functions, dates, typed arrays, lone surrogates
 */
export function canonicalJson(value: unknown): string {
  return write(value, '');
}

/** SHA-256, in lower-case hexadecimal, over the UTF-8 bytes of the canonical form. */
export function checksumOf(value: unknown): string {
  return sha256(canonicalJson(value));
}

export function sha256(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}

function write(value: unknown, place: string): string {
  if (value === null || typeof value === 'boolean') return String(value);
  if (typeof value === 'number' && Number.isFinite(value)) return JSON.stringify(value);
  if (typeof value === 'string') return writeString(value, place);
  if (Array.isArray(value))
    return `[${value.map((item, index) => write(item, `${place}/${index}`)).join(',')}]`;
  if (isPlainObject(value)) return writeObject(value, place);
  const shown = typeof value === 'number' ? String(value) : Object.prototype.toString.call(value);
  throw new TypeError(`${place || '/'} is ${shown}, which has no canonical form.`);
}

function writeObject(value: Record<string, unknown>, place: string): string {
  // The default order of sort() is by UTF-16 code units, as the RFC asks.
  const members = Object.keys(value)
    .filter((name) => value[name] !== undefined)
    .sort()
    .map((name) => `${writeString(name, place)}:${write(value[name], `${place}/${name}`)}`);
  return `{${members.join(',')}}`;
}

function writeString(text: string, place: string): string {
  if (/\p{Surrogate}/u.test(text)) throw new TypeError(`${place || '/'} holds text that is not Unicode.`);
  return JSON.stringify(text);
}

function isPlainObject(value: unknown): value is Record<string, unknown> {
  if (typeof value !== 'object' || value === null) return false;
  const prototype: unknown = Object.getPrototypeOf(value);
  // Objects that come out of a worker or another realm have an Object.prototype of their own.
  return prototype === null || Object.getPrototypeOf(prototype) === null;
}
