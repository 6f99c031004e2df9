import { Op, type Transaction } from 'sequelize';
import type { ObjectRow } from './models/object-row';

const MAX_LENGTH = 60;
/** Letters of authors and places that Unicode does not take apart. */
const PLAIN: Record<string, string> = {
  ß: 'ss',
  æ: 'ae',
  œ: 'oe',
  ø: 'o',
  ł: 'l',
  đ: 'd',
  ð: 'd',
  þ: 'th',
  ı: 'i',
};

/** A readable name for addresses and file names: lower-case ASCII words with hyphens between. */
export function slugOf(title: string): string {
  const words = title
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[ßæœøłđðþı]/g, (letter) => PLAIN[letter] ?? letter)
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, MAX_LENGTH)
    .replace(/^-+|-+$/g, '');
  return words || 'untitled';
}

export async function freeSlug(
  objects: typeof ObjectRow,
  kind: string,
  title: string,
  transaction: Transaction,
): Promise<string> {
  const slug = slugOf(title);
  // A slug holds neither % nor _, so it can stand in a pattern as it is.
  const where = { kind, slug: { [Op.like]: `${slug}%` } };
  const taken = new Set(
    (await objects.findAll({ where, attributes: ['slug'], transaction })).map((row) => row.slug),
  );
  let candidate = slug;
  for (let number = 2; taken.has(candidate); number += 1) candidate = `${slug}-${number}`;
  return candidate;
}
