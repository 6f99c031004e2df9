import { isFinal, MAX_ATTEMPTS, waitBeforeAttempt } from './retry-plan';

test('waits double from 30 s to one hour, within a fifth either way', () => {
  const middle = Array.from(
    { length: MAX_ATTEMPTS - 1 },
    (_, index) => waitBeforeAttempt(index + 1, 0.5) / 1000,
  );
  expect(middle).toEqual([30, 60, 120, 240, 480, 960, 1920, 3600, 3600]);
  expect(waitBeforeAttempt(1, 0)).toBe(24_000);
  expect(waitBeforeAttempt(1, 1)).toBe(36_000);
});

test('only an answer of 500 or above is final', () => {
  expect([550, 421, undefined].map((responseCode) => isFinal({ responseCode }))).toEqual([
    true,
    false,
    false,
  ]);
});
