import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { RawWorkbook } from '@siltlight/common/sheet/grid';
import * as XLSX from 'xlsx';
import type { ReadLimits } from '../src/workers/limits';
import { readersAlive } from '../src/workers/reader-process';
import { readUpload } from '../src/workers/upload-reader';
import { UploadRefused } from '../src/workers/upload-refused';
import { dateStyles, hostileFiles, strangeFiles, tableXml, workbookOf } from './hostile-files';

let folder: string;
beforeAll(async () => (folder = await mkdtemp(path.join(tmpdir(), 'upload-reader-'))));
afterAll(() => rm(folder, { recursive: true, force: true }));

async function read(
  fileName: string,
  content: Buffer,
  limits?: Partial<ReadLimits>,
  signal?: AbortSignal,
): Promise<RawWorkbook> {
  const file = path.join(folder, 'upload.bin');
  await writeFile(file, content);
  return readUpload({ path: file, fileName, limits, signal });
}

async function refusalOf(
  fileName: string,
  content: Buffer,
  limits?: Partial<ReadLimits>,
): Promise<UploadRefused> {
  const outcome: unknown = await read(fileName, content, limits).catch((cause: unknown) => cause);
  expect(outcome).toBeInstanceOf(UploadRefused);
  return outcome as UploadRefused;
}

const texts = (book: RawWorkbook, sheet = 0): (string | null)[][] =>
  book.sheets[sheet]!.rows.map((row) => row.map((cell) => cell?.text ?? null));

const smallTable = [
  ['site', 'flux'],
  ['Dome C', '0.42'],
];

/** Counts how often the event loop came round while work was going on elsewhere. */
async function turnsDuring<T>(work: Promise<T>): Promise<{ turns: number; outcome: T | Error }> {
  let turns = 0;
  const timer = setInterval(() => (turns += 1), 5);
  const outcome = await work.catch((cause: Error) => cause);
  clearInterval(timer);
  return { turns, outcome };
}

describe('refusals', () => {
  test.each(hostileFiles.map((file) => [file.fileName, file.code, file]))(
    '%s is refused as %s',
    async (_name, _code, file) => {
      const refused = await refusalOf(file.fileName, file.make());
      expect([refused.code, refused.status]).toEqual([file.code, file.status]);
      expect(refused.detail).toContain(file.fileName);
      expect(readersAlive()).toBe(0);
    },
  );

  test('each limit refuses the file just above it and reads the file at it', async () => {
    const csv = Buffer.from('a,b,c\n1,2,3\n4,5,6\n');
    const book = workbookOf({ sheet: tableXml });
    const edges: [string, Buffer, keyof ReadLimits, number, string, number][] = [
      ['t.csv', csv, 'textBytes', csv.length, 'too-large', 413],
      ['t.csv', csv, 'textRows', 3, 'too-many-rows', 422],
      ['t.csv', csv, 'columns', 3, 'too-many-columns', 422],
      ['t.csv', csv, 'textCells', 9, 'too-many-cells', 422],
      ['t.xlsx', book, 'workbookBytes', book.length, 'too-large', 413],
      ['t.xlsx', book, 'workbookRows', 2, 'too-many-rows', 422],
      ['t.xlsx', book, 'columns', 2, 'too-many-columns', 422],
      ['t.xlsx', book, 'workbookCells', 4, 'too-many-cells', 422],
      ['t.xlsx', book, 'zipMembers', 5, 'too-many-members', 422],
      ['t.xlsx', book, 'cellCharacters', 6, 'cell-too-long', 422],
    ];
    for (const [fileName, content, limit, value, code, status] of edges) {
      expect((await read(fileName, content, { [limit]: value })).sheets).toHaveLength(1);
      const refused = await refusalOf(fileName, content, { [limit]: value - 1 });
      expect([limit, refused.code, refused.status, refused.limit]).toEqual([limit, code, status, value - 1]);
    }
  });

  test('a transfer that stopped early is told as damaged', async () => {
    const file = path.join(folder, 'short.csv');
    await writeFile(file, 'a,b\n1,2\n');
    await expect(readUpload({ path: file, fileName: 'short.csv', bytes: 500 })).rejects.toMatchObject({
      code: 'damaged-file',
    });
  });

  test('a password-protected .xls is refused as encrypted', async () => {
    const { content } = protectedXls();
    expect((await refusalOf('secret.xls', content)).code).toBe('encrypted-workbook');
  });

  test('a reader over its memory or its time is killed and the reason told', async () => {
    const csv = Buffer.from('a,b,c,d\n'.repeat(400_000));
    expect((await refusalOf('large.csv', csv, { residentBytes: 20 * 1024 * 1024 })).code).toBe(
      'too-much-memory',
    );
    expect((await refusalOf('large.csv', csv, { wallSeconds: 0.05 })).code).toBe('took-too-long');
    expect(readersAlive()).toBe(0);
  });
});

describe('strange but honest files', () => {
  test.each(strangeFiles.map((file) => [file.fileName, file]))(
    '%s gives its two rows',
    async (_name, file) => {
      expect(texts(await read(file.fileName, file.make()))).toEqual(smallTable);
    },
  );

  test('a comment named __proto__ pollutes nothing here and nothing in the next file', async () => {
    const before = Reflect.ownKeys(Object.prototype);
    const hostile = strangeFiles.find((file) => file.fileName === 'proto-comment.xlsx')!;
    await read(hostile.fileName, hostile.make());
    expect(Reflect.ownKeys(Object.prototype)).toEqual(before);
    expect(({} as Record<string, unknown>).c).toBeUndefined();
    expect(texts(await read('next.csv', Buffer.from('site,flux\nDome C,0.42\n')))).toEqual(smallTable);
  });
});

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
      const book = await read(`t.${format}`, content);
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
    const book = await read('f.xlsx', workbookOf({ sheet }));
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
    const book = await read('d.xlsx', workbookOf({ sheet, styles: dateStyles, workbookPr }));
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
    const book = await read('m.xlsx', workbookOf({ sheet, comments, sheetState: 'state="hidden"' }));
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
    const book = await read('t.csv', content);
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
    const book = await read('t.txt', Buffer.from(content));
    expect(book.delimiter).toBe(delimiter);
    expect(texts(book).slice(-3)).toEqual([
      ['site', 'age', 'flux'],
      ['Dome C', '21', '0.4'],
      ['Vostok', '20', '0.3'],
    ]);
  });

  test('a quotation mark that is never closed swallows nothing', async () => {
    const book = await read('t.csv', Buffer.from('site,size\n"Dome C,1\n' + 'Vostok,2\n'.repeat(3)));
    expect(texts(book).slice(0, 3)).toEqual([
      ['site', 'size'],
      ['"Dome C', '1'],
      ['Vostok', '2'],
    ]);
    expect(book.readNotes.map((note) => note.code)).toContain('quotes-taken-literally');
  });

  test("a person's choice of encoding and separator is followed", async () => {
    const file = path.join(folder, 'chosen.csv');
    await writeFile(file, Buffer.from('a;b\nü;1,5\n'));
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
    const { turns, outcome } = await turnsDuring(read('long.csv', Buffer.from(lines.join('\n'))));
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

describe('calling a reading off', () => {
  test('a hundred aborted readings leave no process behind', async () => {
    const file = path.join(folder, 'aborted.xlsx');
    await writeFile(file, workbookOf({ sheet: tableXml }));
    const called = Array.from({ length: 100 }, async (_, i) => {
      const control = new AbortController();
      const reading = readUpload({ path: file, fileName: 'aborted.xlsx', signal: control.signal });
      // Some are called off before they start, some while they wait, some as they read.
      setTimeout(() => control.abort(), (i % 10) * 10);
      return reading.then(
        () => 'read',
        (cause: Error) => cause.name,
      );
    });
    const outcomes = await Promise.all(called);
    expect(outcomes.filter((outcome) => outcome === 'AbortError').length).toBeGreaterThan(90);
    expect(readersAlive()).toBe(0);
    expect(texts(await readUpload({ path: file, fileName: 'aborted.xlsx' }))).toEqual(smallTable);
  });
});

/** A workbook whose stream carries a FILEPASS record after its first record ([MS-XLS] 2.4.117). */
function protectedXls(): { content: Buffer } {
  const made = XLSX.utils.book_new();
  XLSX.utils.book_append_sheet(made, XLSX.utils.aoa_to_sheet(smallTable), 'Fluxes');
  const container = XLSX.CFB.read(XLSX.write(made, { type: 'buffer', bookType: 'biff8' }) as Buffer, {
    type: 'buffer',
  });
  const stream = Buffer.from(XLSX.CFB.find(container, '/Workbook')!.content as unknown as Uint8Array);
  const afterFirst = 4 + stream.readUInt16LE(2);
  const filePass = Buffer.concat([Buffer.from('2f003600010001000100', 'hex'), Buffer.alloc(48, 0xab)]);
  const content = Buffer.concat([stream.subarray(0, afterFirst), filePass, stream.subarray(afterFirst)]);
  XLSX.CFB.utils.cfb_add(container, '/Workbook', content);
  return { content: XLSX.CFB.write(container, { type: 'buffer' }) as unknown as Buffer };
}
