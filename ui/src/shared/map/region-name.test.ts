import { regionTitle, withRegionNames } from './region-name';

test.each([
  ['S.South-America', 'S. South America'],
  ['West&Central-Europe', 'West & Central Europe'],
  ['E.C.Asia', 'E. C. Asia'],
  ['Equatorial.Pacific-Ocean', 'Equatorial Pacific Ocean'],
  ['Greenland/Iceland', 'Greenland/Iceland'],
])('%s is read as %s', (name, title) => {
  expect(regionTitle(name)).toBe(title);
});

const names = new Map([
  ['SAH', 'Sahara'],
  ['ARP', 'Arabian Peninsula'],
  ['CAR', 'Caribbean'],
  ['SAS', 'S. Asia'],
  ['MED', 'Mediterranean'],
]);

test('codes at the start of a message give way to names, many of them to a count', () => {
  expect(withRegionNames('SAH, ARP: bright ground.', names)).toBe(
    'Sahara, Arabian Peninsula: bright ground.',
  );
  expect(withRegionNames('SAH, ARP, CAR, SAS, MED: thick.', names)).toBe(
    'Sahara, Arabian Peninsula, Caribbean and 2 more regions: thick.',
  );
});

test('a message without region codes stays as it is', () => {
  expect(withRegionNames('EDC: the record is short.', names)).toBe('EDC: the record is short.');
  expect(withRegionNames('Few sites.', names)).toBe('Few sites.');
});
