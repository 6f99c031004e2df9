import { readNumberText } from './number-text';

test.each([
  ['0.42', 0.42],
  ['0,42', 0.42],
  ['\u22121.5', -1.5],
  ['1e-3', 0.001],
  ['12 000', 12000],
])('%s is read as a number', (text, value) => {
  expect(readNumberText(text)).toEqual({ value });
});

test('text that may be read in two ways is refused with both readings', () => {
  expect(readNumberText('1,234')).toEqual({ fault: expect.stringMatching(/1234 or 1\.234/) as string });
});

test('what is no number says how to write one', () => {
  expect(readNumberText('abc')).toEqual({ fault: expect.stringMatching(/0\.42 or 0,42/) as string });
});
