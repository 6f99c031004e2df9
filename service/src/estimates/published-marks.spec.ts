import { PUBLISHED_ESTIMATES } from '@siltlight/common/tables/published-estimates';
import { publishedMarks } from './published-marks';

const glacial = { slice: { orbitalAgeKa: 21 }, reference: { name: 'Pre-industrial' }, longwave: true };
const idsOf = (compared: Parameters<typeof publishedMarks>[0]) =>
  publishedMarks(compared).map(({ id }) => id);

test('only global values of the slice in W m⁻² become marks, and the width of a span does not', () => {
  expect(idsOf(glacial)).toEqual(['P02', 'P19', 'P21', 'P28']);
  expect(idsOf({ ...glacial, slice: { orbitalAgeKa: 160.5 } })).toEqual([]);
  const width = PUBLISHED_ESTIMATES.find(({ id }) => id === 'P22')!;
  expect(width.quantity).toBe('uncertainty span of forcing');
});

test('a value of another kind says in what it differs', () => {
  const why = new Map(publishedMarks(glacial).map(({ id, otherKind }) => [id, otherKind]));
  expect(why.get('P21')).toBeNull();
  expect(why.get('P02')).toBe('direct radiative effect, not a forcing against a reference; against no dust');
  expect(why.get('P19')).toBe('against current');
  expect(why.get('P28')).toBe('of aerosols incl. dust; against Holocene; processes: direct and cloud');
});

test('beside a shortwave estimate a net value is of another kind', () => {
  const [mark] = publishedMarks({ ...glacial, longwave: false }).filter(({ id }) => id === 'P21');
  expect(mark!.otherKind).toBe('with longwave');
});

test('against another reference nothing is of the same kind', () => {
  const marks = publishedMarks({ ...glacial, reference: { name: 'Mid-Holocene' } });
  expect(marks.filter(({ otherKind }) => otherKind === null)).toEqual([]);
});
