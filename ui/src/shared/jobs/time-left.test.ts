import { timeLeft } from './time-left';

const start = '2026-01-01T00:00:00.000Z';
const after = (seconds: number) => Date.parse(start) + seconds * 1000;

test('time left follows from the share that is done', () => {
  expect(timeLeft(start, 0.5, after(240))).toBe('about 4 min left');
});

test('nothing is promised before five per cent or after the end', () => {
  expect(timeLeft(start, 0.01, after(10))).toBeNull();
  expect(timeLeft(start, 1, after(10))).toBeNull();
});
