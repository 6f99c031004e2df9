import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readNumber } from './number';
import { decideNumberFormat } from './number-format';

const read = (texts: string[], hint?: '.' | ',') => {
  const format = decideNumberFormat(texts, hint);
  return texts.map((text) => readNumber(text, format));
};
const values = (texts: string[], hint?: '.' | ',') => read(texts, hint).map((reading) => reading.value);

describe('numbers of one column', () => {
  test('a comma before three digits is never guessed when nothing in the column or file decides', () => {
    expect(read(['1,234', '2,345']).map((reading) => reading.problem?.code)).toEqual([
      'ambiguous-number',
      'ambiguous-number',
    ]);
  });

  test('one telling number decides the whole column', () => {
    expect(values(['1,234', '0,5'])).toEqual([1.234, 0.5]);
    expect(values(['1,234', '1,234.5'])).toEqual([1234, 1234.5]);
    expect(values(['1.234', '1.234,5'])).toEqual([1234, 1234.5]);
    expect(values(['1,234', '1,234,567'])).toEqual([1234, 1234567]);
  });

  test('what the other columns of the file show decides a silent column', () => {
    expect(values(['1.234'], ',')).toEqual([1234]);
    expect(values(['1,234'], ',')).toEqual([1.234]);
    expect(values(['1,234'], '.')).toEqual([1234]);
    expect(values(['1.234'])).toEqual([1.234]);
  });

  test('a number against the format of its column is a problem', () => {
    expect(read(['0,5', '1,5', '1.5'])[2]?.problem?.code).toBe('other-number-format');
    expect(read(['12 34'])[0]?.problem?.code).toBe('other-number-format');
  });

  test('signs, spaces, powers and footnote marks are understood', () => {
    expect(values(['−3.5', '1.2e-3', '1.2×10-3', '12.3*', '5.', '.5', '1\u202f234.5', '2.5†'])).toEqual([
      -3.5, 0.0012, 0.0012, 12.3, 5, 0.5, 1234.5, 2.5,
    ]);
    expect(values(["1'234.5"])).toEqual([1234.5]);
  });

  test('missing codes are told from numbers and keep their spelling', () => {
    for (const code of ['NaN', '-999', '-9999', 'n/a', '', '-', '–', '-999,00', 'k.A.', '-999.0']) {
      expect(readNumber(code, decideNumberFormat([])), code).toMatchObject({ value: null, missing: code });
    }
    expect(values(['-99', '0'])).toEqual([-99, 0]);
  });

  test('a detection limit is kept as limit, an uncertainty is split off, a unit in the cell is handed on', () => {
    expect(read(['<0.02'])[0]).toEqual({ value: 0.02, belowDetection: true });
    expect(read(['bdl'])[0]).toEqual({ value: null, belowDetection: true });
    expect(read(['0.50 ± 0.04'])[0]).toEqual({ value: 0.5, plusMinus: 0.04 });
    expect(read(['12.3 mg/m2/yr'])[0]).toEqual({ value: 12.3, unitText: 'mg/m2/yr' });
    expect(read(['abc'])[0]?.problem?.code).toBe('not-a-number');
  });

  const styles: [string, (value: string) => string][] = [
    ['decimal point', (value) => value],
    ['decimal comma', (value) => value.replace('.', ',')],
    ['English thousands', (value) => grouped(value, ',', '.')],
    ['German thousands', (value) => grouped(value, '.', ',')],
    ['spaces and comma', (value) => grouped(value, ' ', ',')],
  ];
  test.each(styles)('numbers written with %s read back as the same numbers', (_name, write) => {
    const number = fc.double({ min: -9e8, max: 9e8, noNaN: true }).map((value) => value.toFixed(4));
    fc.assert(
      fc.property(fc.array(number, { minLength: 1, maxLength: 20 }), (written) => {
        expect(values(written.map(write))).toEqual(written.map((text) => Number(text) + 0));
      }),
    );
  });
});

function grouped(value: string, group: string, decimal: string): string {
  const [whole = '', fraction = ''] = value.replace('-', '').split('.');
  return `${value.startsWith('-') ? '−' : ''}${whole.replace(/\B(?=(\d{3})+$)/g, group)}${decimal}${fraction}`;
}
