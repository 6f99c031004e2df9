import { sliceWithArticle, sliceWithin } from './slice-name';

test('a slice is named as one names it in a sentence', () => {
  expect(sliceWithArticle('Last Glacial Maximum')).toBe('the Last Glacial Maximum');
  expect(sliceWithArticle('Marine Isotope Stage 3')).toBe('Marine Isotope Stage 3');
  expect(sliceWithArticle('Mid-Holocene')).toBe('the mid-Holocene');
  expect(sliceWithArticle('Pre-industrial')).toBe('pre-industrial time');
  expect(sliceWithin('Pre-industrial')).toBe('pre-industrial');
  expect(sliceWithin('Last Interglacial')).toBe('Last Interglacial');
});
