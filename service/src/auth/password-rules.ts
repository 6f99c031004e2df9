import { PASSWORD_MAX_CHARACTERS, PASSWORD_MIN_CHARACTERS } from '@siltlight/common/wire/auth';
import { problem, type Problem } from '../http/problem';
import { COMMON_PASSWORDS, COMMON_WORDS, KEY_RUNS } from './common-passwords';

/** What letters are often written with other signs; each is read back before looking it up. */
const LOOK_ALIKES: Record<string, string> = {
  '0': 'o',
  '1': 'i',
  '3': 'e',
  '4': 'a',
  '5': 's',
  '7': 't',
  '@': 'a',
  $: 's',
};

/** With at least this many different common words, their order is what makes the password hard to guess. */
const ENOUGH_WORDS = 4;
const LONGEST_WORD = 40;
const SHORTEST_RUN = 3;

/** @returns why the password would be guessed early, or null; `personal` holds the person's own name and address */
export function reasonToRefuse(password: string, personal: readonly string[] = []): string | null {
  const plain = password.toLowerCase();
  if (COMMON_PASSWORDS.has(plain)) return 'it is among the commonest passwords';
  if (isRepetition(plain)) return 'it repeats one short piece';
  const own = personal.flatMap(wordsOf);
  const words = new Set([...COMMON_WORDS, ...own]);
  for (const spelling of [plain, readBack(plain)]) {
    const pieces = easyPieces(spelling, words);
    if (pieces !== null && pieces.size < ENOUGH_WORDS) {
      return 'it is made only of common words, your own name, the product’s words, digits or runs of keys';
    }
  }
  return null;
}

/** @throws Problem 422 that says why, and never repeats the password */
export function requireGoodPassword(password: string, field: string, personal: readonly string[] = []): void {
  const reason = reasonToRefuse(password, personal);
  if (reason) throw weakPassword(field, reason);
}

function weakPassword(field: string, reason: string): Problem {
  const message = `This password would be guessed early: ${reason}. Take several unrelated words of your own.`;
  const allowed = `${PASSWORD_MIN_CHARACTERS} to ${PASSWORD_MAX_CHARACTERS} characters, not easily guessed`;
  return problem(422, 'weak-password', 'Choose another password', message, [
    { pointer: `/${field}`, field, allowed, message },
  ]);
}

/** The parts of a name or address, and the whole written as one word. */
function wordsOf(text: string): string[] {
  const parts = text
    .toLowerCase()
    .split(/[^\p{L}\p{N}]+/u)
    .filter((part) => part !== '');
  return [...parts, parts.join('')].filter((part) => part.length >= SHORTEST_RUN);
}

/** A piece of at most six signs, over and over: aaaa…, abcabc…, 20242024…. */
function isRepetition(text: string): boolean {
  for (let unit = 1; unit * 2 <= text.length && unit <= 6; unit += 1) {
    const repeated = text
      .slice(0, unit)
      .repeat(Math.ceil(text.length / unit))
      .slice(0, text.length);
    if (repeated === text) return true;
  }
  return false;
}

const readBack = (text: string): string => [...text].map((sign) => LOOK_ALIKES[sign] ?? sign).join('');

/**
 * The different words that the text is made of when nothing else is in it, or null when something is left over.
 * Digits and punctuation count as nothing. Longest piece first, so it may miss a division; that errs on letting pass.
 */
function easyPieces(text: string, words: ReadonlySet<string>): Set<string> | null {
  const found = new Set<string>();
  let at = 0;
  while (at < text.length) {
    const piece = longer(wordAt(text, at, words), runAt(text, at));
    if (piece) found.add(piece);
    else if (/[\p{L}]/u.test(text[at]!) || text.charCodeAt(at) > 0x2fff) return null;
    at += piece?.length ?? 1;
  }
  return found;
}

const longer = (a: string | null, b: string | null) => ((a?.length ?? 0) >= (b?.length ?? 0) ? a : b);

function wordAt(text: string, at: number, words: ReadonlySet<string>): string | null {
  for (let length = LONGEST_WORD; length >= SHORTEST_RUN; length -= 1) {
    const piece = text.slice(at, at + length);
    if (words.has(piece)) return piece;
  }
  return null;
}

function runAt(text: string, at: number): string | null {
  for (let length = text.length - at; length >= SHORTEST_RUN; length -= 1) {
    const piece = text.slice(at, at + length);
    if (KEY_RUNS.some((run) => run.includes(piece)) || /^(.)\1+$/u.test(piece)) return piece;
  }
  return null;
}
