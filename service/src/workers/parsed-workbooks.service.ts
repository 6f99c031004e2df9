import { createHash, randomUUID } from 'node:crypto';
import * as fs from 'node:fs/promises';
import * as path from 'node:path';
import { promisify } from 'node:util';
import { gunzip, gzip } from 'node:zlib';
import { Injectable } from '@nestjs/common';
import type { RawWorkbook } from '@siltlight/common/sheet/grid';
import { Settings } from '../config/settings';
import { FileStore } from '../files/file-store.service';
import { readUpload } from './upload-reader';

const KEPT = 4;

/** The same bytes under another name are another workbook: a text table's sheet is called after its file. */
export interface NamedFile {
  sha256: string;
  fileName: string;
}

/**
 * What the upload reader made of each stored file, kept under the checksums of its bytes and its name, apart from the
 * store, whose sweep knows only files with a row. Preview, vetting and trace all look at one parsed result; a lost one
 * is made again.
 */
@Injectable()
export class ParsedWorkbooks {
  private readonly recent = new Map<string, RawWorkbook>();

  constructor(
    private readonly settings: Settings,
    private readonly files: FileStore,
  ) {}

  async store(file: NamedFile, workbook: RawWorkbook): Promise<void> {
    const target = this.place(file);
    await fs.mkdir(path.dirname(target), { recursive: true });
    const temporary = `${target}.${randomUUID()}.part`;
    await fs.writeFile(temporary, await promisify(gzip)(JSON.stringify(workbook), { level: 4 }));
    await fs.rename(temporary, target);
    this.remember(target, workbook);
  }

  async load(file: NamedFile): Promise<RawWorkbook> {
    const place = this.place(file);
    const known = this.recent.get(place);
    if (known) return known;
    const packed = await fs.readFile(place).catch((error: NodeJS.ErrnoException) => {
      if (error.code === 'ENOENT') return null;
      throw error;
    });
    if (!packed) return this.readAgain(file);
    const workbook = await unpacked(packed);
    this.remember(place, workbook);
    return workbook;
  }

  private async readAgain(file: NamedFile): Promise<RawWorkbook> {
    const workbook = await readUpload({ path: this.files.path(file.sha256), fileName: file.fileName });
    await this.store(file, workbook);
    return workbook;
  }

  private remember(place: string, workbook: RawWorkbook): void {
    this.recent.delete(place);
    this.recent.set(place, workbook);
    const oldest = this.recent.keys().next().value;
    if (this.recent.size > KEPT && oldest !== undefined) this.recent.delete(oldest);
  }

  private place({ sha256, fileName }: NamedFile): string {
    const name = createHash('sha256').update(fileName, 'utf8').digest('hex').slice(0, 16);
    return path.join(this.settings.dataDir, 'parsed', `${sha256}-${name}.json.gz`);
  }
}

async function unpacked(packed: Buffer): Promise<RawWorkbook> {
  return JSON.parse((await promisify(gunzip)(packed)).toString('utf8')) as RawWorkbook;
}
