import { FluentProvider } from '@fluentui/react-components';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { themes } from '../theme/themes';
import type { DataColumn } from './column';
import { DataTable, type DataTableProps } from './data-table';

type Row = { code: string; net: number | null };
const columns: DataColumn<Row>[] = [
  { id: 'code', header: 'Region', value: (row) => row.code },
  { id: 'net', header: 'Net', value: (row) => row.net, align: 'right' },
];
const rows: Row[] = [
  { code: 'ARS', net: -1.16 },
  { code: 'CAR', net: null },
  { code: 'SAH', net: 0.9 },
  { code: 'SSA', net: -1.72 },
];

function show(props: Partial<DataTableProps<Row>> = {}, start = '/') {
  const table = (
    <DataTable
      caption="Regions"
      columns={columns}
      rows={rows}
      rowKey={(row) => row.code}
      empty="Nothing yet."
      {...props}
    />
  );
  const router = createMemoryRouter(
    [{ path: '*', element: <FluentProvider theme={themes.light}>{table}</FluentProvider> }],
    { initialEntries: [start] },
  );
  render(<RouterProvider router={router} />);
  return router;
}
const shown = () =>
  screen
    .getAllByRole('row')
    .slice(1)
    .map((row) => within(row).getAllByRole('cell')[0]!.textContent);

test('a press on a heading sorts by size, up and then down, absent values last both ways', async () => {
  const user = userEvent.setup();
  show();
  await user.click(screen.getByRole('button', { name: 'Net' }));
  expect(shown()).toEqual(['SSA', 'ARS', 'SAH', 'CAR']);
  expect(screen.getByRole('columnheader', { name: 'Net' })).toHaveAttribute('aria-sort', 'ascending');
  await user.click(screen.getByRole('button', { name: 'Net' }));
  expect(shown()).toEqual(['SAH', 'ARS', 'SSA', 'CAR']);
  await user.click(screen.getByRole('button', { name: 'Net' }));
  expect(shown()).toEqual(['ARS', 'CAR', 'SAH', 'SSA']);
});

test('sorting and filter stand in the address and are read from it', async () => {
  const user = userEvent.setup();
  const router = show({ address: 'r-', filterable: true }, '/?r-sort=-net');
  expect(shown()[0]).toBe('SAH');
  await user.type(screen.getByRole('searchbox', { name: 'Filter Regions' }), 'ars');
  expect(shown()).toEqual(['ARS']);
  expect(router.state.location.search).toContain('r-find=ars');
});

test('a filter that nothing fits says so', async () => {
  const user = userEvent.setup();
  show({ filterable: true });
  await user.type(screen.getByRole('searchbox'), 'zzz');
  expect(screen.getByText(/No row holds/)).toBeInTheDocument();
});

test('a row is picked by Enter and reached by the arrow keys; a pinned total is not', async () => {
  const user = userEvent.setup();
  const picked: string[] = [];
  show({ onSelect: (row) => picked.push(row.code), pinned: [{ code: 'Global mean', net: -0.4 }] });
  expect(shown()[0]).toBe('Global mean');
  screen.getByRole('row', { name: /ARS/ }).focus();
  await user.keyboard('{ArrowDown}{Enter}');
  expect(picked).toEqual(['CAR']);
  await user.click(screen.getByRole('row', { name: /Global mean/ }));
  expect(picked).toEqual(['CAR']);
});

test('the count of all rows is told even when only some are drawn', () => {
  const many = Array.from({ length: 5000 }, (_, at) => ({ code: `S${at}`, net: at }));
  show({ rows: many, heightPx: 300 });
  expect(screen.getByRole('table', { name: 'Regions' })).toHaveAttribute('aria-rowcount', '5001');
  expect(screen.getAllByRole('row').length).toBeLessThan(200);
});

test('an empty table says what to do next', () => {
  show({ rows: [] });
  expect(screen.getByText('Nothing yet.')).toBeInTheDocument();
});
