import type { Dirent } from 'node:fs';
import * as fs from 'node:fs/promises';
import * as path from 'node:path';
import { Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import { Interval } from '@nestjs/schedule';
import { InjectModel } from '@nestjs/sequelize';
import { Settings } from '../config/settings';
import { StoredFileRow } from './models/stored-file-row';

const EVERY_MS = 60 * 60 * 1000;
/** Younger files may belong to an upload or a store under way. */
const ABANDONED_AFTER_MS = 60 * 60 * 1000;

export interface SweepReport {
  temporaryRemoved: number;
  withoutRowRemoved: number;
  /** rows whose file is gone: told, never mended in silence */
  withoutFile: string[];
}

/** Clears what broken-off uploads and kills between file and row have left. */
@Injectable()
export class FileSweep implements OnApplicationBootstrap {
  constructor(
    @InjectModel(StoredFileRow) private readonly rows: typeof StoredFileRow,
    private readonly settings: Settings,
  ) {}

  async onApplicationBootstrap(): Promise<void> {
    await this.sweep();
  }

  @Interval(EVERY_MS)
  async sweep(now = Date.now()): Promise<SweepReport> {
    const temporaryRemoved = await removeAbandoned(await filesUnder(this.settings.temporaryDir), now);
    const stored = await filesUnder(this.settings.filesDir);
    const names = new Set(stored.map((file) => path.basename(file)));
    const known = new Set((await this.rows.findAll({ attributes: ['sha256'] })).map(({ sha256 }) => sha256));
    const strays = stored.filter((file) => !known.has(path.basename(file)));
    const report: SweepReport = {
      temporaryRemoved,
      withoutRowRemoved: await removeAbandoned(strays, now),
      withoutFile: [...known].filter((sha256) => !names.has(sha256)),
    };
    const level = report.withoutFile.length > 0 ? 'error' : 'info';
    this.settings.log({ event: 'file-sweep', level, ...report });
    return report;
  }
}

async function filesUnder(folder: string): Promise<string[]> {
  const entries: Dirent[] = await fs.readdir(folder, { recursive: true, withFileTypes: true });
  return entries.filter((entry) => entry.isFile()).map((entry) => path.join(entry.parentPath, entry.name));
}

async function removeAbandoned(files: string[], now: number): Promise<number> {
  let removed = 0;
  for (const file of files) {
    const { mtimeMs } = await fs.stat(file);
    if (now - mtimeMs < ABANDONED_AFTER_MS) continue;
    await fs.rm(file, { force: true });
    removed += 1;
  }
  return removed;
}
