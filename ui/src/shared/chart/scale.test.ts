import { dotPlaces } from './quantile-dots';
import { partLabels } from './line-path';
import { linearScale, logScale, logTicks, niceTicks } from './scale';

test('ticks are round and lie inside the domain', () => {
  expect(niceTicks([-1.03, 0.21], 6)).toEqual([-1, -0.75, -0.5, -0.25, 0]);
  expect(niceTicks([0, 10], 5)).toEqual([0, 2, 4, 6, 8, 10]);
});

test('a logarithmic axis gives every power of ten the same room', () => {
  const y = logScale([0.01, 100], [0, 400]);
  expect(y(1)).toBeCloseTo(200, 9);
  expect(y(10) - y(1)).toBeCloseTo(100, 9);
  expect(y(0)).toBe(0);
  expect(logTicks([0.01, 100])).toEqual([0.01, 0.1, 1, 10, 100]);
});

test('no two dots of a quantile plot lie on each other, and none moves by more than half a dot', () => {
  const x = linearScale([-1, 0.2], [14, 346]);
  const outcomes = Array.from({ length: 50 }, (_, at) => -0.9 + 0.018 * at + 0.05 * Math.sin(at));
  const dots = dotPlaces(outcomes, x, 94);
  expect(new Set(dots.map((dot) => `${dot.cx.toFixed(3)} ${dot.cy.toFixed(3)}`)).size).toBe(50);
  dots.forEach((dot) => expect(Math.abs(dot.cx - x(dot.value))).toBeLessThanOrEqual(4.5 + 1e-9));
});

test('labels at the ends of lines are pushed apart', () => {
  const places = partLabels([10, 12, 50, 11], 14);
  const sorted = [...places].sort((a, b) => a - b);
  sorted.slice(1).forEach((place, at) => expect(place - sorted[at]!).toBeGreaterThanOrEqual(14 - 1e-9));
  expect(places[2]).toBe(52);
});
