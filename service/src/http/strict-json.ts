import { problem, type Problem } from './problem';

const MAX_DEPTH = 32;
const FORBIDDEN_KEYS = new Set(['__proto__', 'constructor', 'prototype']);

/**
 * JSON as everybody reads it: what JSON.parse would change in silence is refused instead. That is a key given
 * twice (the last would win), a number beyond the doubles (it would become Infinity) or a whole number beyond
 * 2^53 (it would be rounded), text that is not Unicode or holds NUL, and keys that reach into prototypes.
 *
 * @throws Problem 400, naming the place
 */
export function parseStrictly(text: string): unknown {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch (error) {
    throw malformed((error as SyntaxError).message, '');
  }
  new Scan(text).value([]);
  return value;
}

function malformed(message: string, pointer: string): Problem {
  const detail = pointer ? `At ${pointer}: ${message}` : message;
  return problem(400, 'malformed-json', 'The body is not usable JSON', detail, [{ pointer, message }]);
}

/** Walks a text that JSON.parse has already accepted, so it only needs to look at what is of interest. */
class Scan {
  private at = 0;

  constructor(private readonly text: string) {}

  value(path: string[]): void {
    if (path.length > MAX_DEPTH) this.refuse(path, `it is nested deeper than ${MAX_DEPTH} levels.`);
    this.skipSpace();
    const first = this.text[this.at];
    if (first === '{') this.object(path);
    else if (first === '[') this.array(path);
    else if (first === '"') this.string(path);
    else if (first !== undefined && /[-0-9]/.test(first)) this.number(path);
    else this.at += first === 'f' ? 5 : 4;
    this.skipSpace();
  }

  private object(path: string[]): void {
    const keys = new Set<string>();
    this.items('}', () => {
      const key = this.string(path);
      if (keys.has(key)) this.refuse([...path, key], 'this key is given twice.');
      if (FORBIDDEN_KEYS.has(key)) this.refuse([...path, key], 'this key is not allowed.');
      keys.add(key);
      this.skipSpace();
      this.at += 1; // the colon
      this.value([...path, key]);
    });
  }

  private array(path: string[]): void {
    let index = 0;
    this.items(']', () => this.value([...path, String(index++)]));
  }

  private items(end: string, item: () => void): void {
    this.at += 1;
    this.skipSpace();
    while (this.text[this.at] !== end) {
      item();
      this.skipSpace();
      if (this.text[this.at] === ',') this.at += 1;
      this.skipSpace();
    }
    this.at += 1;
  }

  private string(path: string[]): string {
    const start = this.at++;
    while (this.text[this.at] !== '"') this.at += this.text[this.at] === '\\' ? 2 : 1;
    this.at += 1;
    const value = JSON.parse(this.text.slice(start, this.at)) as string;
    if (value.includes('\u0000')) this.refuse(path, 'text must not hold the character NUL.');
    if (/\p{Surrogate}/u.test(value)) this.refuse(path, 'text must be well-formed Unicode.');
    return value;
  }

  private number(path: string[]): void {
    const start = this.at;
    while (/[-+0-9.eE]/.test(this.text[this.at] ?? '')) this.at += 1;
    const literal = this.text.slice(start, this.at);
    const value = Number(literal);
    if (!Number.isFinite(value)) this.refuse(path, `the number ${literal.slice(0, 40)} is too large.`);
    if (/^-?\d+$/.test(literal) && !Number.isSafeInteger(value)) {
      this.refuse(
        path,
        `the whole number ${literal.slice(0, 40)} cannot be kept exactly; it must lie within ±(2^53 − 1).`,
      );
    }
  }

  private skipSpace(): void {
    while (' \t\n\r'.includes(this.text[this.at] ?? 'end')) this.at += 1;
  }

  private refuse(path: string[], message: string): never {
    throw malformed(
      message,
      path
        .slice(0, MAX_DEPTH)
        .map((key) => `/${key.slice(0, 80)}`)
        .join(''),
    );
  }
}
