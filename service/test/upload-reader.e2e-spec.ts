import path from 'node:path';
import type { RawWorkbook } from '@siltlight/common/sheet/grid';
import * as XLSX from 'xlsx';
import { readUpload } from '../src/workers/upload-reader';
import { ReaderBench, texts } from './upload-reader-bench';
import { dateStyles, workbookOf } from './upload-reader-files';

const bench = new ReaderBench();
beforeAll(() => bench.open());
afterAll(() => bench.close());

/** Counts how often the event loop came round while work was going on elsewhere. */
async function turnsDuring<T>(work: Promise<T>): Promise<{ turns: number; outcome: T | Error }> {
  let turns = 0;
  const timer = setInterval(() => (turns += 1), 5);
  const outcome = await work.catch((cause: Error) => cause);
  clearInterval(timer);
  return { turns, outcome };
}

describe('workbooks', () => {
  const rows = [
    ['site', 'age', 'flux', 'ok'],
    ['Dome C', 21, 0.4567, true],
    [null, 22, -999, false],
  ];

  test.each(['xlsx', 'xlsm', 'xlsb', 'xls', 'ods'] as const)(
    'a .%s gives text, numbers and truth values with their kinds',
    async (format) => {
      const made = XLSX.utils.book_new();
      XLSX.utils.book_append_sheet(made, XLSX.utils.aoa_to_sheet(rows), 'Fluxes');
      const content = XLSX.write(made, {
        type: 'buffer',
        bookType: format === 'xls' ? 'biff8' : format,
      }) as Buffer;
      const book = await bench.read(`t.${format}`, content);
      expect(book.format).toBe(format);
      expect(book.sheets[0]).toMatchObject({ name: 'Fluxes', columnCount: 4 });
      expect(
        book.sheets[0]!.rows.map((row) => row.map((cell) => cell?.number ?? cell?.text ?? null)),
      ).toEqual([
        ['site', 'age', 'flux', 'ok'],
        ['Dome C', 21, 0.4567, 'TRUE'],
        [null, 22, -999, 'FALSE'],
      ]);
      expect(book.sheets[0]!.rows[1]!.map((cell) => cell?.kind)).toEqual([
        'text',
        'number',
        'number',
        'boolean',
      ]);
    },
  );

  test('a formula is recorded, its stored value read, and nothing calculated', async () => {
    const sheet =
      '<sheetData><row r="1"><c r="A1"><f>SUM(B1:B9)</f><v>7</v></c><c r="B1"><f>WEBSERVICE("http://127.0.0.1/")</f></c></row></sheetData>';
    const book = await bench.read('f.xlsx', workbookOf({ sheet }));
    expect(book.sheets[0]!.rows[0]).toEqual([
      { text: '7', kind: 'number', number: 7, formula: 'SUM(B1:B9)' },
      { text: '', kind: 'text', formula: 'WEBSERVICE("http://127.0.0.1/")' },
    ]);
    expect(book.readNotes.map((note) => note.code)).toEqual(['formulas', 'formulas-without-value']);
  });

  // Serial 36526 is 2000-01-01 counted from 1900; from 1904 the same number is 1462 days later.
  test.each([
    ['', '2000-01-01'],
    ['<workbookPr date1904="1"/>', '2004-01-02'],
  ])('a date is told as ISO text in the date system of the workbook (%s)', async (workbookPr, iso) => {
    const sheet =
      '<sheetData><row r="1"><c r="A1" s="1"><v>36526</v></c><c r="B1"><v>36526</v></c></row></sheetData>';
    const book = await bench.read('d.xlsx', workbookOf({ sheet, styles: dateStyles, workbookPr }));
    expect(book.sheets[0]!.rows[0]).toEqual([
      { text: iso, kind: 'date' },
      { text: '36526', kind: 'number', number: 36526 },
    ]);
  });

  test('error cells, merged ranges, comments, gaps and hidden sheets come through', async () => {
    const sheet =
      '<sheetData><row r="1"><c r="A1" t="e"><v>#N/A</v></c></row><row r="4"><c r="C4"><v>1</v></c></row></sheetData><mergeCells count="1"><mergeCell ref="A1:C1"/></mergeCells>';
    const comments =
      '<comments xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main"><authors><author>A</author></authors><commentList><comment ref="C4" authorId="0"><text><t>remeasured</t></text></comment></commentList></comments>';
    const book = await bench.read('m.xlsx', workbookOf({ sheet, comments, sheetState: 'state="hidden"' }));
    expect(book.sheets[0]).toEqual({
      name: 'Fluxes',
      hidden: true,
      merged: ['A1:C1'],
      comments: [{ cell: 'C4', text: 'remeasured' }],
      columnCount: 3,
      rows: [
        [{ text: '#N/A', kind: 'error' }],
        [],
        [],
        [null, null, { text: '1', kind: 'number', number: 1 }],
      ],
    });
  });
});

describe('the sample submissions', () => {
  const sample = async (fileName: string): Promise<RawWorkbook> =>
    readUpload({ path: path.join(__dirname, '../../reference/samples', fileName), fileName });
  const shapes = ({ sheets }: RawWorkbook): unknown[] =>
    sheets.map(({ name, rows, columnCount }) => [name, rows.length, columnCount]);
  const found = (book: RawWorkbook, sheet: string, text: string) =>
    book.sheets
      .find(({ name }) => name === sheet)!
      .rows.flat()
      .find((cell) => cell?.text === text);

  test('the workbook of two ice cores comes with its four sheets, merged headings and positions in words', async () => {
    const book = await sample('A_EDC_NGRIP_dust_v3_final.xlsx');
    expect(shapes(book)).toEqual([
      ['READ ME', 12, 2],
      ['EDC', 158, 7],
      ['NGRIP', 103, 9],
      ['old calc', 12, 2],
    ]);
    expect(book.sheets[1]!.merged).toEqual(['A1:G1', 'C4:D4', 'F4:G4']);
    expect(found(book, 'EDC', "75°06'S")).toEqual({ text: "75°06'S", kind: 'text' });
    expect(book.sheets[1]!.rows[6]![5]).toEqual({ text: '0.4963', kind: 'number', number: 0.4963 });
  });

  test('the German export comes as windows-1252 with semicolons and its decimal commas untouched', async () => {
    const book = await sample('B_Staubfluesse_Export.csv');
    expect([book.encoding, book.delimiter]).toEqual(['windows-1252', ';']);
    expect(texts(book)[3]).toEqual([
      'Site',
      'Breite (°)',
      'Länge (°)',
      'Alter (a v. 1950)',
      'Fluss (mg m-2 d-1)',
      'Fehler (1s)',
      'Bemerkung',
    ]);
    expect(texts(book)[5]).toEqual(['Dome C', '-75,10', '123,35', '3500', '0,0008264', '0,0000474']);
  });

  test('the published Dome C workbook in the older format comes with its three sheets', async () => {
    expect(shapes(await sample('wolff2006edc-chem.xls'))).toEqual([
      ['Readme', 92, 1],
      ['byDepth', 1434, 4],
      ['byAge', 410, 11],
    ]);
  });
});

describe('text tables', () => {
  const table = 'Ort;Länge (°);Fluss\nDôme C;123,35;0,42\n"Tief; alt";;–\n';
  const expected = [
    ['Ort', 'Länge (°)', 'Fluss'],
    ['Dôme C', '123,35', '0,42'],
    ['Tief; alt', null, '–'],
  ];
  const swapped = (text: string): Buffer => Buffer.from(text, 'utf16le').swap16();
  const western = Buffer.from(table.replaceAll('–', '\x96'), 'latin1');

  test.each<[string, Buffer, string]>([
    ['UTF-8', Buffer.from(table), 'utf-8'],
    ['UTF-8 with its mark', Buffer.from(`\ufeff${table}`), 'utf-8'],
    ['UTF-16 little-endian with its mark', Buffer.from(`\ufeff${table}`, 'utf16le'), 'utf-16le'],
    ['UTF-16 little-endian without a mark', Buffer.from(table, 'utf16le'), 'utf-16le'],
    ['UTF-16 big-endian with its mark', swapped(`\ufeff${table}`), 'utf-16be'],
    ['UTF-16 big-endian without a mark', swapped(table), 'utf-16be'],
    ['windows-1252', western, 'windows-1252'],
    ['carriage return and line feed', Buffer.from(table.replaceAll('\n', '\r\n')), 'utf-8'],
    ['carriage returns', Buffer.from(table.replaceAll('\n', '\r')), 'utf-8'],
  ])('the same table in %s gives equal cells', async (_name, content, encoding) => {
    const book = await bench.read('t.csv', content);
    expect(texts(book)).toEqual(expected);
    expect([book.encoding, book.delimiter]).toEqual([encoding, ';']);
    expect(book.readNotes.map((note) => note.code)).toEqual(['encoding', 'delimiter']);
  });

  test.each([
    [',', 'site,age,flux\nDome C,21,0.4\nVostok,20,0.3\n'],
    [';', 'site;age;flux\nDome C;21;0.4\nVostok;20;0.3\n'],
    ['\t', 'site\tage\tflux\nDome C\t21\t0.4\nVostok\t20\t0.3\n'],
    ['|', 'site|age|flux\nDome C|21|0.4\nVostok|20|0.3\n'],
    ['two or more spaces', 'site     age   flux\nDome C    21    0.4\n  Vostok    20    0.3\n'],
    [',', 'sep=,\nsite,age,flux\nDome C,21,0.4\nVostok,20,0.3\n'],
  ])('a table cut by %j is cut so', async (delimiter, content) => {
    const book = await bench.read('t.txt', Buffer.from(content));
    expect(book.delimiter).toBe(delimiter);
    expect(texts(book).slice(-3)).toEqual([
      ['site', 'age', 'flux'],
      ['Dome C', '21', '0.4'],
      ['Vostok', '20', '0.3'],
    ]);
  });

  test('a quotation mark that is never closed swallows nothing', async () => {
    const book = await bench.read('t.csv', Buffer.from('site,size\n"Dome C,1\n' + 'Vostok,2\n'.repeat(3)));
    expect(texts(book).slice(0, 3)).toEqual([
      ['site', 'size'],
      ['"Dome C', '1'],
      ['Vostok', '2'],
    ]);
    expect(book.readNotes.map((note) => note.code)).toContain('quotes-taken-literally');
  });

  test("a person's choice of encoding and separator is followed", async () => {
    const file = await bench.write(Buffer.from('a;b\nü;1,5\n'));
    const book = await readUpload({
      path: file,
      fileName: 'chosen.csv',
      text: { encoding: 'windows-1252', delimiter: ',' },
    });
    expect(texts(book)).toEqual([['a;b'], ['Ã¼;1', '5']]);
  });

  test('a long table arrives row for row while the server goes on', async () => {
    const count = 60_000;
    const lines = Array.from({ length: count }, (_, i) => `site ${i},${i / 10},"a ""quoted"" note"`);
    const { turns, outcome } = await turnsDuring(bench.read('long.csv', Buffer.from(lines.join('\n'))));
    const { rows } = (outcome as RawWorkbook).sheets[0]!;
    expect(rows).toHaveLength(count);
    expect(rows[count - 1]!.map((cell) => cell?.text)).toEqual([
      `site ${count - 1}`,
      String((count - 1) / 10),
      'a "quoted" note',
    ]);
    expect(turns).toBeGreaterThan(1);
  });
});
