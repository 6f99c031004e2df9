import { FluentProvider } from '@fluentui/react-components';
import { fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { expect } from 'vitest';
import { themes } from '../../../shared/theme/themes';
import type { GridCommand } from './grid-command';
import type { GridColumn } from './columns';
import type { GridModel } from './grid-model';
import { SheetGrid } from './sheet-grid';

const column = (letter: string, title: string | null): GridColumn => ({
  letter,
  heading: `head ${letter}`,
  title,
  unit: null,
  canonicalUnit: '',
  numeric: true,
  widthPx: 100,
});

/** jsdom has no layout: the grid is given a size so that rows and columns come into sight. */
beforeEach(() => {
  vi.spyOn(Element.prototype, 'clientHeight', 'get').mockReturnValue(600);
  vi.spyOn(Element.prototype, 'clientWidth', 'get').mockReturnValue(900);
  HTMLElement.prototype.scrollTo = () => undefined;
});
afterEach(() => vi.restoreAllMocks());

function show(part: Partial<GridModel> = {}, command: GridCommand | null = null) {
  const model: GridModel = {
    label: 'Cells of MAR',
    columns: [column('A', 'Age'), column('B', 'Dust flux'), column('C', null)],
    rowCount: 40,
    rowAt: (row) => ({
      row,
      data: row > 2,
      leftOut: null,
      cells: { A: { text: `a${row}`, value: row }, B: { text: `b${row}` } },
    }),
    kindOf: (row) => (row > 2 ? 'data' : 'heading'),
    leftOutAt: () => null,
    markAt: () => undefined,
    mendAt: () => undefined,
    queryAt: () => false,
    unsentAt: () => undefined,
    mayEdit: true,
    onMend: vi.fn(),
    onUndo: vi.fn(),
    onOpenQuery: vi.fn(),
    onRowMenu: vi.fn(),
    onSeen: vi.fn(),
    onPasted: vi.fn(),
    popover: null,
    ...part,
  };
  function Holder() {
    const [cursor, setCursor] = useState({ row: 3, columnAt: 0 });
    return <SheetGrid {...model} cursor={cursor} onCursor={setCursor} command={command} />;
  }
  render(
    <FluentProvider theme={themes.light}>
      <Holder />
    </FluentProvider>,
  );
  const grid = screen.getByRole('grid');
  if (!command) grid.focus();
  return { model, grid, active: () => grid.getAttribute('aria-activedescendant') };
}

test('arrows move the active cell and the grid names it', async () => {
  const { active } = show();
  expect(active()).toBe('cell-A3');
  await userEvent.keyboard('{ArrowDown}{ArrowRight}');
  expect(active()).toBe('cell-B4');
  expect(document.getElementById('cell-B4')).toHaveTextContent('b4');
});

test('typing replaces the text, Enter sends it and goes down', async () => {
  const { model, active } = show();
  await userEvent.keyboard('18.2{Enter}');
  expect(model.onMend).toHaveBeenCalledExactlyOnceWith([{ row: 3, column: 'A', text: '18.2' }]);
  expect(active()).toBe('cell-A4');
});

test('F2 opens the cell with its text, and Escape leaves it as it was', async () => {
  const { model } = show();
  await userEvent.keyboard('{F2}');
  expect(screen.getByRole('textbox', { name: 'A3' })).toHaveValue('a3');
  await userEvent.keyboard('99{Escape}');
  expect(model.onMend).not.toHaveBeenCalled();
  expect(screen.getByRole('grid')).toHaveFocus();
});

test('a cell left with the text it had is not sent', async () => {
  const { model } = show();
  await userEvent.keyboard('{Enter}{Enter}');
  expect(model.onMend).not.toHaveBeenCalled();
});

test('Delete empties all data cells of a selection that hold something', async () => {
  const { model } = show();
  await userEvent.keyboard('{Shift>}{ArrowDown}{ArrowRight}{/Shift}{Delete}');
  expect(model.onMend).toHaveBeenCalledExactlyOnceWith([
    { row: 3, column: 'A', text: '' },
    { row: 3, column: 'B', text: '' },
    { row: 4, column: 'A', text: '' },
    { row: 4, column: 'B', text: '' },
  ]);
});

test('headings cannot be typed over, nor anything by somebody who may not edit', async () => {
  const first = show();
  await userEvent.keyboard('{ArrowUp}x{Enter}');
  expect(screen.queryByRole('textbox')).toBeNull();
  expect(first.model.onMend).not.toHaveBeenCalled();
});

test('a reader moves about but typing does nothing', async () => {
  const { active } = show({ mayEdit: false });
  await userEvent.keyboard('x{ArrowDown}');
  expect(screen.queryByRole('textbox')).toBeNull();
  expect(active()).toBe('cell-A4');
});

test('a pasted block is sent as one change and says what fell outside', () => {
  const { model, grid } = show();
  fireEvent.paste(grid, { clipboardData: { getData: () => '1\t2\n3\t4\n' } });
  expect(model.onMend).toHaveBeenCalledExactlyOnceWith([
    { row: 3, column: 'A', text: '1' },
    { row: 3, column: 'B', text: '2' },
    { row: 4, column: 'A', text: '3' },
    { row: 4, column: 'B', text: '4' },
  ]);
  expect(model.onPasted).toHaveBeenCalledWith(4, 0);
});

test('Ctrl+Z on a mended cell takes the mend back', async () => {
  const { model } = show({ mendAt: (letter, row) => (letter === 'A' && row === 3 ? 'mend-1' : undefined) });
  await userEvent.keyboard('{Control>}z{/Control}');
  expect(model.onUndo).toHaveBeenCalledExactlyOnceWith('mend-1');
});

test('a proposal opens in the editor and is sent only when it is confirmed', async () => {
  const { model } = show({}, { edit: '-48.62' });
  expect(screen.getByRole('textbox', { name: 'A3' })).toHaveValue('-48.62');
  expect(model.onMend).not.toHaveBeenCalled();
  await userEvent.keyboard('{Enter}');
  expect(model.onMend).toHaveBeenCalledExactlyOnceWith([{ row: 3, column: 'A', text: '-48.62' }]);
});

test('a proposal that is only looked at is not sent', async () => {
  const { model } = show({}, { edit: '-48.62' });
  await userEvent.click(document.body);
  expect(screen.queryByRole('textbox')).toBeNull();
  expect(model.onMend).not.toHaveBeenCalled();
});

test('only rows in sight are drawn, and the count of all is told', () => {
  const { grid } = show({ rowCount: 100_000 });
  expect(grid).toHaveAttribute('aria-rowcount', '100001');
  expect(screen.getAllByRole('row').length).toBeLessThan(60);
});

test('Shift+F10 asks for the choices of the selected rows', async () => {
  const { model } = show();
  await userEvent.keyboard('{Shift>}{ArrowDown}{F10}{/Shift}');
  expect(model.onRowMenu).toHaveBeenCalledWith([3, 4], expect.any(HTMLElement));
});
