import { emptyRow, readMeasured } from './measured-form';
import { addRows, readMeasuredText } from './measured-text';

const rowsIn = (text: string) => {
  const read = readMeasuredText(text);
  if ('faults' in read) throw new Error(JSON.stringify(read.faults));
  return read;
};
const faultsIn = (text: string) => {
  const read = readMeasuredText(text);
  return 'faults' in read ? read.faults : [];
};

test('a block parted by tabs in nm becomes rows in µm whose bounds are the value', () => {
  const { rows, unused } = rowsIn('wavelength (nm)\textinction (m²/g)\tω\tg\tsite\n550\t0.6\t0.94\t0.7\tA\n');
  expect(rows).toEqual([['0.55', '0.6', '0.6', '0.6', '0.94', '0.94', '0.94', '0.7', '0.7', '0.7']]);
  expect(unused).toEqual(['site']);
  expect('rows' in readMeasured(rows.map((values, key) => ({ key, values })))).toBe(true);
});

test('decimal commas are read for the whole block, three decimals among them, and columns stand in any order', () => {
  const { rows } = rowsIn(
    'g;ssa;extinction;wavelength [µm]\n0,7;0,940;1,250;0,55\r\n\r\n# note\n0,68;0,9;0,5;1,02\r\n',
  );
  expect(rows.map((row) => [row[0], row[2], row[5], row[8]])).toEqual([
    ['0.55', '1.25', '0.94', '0.7'],
    ['1.02', '0.5', '0.9', '0.68'],
  ]);
});

test('columns of low and high give the bounds', () => {
  const { rows } = rowsIn('wavelength um,extinction,ssa low,ssa,ssa high,g\n0.55,0.6,0.9,0.94,0.97,0.7');
  expect(rows[0]!.slice(4, 7)).toEqual(['0.9', '0.94', '0.97']);
});

test('faults name row, column, value and remedy, all of them at once', () => {
  const faults = faultsIn('wavelength (nm)\textinction\tssa\tg\n550\tabout 1\t0.94\t0.7\n600\t0.5\t0.9\tn/a');
  expect(faults.map(({ row, column, value }) => [row, column, value])).toEqual([
    [2, 'extinction', 'about 1'],
    [3, 'g', 'n/a'],
  ]);
  expect(faults[0]!.message).toMatch(/Write it as/);
});

test('a value out of its range is told once, at its cell, as it was written', () => {
  const faults = faultsIn('wavelength (nm)\textinction\tssa\tg\n550\t0.6\t94\t0.7');
  expect(faults).toHaveLength(1);
  expect(faults[0]).toMatchObject({ row: 2, column: 'ssa', value: '94' });
  expect(faults[0]!.message).toMatch(/0 to 1/);
});

test('a wavelength without unit, a strange unit and a missing column are told in the heading row', () => {
  expect(faultsIn('wavelength\textinction\tssa\tg\n1\t1\t1\t0')[0]!.message).toMatch(/µm or nm/);
  expect(faultsIn('wavelength (nm)\textinction (km2/kg)\tssa\tg\n1\t1\t1\t0')[0]!.message).toMatch(/m²\/g/);
  expect(faultsIn('wavelength (nm)\textinction\tssa\n550\t1\t1')[0]!.message).toMatch(/No column of g/);
  expect(faultsIn('wavelength (nm)\textinction\tssa\tg')[0]!.message).toMatch(/at least one row/);
});

test('decimal commas in columns parted by commas are refused with the remedy', () => {
  expect(faultsIn('wavelength (µm),extinction,ssa,g\n0,55,0,6,0,9,0,7')[0]!.message).toMatch(
    /tab or semicolon/,
  );
});

test('a wavelength that stands twice is told with both rows', () => {
  const faults = faultsIn('wavelength (nm)\textinction\tssa\tg\n550\t1\t0.9\t0.7\n550\t2\t0.9\t0.7');
  expect(faults[0]).toMatchObject({ row: 3, value: '550' });
  expect(faults[0]!.message).toMatch(/row 2/);
});

test('rows that were typed stay, empty ones give way, and none is overwritten', () => {
  const typed = { key: 4, values: ['0,55', ...emptyRow(0).values.slice(1, -1), '0.8'] };
  const row = (wavelength: string) => [wavelength, ...Array.from({ length: 9 }, () => '0.5')];
  const added = addRows([typed, emptyRow(5)], [row('0.7')]);
  expect('form' in added && added.form.map(({ key, values }) => [key, values[0]])).toEqual([
    [4, '0,55'],
    [6, '0.7'],
  ]);
  expect(addRows([typed], [row('0.55')])).toEqual({ fault: expect.stringContaining('0.55 µm stands') });
});
