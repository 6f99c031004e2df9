import type { FieldDetail, FieldSite } from '@siltlight/common/wire/slices';
import { fractionsMet, spreadInWords, tracePath } from './field-words';

const diagnostics: FieldDetail['diagnostics'] = {
  globalRatio: { value: 2.4, low: 1.6, high: 3.6 },
  tauSquared: 0.48,
  q: 31,
  iSquared: 0.71,
  usedSites: 14,
  regionsWithSites: 8,
  areaByGlobalRatioShare: 0.62,
};

test('the spread between sites is told as a factor with its share', () => {
  // exp(√0.48) = 2.0
  expect(spreadInWords(diagnostics)).toBe(
    'From 14 sites in 8 regions: ratios differ beyond their errors by a factor of about 2.0 (τ² = 0.48); 71 % of the spread seen is real difference, not error (I²).',
  );
});

test('sites that agree within their errors are said to agree', () => {
  expect(spreadInWords({ ...diagnostics, tauSquared: 0, iSquared: 0 })).toMatch(
    /agree within their own errors/,
  );
});

test('the size fractions to choose from are the one in use and those set aside for it', () => {
  const site = (unusedReason: string | null) => ({ unusedReason }) as FieldSite;
  const sites = [
    site(null),
    site('another size fraction (< 5 µm)'),
    site('another size fraction (not stated)'),
    site('no reference flux'),
  ];
  expect(fractionsMet({ sizeCutoff: 'bulk', sites })).toEqual(['< 5 µm', 'bulk']);
});

test('a link to the trace carries the site and its dataset, whatever signs stand in the name', () => {
  const path = tracePath('f1', { site: 'MD 95-2042 & more', datasetSlug: 'marine-one' });
  const address = new URL(path, 'http://localhost');
  expect(address.pathname).toBe('/fields/f1/trace');
  expect(address.searchParams.get('site')).toBe('MD 95-2042 & more');
  expect(address.searchParams.get('dataset')).toBe('marine-one');
});
