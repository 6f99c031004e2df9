import { readFileSync } from 'node:fs';
import path from 'node:path';
import Papa from 'papaparse';

/** Rows of a table of this folder as text, keyed by its header. */
export function rows(name) {
  const { data } = Papa.parse(readFileSync(path.join(import.meta.dirname, name), 'utf8'), {
    header: true,
    skipEmptyLines: true,
  });
  return data;
}

export const number = (text) => {
  const value = Number(text);
  if (text.trim() === '' || !Number.isFinite(value)) throw new Error(`"${text}" is not a number`);
  return value;
};
export const numberOrNull = (text) => (text.trim() === '' ? null : number(text));
export const textOrNull = (text) => (text.trim() === '' ? null : text.trim());
export const slugOf = (text) =>
  text
    .toLowerCase()
    .replaceAll(/[^a-z0-9]+/g, '-')
    .replaceAll(/^-|-$/g, '');
