import { expect, test } from 'vitest';
import { readChoice, readEither, readNumber, readObject, refuseUnused } from './check-fields';
import { DomainError } from './domain-error';

const spec = { field: 'depthM', unit: 'm', min: 0, max: 100 };
const caught = (work: () => unknown): DomainError => {
  try {
    work();
  } catch (error) {
    if (error instanceof DomainError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
};

test('a number is read, its default taken when absent, and text in its place refused', () => {
  expect(readNumber({ depthM: 3 }, spec)).toBe(3);
  expect(readNumber({}, { ...spec, default: 7 })).toBe(7);
  expect(caught(() => readNumber({ depthM: '3' }, spec))).toMatchObject({
    code: 'not-a-number',
    field: 'depthM',
  });
  expect(caught(() => readNumber({ depthM: 101 }, spec, 'core.'))).toMatchObject({
    code: 'outside-range',
    field: 'core.depthM',
    allowed: [0, 100],
  });
  expect(caught(() => readNumber({}, spec)).message).toBe(
    'depthM is missing; it must be a number from 0 to 100 m.',
  );
});

test('a name that is not used is refused, an undefined one is as good as absent', () => {
  expect(() => refuseUnused({ a: 1, b: undefined }, ['a'])).not.toThrow();
  expect(caught(() => refuseUnused({ a: 1, c: 2 }, ['a'], 'block.'))).toMatchObject({
    code: 'unused-input',
    field: 'block.c',
  });
});

test('choices, alternatives and nested objects are refused by name', () => {
  expect(readChoice({}, 'sky', ['all', 'clear'], 'all')).toBe('all');
  expect(caught(() => readChoice({ sky: 'grey' }, 'sky', ['all', 'clear'])).code).toBe('unknown-choice');
  expect(readEither({ b: 1 }, 'a', 'b')).toBe('b');
  expect(caught(() => readEither({ a: 1, b: 1 }, 'a', 'b')).code).toBe('contradictory-input');
  expect(caught(() => readEither({}, 'a', 'b')).code).toBe('missing');
  expect(caught(() => readObject({ orbit: [1] }, 'orbit')).code).toBe('not-an-object');
});
