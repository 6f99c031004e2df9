import * as XLSX from 'xlsx';
import type { ReadLimits } from '../src/workers/limits';
import { readersAlive } from '../src/workers/reader-process';
import { readUpload } from '../src/workers/upload-reader';
import { UploadRefused } from '../src/workers/upload-refused';
import { hostileFiles, strangeFiles } from './hostile-files';
import { ReaderBench, smallTable, texts } from './upload-reader-bench';
import { tableXml, workbookOf } from './upload-reader-files';

const bench = new ReaderBench();
beforeAll(() => bench.open());
afterAll(() => bench.close());

async function refusalOf(
  fileName: string,
  content: Buffer,
  limits?: Partial<ReadLimits>,
): Promise<UploadRefused> {
  const outcome: unknown = await bench.read(fileName, content, limits).catch((cause: unknown) => cause);
  expect(outcome).toBeInstanceOf(UploadRefused);
  return outcome as UploadRefused;
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
      expect((await bench.read(fileName, content, { [limit]: value })).sheets).toHaveLength(1);
      const refused = await refusalOf(fileName, content, { [limit]: value - 1 });
      expect([limit, refused.code, refused.status, refused.limit]).toEqual([limit, code, status, value - 1]);
    }
  });

  test('a transfer that stopped early is told as damaged', async () => {
    const file = await bench.write('a,b\n1,2\n');
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
    expect((await refusalOf('large.csv', csv, { textWallSeconds: 0.05 })).code).toBe('took-too-long');
    expect(await refusalOf('large.csv', csv, { cpuSeconds: 0.05 })).toMatchObject({
      code: 'took-too-long',
      limit: 0.05,
    });
    expect(readersAlive()).toBe(0);
  });
});

describe('strange but honest files', () => {
  test.each(strangeFiles.map((file) => [file.fileName, file]))(
    '%s gives its two rows',
    async (_name, file) => {
      expect(texts(await bench.read(file.fileName, file.make()))).toEqual(smallTable);
    },
  );

  test('a comment named __proto__ pollutes nothing here and nothing in the next file', async () => {
    const before = Reflect.ownKeys(Object.prototype);
    const hostile = strangeFiles.find((file) => file.fileName === 'proto-comment.xlsx')!;
    await bench.read(hostile.fileName, hostile.make());
    expect(Reflect.ownKeys(Object.prototype)).toEqual(before);
    expect(({} as Record<string, unknown>).c).toBeUndefined();
    expect(texts(await bench.read('next.csv', Buffer.from('site,flux\nDome C,0.42\n')))).toEqual(smallTable);
  });
});

describe('calling a reading off', () => {
  test('a hundred aborted readings leave no process behind', async () => {
    const file = await bench.write(workbookOf({ sheet: tableXml }));
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
  return { content: XLSX.CFB.write(container, { type: 'buffer' }) };
}
