import { inventedEstimate, inventedResult } from './report.test-support';
import { besideRungs } from './headline';
import { headlineOf } from './result-words';
import { changesBetween } from './since-change';
import { startingSetUp } from './set-up';

const withNet = (value: number, low: number | null, high: number | null) => ({
  ...inventedResult,
  global: {
    ...inventedResult.global,
    forcing: { ...inventedResult.global.forcing, netWm2: { value, low, high } },
  },
});

test('the headline says against what, whose dust and which way', () => {
  expect(headlineOf(inventedResult)).toBe(
    'Against pre-industrial, the dust of the Last Glacial Maximum cools the planet.',
  );
  expect(headlineOf(withNet(0.3, 0.1, 0.5))).toMatch(/warms the planet\.$/);
});

test('a sign that the interval leaves open is not claimed', () => {
  expect(headlineOf(withNet(-0.2, -0.5, 0.1))).toMatch(
    /more likely cools the planet than not; the interval holds zero/,
  );
});

test('a result that rounds to nothing is said to be nothing', () => {
  expect(headlineOf(withNet(-0.001, null, null))).toMatch(/leaves the planet’s balance as it was/);
});

test('the direct effect stands beside the forcing as another kind', () => {
  const rungs = besideRungs(inventedResult, inventedEstimate.context);
  expect(rungs.map(({ label, other }) => [label, Boolean(other)])).toEqual([
    ['Dust, forcing', false],
    ['Greenhouse', false],
    ['Direct effect', true],
  ]);
});

test('what changed is named with its values', () => {
  const after = { ...startingSetUp, transmittance: 0.7, longwave: false, field: 'f2' };
  expect(changesBetween(startingSetUp, after)).toEqual([
    'another field',
    'transmittance 0.76 to 0.7',
    'longwave on to off',
  ]);
  expect(changesBetween(startingSetUp, { ...startingSetUp, members: 64, title: 'x' })).toEqual([]);
});
