import { expect, test } from 'vitest';
import { requireOneSizeCutoff } from './size-cutoff';

const codes = (...given: Parameters<typeof requireOneSizeCutoff>) =>
  requireOneSizeCutoff(...given).map(({ code }) => code);

test('one cut-off for all three passes without a word, be it a diameter or all sizes', () => {
  expect(codes({ deposition: 10, lifetime: 10, massExtinction: 10 })).toEqual([]);
  expect(codes({ deposition: null, lifetime: null, massExtinction: null })).toEqual([]);
});

test('a mismatch is refused, and with a reason it passes and the reason is printed', () => {
  const mixed = { deposition: null, lifetime: 10, massExtinction: 10 };
  expect(() => requireOneSizeCutoff(mixed)).toThrow(
    /sizeCutoff is deposition all sizes, lifetime below 10 µm, massExtinction below 10 µm/,
  );
  expect(() => requireOneSizeCutoff(mixed, '  ')).toThrow(/give a reason/);
  const [caution] = requireOneSizeCutoff(mixed, 'to compare with an older estimate');
  expect(caution!.message).toContain('to compare with an older estimate');
});

test('an unknown cut-off is a caution, beside a mismatch of the known ones as well', () => {
  const unknown = { deposition: undefined, lifetime: 10, massExtinction: 10 };
  expect(codes(unknown)).toEqual(['size-cutoff-unknown']);
  expect(() => requireOneSizeCutoff({ ...unknown, lifetime: 20 })).toThrow(/lifetime below 20 µm/);
  expect(codes({ ...unknown, lifetime: 20 }, 'why not')).toEqual([
    'size-cutoff-unknown',
    'size-cutoff-mismatch-accepted',
  ]);
  expect(() => requireOneSizeCutoff({ ...unknown, lifetime: -1 })).toThrow(/sizeCutoff.lifetime is -1 µm/);
});
