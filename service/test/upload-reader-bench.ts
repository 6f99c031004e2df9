import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { RawWorkbook } from '@siltlight/common/sheet/grid';
import type { ReadLimits } from '../src/workers/limits';
import { readUpload } from '../src/workers/upload-reader';

export const smallTable = [
  ['site', 'flux'],
  ['Dome C', '0.42'],
];

export const texts = (book: RawWorkbook, sheet = 0): (string | null)[][] =>
  book.sheets[sheet]!.rows.map((row) => row.map((cell) => cell?.text ?? null));

/** A folder of its own for the files of one test file. */
export class ReaderBench {
  private folder = '';

  async open(): Promise<void> {
    this.folder = await mkdtemp(path.join(tmpdir(), 'upload-reader-'));
  }

  close(): Promise<void> {
    return rm(this.folder, { recursive: true, force: true });
  }

  async write(content: Buffer | string): Promise<string> {
    const file = path.join(this.folder, 'upload.bin');
    await writeFile(file, content);
    return file;
  }

  async read(fileName: string, content: Buffer, limits?: Partial<ReadLimits>): Promise<RawWorkbook> {
    return readUpload({ path: await this.write(content), fileName, limits });
  }
}
