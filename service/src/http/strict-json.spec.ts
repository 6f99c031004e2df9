import fc from 'fast-check';
import type { Problem } from './problem';
import { parseStrictly } from './strict-json';

function refusalOf(text: string): Problem {
  try {
    parseStrictly(text);
  } catch (error) {
    return error as Problem;
  }
  throw new Error(`${text} was accepted.`);
}

test('every JSON value that can be kept exactly is read as JSON.parse reads it', () => {
  const key = fc
    .string()
    .filter((name) => !['__proto__', 'constructor', 'prototype'].includes(name) && !name.includes('\0'));
  const text = fc.string({ unit: 'grapheme' }).filter((value) => !value.includes('\0'));
  const { tree } = fc.letrec((tie) => ({
    tree: fc.oneof(
      { maxDepth: 4 },
      fc.constantFrom(null, true, false),
      fc.double({ noNaN: true, noDefaultInfinity: true }).filter((value) => !Number.isInteger(value)),
      fc.maxSafeInteger(),
      text,
      fc.array(tie('tree'), { maxLength: 4 }),
      fc.dictionary(key, tie('tree'), { maxKeys: 4 }),
    ),
  }));
  fc.assert(
    fc.property(tree, fc.constantFrom(undefined, 2), (value, indent) => {
      const written = JSON.stringify(value, null, indent);
      expect(parseStrictly(written)).toEqual(JSON.parse(written));
    }),
  );
});

test.each([
  ['{"a": 1, "b": {"c": 1, "c": 2}}', '/b/c', 'twice'],
  ['{"a": 1, "\\u0061": 2}', '/a', 'twice'],
  ['[{"__proto__": {"admin": true}}]', '/0/__proto__', 'not allowed'],
  ['{"constructor": {"prototype": 1}}', '/constructor', 'not allowed'],
  ['{"flux": 1e999}', '/flux', 'too large'],
  ['{"flux": -1e999}', '/flux', 'too large'],
  ['{"count": 9007199254740993}', '/count', 'exactly'],
  ['{"name": "a\\ud800b"}', '/name', 'Unicode'],
  ['{"name": "a\\u0000b"}', '/name', 'NUL'],
])('%s is refused, and the place is named', (text, pointer, reason) => {
  const refusal = refusalOf(text);
  expect(refusal.getStatus()).toBe(400);
  expect(refusal.extras.errors?.[0]?.pointer).toBe(pointer);
  expect(refusal.extras.detail).toContain(reason);
});

test.each(['', '{', '{"a": NaN}', '{"a": Infinity}', "{'a': 1}", '[1,]', 'undefined'])(
  '%j is no JSON and is refused',
  (text) => {
    expect(refusalOf(text).code).toBe('malformed-json');
  },
);

test('nesting is read down to 32 levels and refused below', () => {
  expect(parseStrictly(`${'['.repeat(32)}1${']'.repeat(32)}`)).toBeInstanceOf(Array);
  expect(refusalOf(`${'['.repeat(33)}1${']'.repeat(33)}`).extras.detail).toContain('32');
  expect(refusalOf('['.repeat(200_000)).code).toBe('malformed-json');
});
