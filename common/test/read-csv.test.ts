import { expect, test } from 'vitest';
import { parseCsv, readCsv, referencePath } from '../../reference/read';

test('quoted cells keep commas, quotes and line breaks; empty cells and both line ends are read', () => {
  expect(parseCsv('a,"b, c","d ""e"""\r\n,"two\nlines",\n\n1,,3')).toEqual([
    ['a', 'b, c', 'd "e"'],
    ['', 'two\nlines', ''],
    ['1', '', '3'],
  ]);
});

test('a table is read by its headings, with sources that hold commas', () => {
  const rows = readCsv('gases/pmip_time_slices.csv');
  expect(rows).toHaveLength(6);
  expect(rows[1]!.slice).toBe('pre-industrial (CMIP6 piControl, 1850 CE)');
  expect(rows[4]!.co2_ppm).toBe('190');
});

test('a file that does not exist is named', () => {
  expect(() => referencePath('orbit/none.csv')).toThrow('reference/orbit/none.csv does not exist');
});
