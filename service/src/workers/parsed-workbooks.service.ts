import { randomUUID } from 'node:crypto';
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

/**
 * What the upload reader made of each stored file, kept under the file's own checksum but apart from the store, whose
 * sweep knows only files with a row. Preview, vetting and trace all look at one parsed result; a lost one is made again.
 */
@Injectable()
export class ParsedWorkbooks {
  private readonly recent = new Map<string, RawWorkbook>();

  constructor(
    private readonly settings: Settings,
    private readonly files: FileStore,
  ) {}

  async store(sha256: string, workbook: RawWorkbook): Promise<void> {
    const target = this.place(sha256);
    await fs.mkdir(path.dirname(target), { recursive: true });
    const temporary = `${target}.${randomUUID()}.part`;
    await fs.writeFile(temporary, await promisify(gzip)(JSON.stringify(workbook), { level: 4 }));
    await fs.rename(temporary, target);
    this.remember(sha256, workbook);
  }

  async load(sha256: string): Promise<RawWorkbook> {
    const known = this.recent.get(sha256);
    if (known) return known;
    const packed = await fs.readFile(this.place(sha256)).catch((error: NodeJS.ErrnoException) => {
      if (error.code === 'ENOENT') return null;
      throw error;
    });
    const workbook = packed ? await unpacked(packed) : await this.readAgain(sha256);
    this.remember(sha256, workbook);
    return workbook;
  }

  private async readAgain(sha256: string): Promise<RawWorkbook> {
    const { fileName } = await this.files.describe(sha256);
    const workbook = await readUpload({ path: this.files.path(sha256), fileName });
    await this.store(sha256, workbook);
    return workbook;
  }

  private remember(sha256: string, workbook: RawWorkbook): void {
    this.recent.delete(sha256);
    this.recent.set(sha256, workbook);
    const oldest = this.recent.keys().next().value;
    if (this.recent.size > KEPT && oldest !== undefined) this.recent.delete(oldest);
  }

  private place(sha256: string): string {
    return path.join(this.settings.dataDir, 'parsed', `${sha256}.json.gz`);
  }
}

async function unpacked(packed: Buffer): Promise<RawWorkbook> {
  return JSON.parse((await promisify(gunzip)(packed)).toString('utf8')) as RawWorkbook;
}
