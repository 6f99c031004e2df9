import { cellAddress, cellPath, columnOf } from './cell-link';

const trace = { datasetSlug: 'epica-dome-c', versionNumber: 2 };

test('a cell is named as spreadsheets name it, blanks in the sheet name quoted', () => {
  expect(cellAddress({ sheet: 'EDC', row: 7, cell: 'F7' })).toBe('EDC!F7');
  expect(cellAddress({ sheet: "site's data", row: 7, cell: '$F$7' })).toBe("'site''s data'!F7");
});

test('a value without a cell of its own is named by its row', () => {
  expect(cellAddress({ sheet: 'EDC', row: 7, cell: null })).toBe('EDC, row 7');
});

test.each([
  ['F7', 'F'],
  ['AB12', 'AB'],
  ['$ab$12', 'AB'],
  ['7', null],
])('the column of %s is %s', (cell, column) => {
  expect(columnOf(cell)).toBe(column);
});

test('the link leads to the sheet, row and column of the file of that dataset version', () => {
  const address = new URL(cellPath(trace, { sheet: 'EDC & co', row: 7, cell: 'F7' }), 'http://localhost');
  expect(address.pathname).toBe('/holdings/epica-dome-c/versions/2/cells');
  expect(Object.fromEntries(address.searchParams)).toEqual({ sheet: 'EDC & co', row: '7', column: 'F' });
});

test('a place without a cell still leads to its row', () => {
  expect(cellPath(trace, { sheet: 'EDC', row: 7, cell: null })).toBe(
    '/holdings/epica-dome-c/versions/2/cells?sheet=EDC&row=7',
  );
});
