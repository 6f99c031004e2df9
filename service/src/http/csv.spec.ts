import Papa from 'papaparse';
import { csvTable } from './csv';

describe('the CSV writer', () => {
  it('keeps negative numbers as numbers and escapes texts that a spreadsheet would run', () => {
    expect(csvTable([['=1+1', -0.42, '-5 percent', null, 'a,"b"']])).toBe(
      `'=1+1,-0.42,'-5 percent,,"a,""b"""\r\n`,
    );
  });

  it('is read back by another package cell for cell', () => {
    const rows = [
      ['Region', 'net W m-2'],
      ['Sahara, "west"', -1.25e-7],
      ['line\nbreak', 0.1],
    ];
    const back = Papa.parse<string[]>(csvTable(rows).trimEnd()).data;
    expect(back).toEqual(rows.map((row) => row.map(String)));
  });

  it('refuses a number that is none', () => {
    expect(() => csvTable([[Number.NaN]])).toThrow('not a finite number');
  });
});
