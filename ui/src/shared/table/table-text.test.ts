import type { DataColumn } from './column';
import { tableText } from './table-text';

type Row = { site: string; flux: number | null };
const columns: DataColumn<Row>[] = [
  { id: 'site', header: 'Site', value: (row) => row.site },
  { id: 'flux', header: 'Flux', unit: 'g m-2 yr-1', value: (row) => row.flux },
  { id: 'act', header: '', value: () => 'button', screenOnly: true },
];

test('a file holds units in its headings, full precision and a plain minus', () => {
  expect(tableText(columns, [{ site: 'EDC', flux: -0.123456789 }], ',')).toBe(
    'Site,Flux [g m-2 yr-1]\r\nEDC,-0.123456789\r\n',
  );
});

test('commas, quotes and line breaks inside a text are kept by quoting', () => {
  expect(tableText(columns, [{ site: 'A, "b"\nc', flux: null }], ',')).toBe(
    'Site,Flux [g m-2 yr-1]\r\n"A, ""b""\nc",\r\n',
  );
});

test('a text that would run as a formula is disarmed, a number in text form is not', () => {
  const written = tableText(
    columns,
    [
      { site: '=HYPERLINK(1)', flux: 1 },
      { site: '-12.5', flux: 2 },
      { site: '@x', flux: 3 },
    ],
    '\t',
  );
  expect(written).toContain("'=HYPERLINK(1)\t1");
  expect(written).toContain('\r\n-12.5\t2');
  expect(written).toContain("'@x\t3");
});
