import { blockText, parseBlock, placeBlock } from './block';
import { moveCursor, rangeOf } from './move';

test('a pasted block keeps quoted tabs, breaks and quotes, and drops the last empty line', () => {
  expect(parseBlock('a\tb\r\n"c\td"\t"e ""f""\n"\r\n')).toEqual([
    ['a', 'b'],
    ['c\td', 'e "f"\n'],
  ]);
  expect(parseBlock('')).toEqual([['']]);
});

test('what is copied reads back as it was', () => {
  const rows = [
    ['1,5', 'x\ty'],
    ['', 'say "no"'],
  ];
  expect(parseBlock(blockText(rows))).toEqual(rows);
});

test('a block takes only data rows and columns of the sheet, and leaves out what says the same', () => {
  const placed = placeBlock(
    [
      ['1', '2', '3'],
      ['4', '5', '6'],
      ['7', '8', '9'],
    ],
    {
      row: 10,
      columnAt: 1,
      letters: ['A', 'B', 'C'],
      takes: (row) => row <= 11,
      textAt: (row, letter) => (row === 10 && letter === 'B' ? '1' : ''),
    },
  );
  expect(placed.cells).toEqual([
    { row: 10, column: 'C', text: '2' },
    { row: 11, column: 'B', text: '4' },
    { row: 11, column: 'C', text: '5' },
  ]);
  expect(placed.outside).toBe(5);
});

test('arrows stop at the edges, and with Ctrl go to them', () => {
  const bounds = { rowCount: 100, columnCount: 5, pageRows: 10 };
  const press = (key: string, ctrlKey = false) =>
    moveCursor({ row: 1, columnAt: 4 }, { key, ctrlKey, metaKey: false }, bounds);
  expect(press('ArrowUp')).toEqual({ row: 1, columnAt: 4 });
  expect(press('ArrowRight')).toEqual({ row: 1, columnAt: 4 });
  expect(press('PageDown')).toEqual({ row: 11, columnAt: 4 });
  expect(press('End', true)).toEqual({ row: 100, columnAt: 4 });
  expect(press('Home', true)).toEqual({ row: 1, columnAt: 0 });
  expect(press('x')).toBeNull();
});

test('a selection is the same rectangle whichever way it was drawn', () => {
  const [a, b] = [
    { row: 9, columnAt: 1 },
    { row: 4, columnAt: 3 },
  ];
  expect(rangeOf(a, b)).toEqual(rangeOf(b, a));
  expect(rangeOf(a, b)).toEqual({ top: 4, bottom: 9, left: 1, right: 3 });
});
