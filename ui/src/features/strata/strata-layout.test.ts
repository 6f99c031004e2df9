import type { ColumnSlice } from '@siltlight/common/wire/slices';
import { bedHeightPx, columnLimitWm2, strataLayout } from './strata-layout';

const slice = (
  slug: string,
  youngKa: number,
  oldKa: number,
  more: Partial<ColumnSlice> = {},
): ColumnSlice => ({
  slug,
  name: slug,
  label: slug.toUpperCase(),
  youngKa,
  oldKa,
  parentSlug: null,
  kind: 'evidence',
  latestNetWm2: null,
  stale: false,
  ...more,
});

const stages = [
  slice('mis-4', 57, 71),
  slice('pi', 0, 0.1),
  slice('mh', 5.5, 6.5),
  slice('lgm', 19, 23),
  slice('mis-3', 29, 57),
];

test('the youngest bed lies on top, whatever the order of arrival', () => {
  const { beds } = strataLayout(stages, 600);
  expect(beds.map((bed) => bed.slice.slug)).toEqual(['pi', 'mh', 'lgm', 'mis-3', 'mis-4']);
  const tops = beds.map((bed) => bed.topPx);
  expect([...tops].sort((a, b) => a - b)).toEqual(tops);
});

test('the column is filled exactly when there is room', () => {
  expect(strataLayout(stages, 600).heightPx).toBeCloseTo(600, 3);
  expect(strataLayout(stages, 792).heightPx).toBeCloseTo(792, 3);
});

test('a bed follows the logarithm of its duration above a floor of 32 px', () => {
  expect(bedHeightPx({ youngKa: 19, oldKa: 23 }, 10)).toBeCloseTo(32 + 10 * Math.log(1 + 4 / 0.1), 9);
  expect(bedHeightPx({ youngKa: 0, oldKa: 0 }, 10)).toBe(32);
});

test('no bed is thinner than the floor, and a crowded column grows instead', () => {
  const many = Array.from({ length: 40 }, (_, at) => slice(`s${at}`, at, at + 1));
  const { beds, heightPx } = strataLayout(many, 500);
  expect(Math.min(...beds.map((bed) => bed.heightPx))).toBeGreaterThanOrEqual(32);
  expect(heightPx).toBeGreaterThan(500);
});

test('a gap is left where two beds do not touch in time, and none where they do', () => {
  const { beds } = strataLayout(stages, 600);
  const at = (slug: string) => beds.find((bed) => bed.slice.slug === slug)!;
  expect(at('mis-4').topPx - at('mis-3').topPx - at('mis-3').heightPx).toBeCloseTo(0, 6);
  expect(at('lgm').topPx - at('mh').topPx - at('mh').heightPx).toBeCloseTo(5, 6);
});

test('a slice inside a Stage is a lens within its bed, below the name of the Stage', () => {
  const inside = [...stages, slice('mis-2', 14, 29, {}), slice('h2', 23, 24.5, { parentSlug: 'mis-2' })];
  const { beds } = strataLayout(inside, 700);
  const stage = beds.find((bed) => bed.slice.slug === 'mis-2')!;
  const lens = beds.find((bed) => bed.slice.slug === 'h2')!;
  expect(lens.lens).toBe(true);
  expect(lens.topPx).toBeGreaterThanOrEqual(stage.topPx + 28);
  expect(lens.topPx + lens.heightPx).toBeLessThanOrEqual(stage.topPx + stage.heightPx + 1e-6);
});

test('rows of names never overlap', () => {
  const inside = [
    ...stages,
    slice('h1', 30, 31, { parentSlug: 'mis-3' }),
    slice('h2', 40, 41, { parentSlug: 'mis-3' }),
  ];
  const { beds } = strataLayout(inside, 500);
  beds
    .slice(1)
    .forEach((bed, at) => expect(bed.topPx).toBeGreaterThanOrEqual(beds[at]!.topPx + beds[at]!.rowPx - 1e-6));
});

test('scenarios of deep time stand below an unconformity', () => {
  const { beds, unconformityPx } = strataLayout(
    [slice('snowball', 640_000, 641_000, { kind: 'scenario' }), ...stages],
    700,
  );
  expect(beds.at(-1)!.slice.slug).toBe('snowball');
  expect(unconformityPx).not.toBeNull();
  expect(unconformityPx!).toBeLessThan(beds.at(-1)!.topPx);
});

test('the colours are symmetric about zero and reach the largest forcing, rounded up', () => {
  expect(
    columnLimitWm2([slice('a', 0, 1, { latestNetWm2: -0.42 }), slice('b', 1, 2, { latestNetWm2: 0.1 })]),
  ).toBe(0.5);
  expect(columnLimitWm2([slice('a', 0, 1)])).toBe(0.5);
});
