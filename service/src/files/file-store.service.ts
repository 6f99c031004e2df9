import { randomUUID } from 'node:crypto';
import { createReadStream, type ReadStream } from 'node:fs';
import * as fs from 'node:fs/promises';
import * as path from 'node:path';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Settings } from '../config/settings';
import { WriteQueue } from '../database/write-queue';
import { notFound } from '../http/problem';
import { type Digest, digestOf, moveDurably } from './durable-file';
import { StoredFileRow } from './models/stored-file-row';

export interface FileLabel {
  fileName: string;
  mediaType: string;
}

const SHA256 = /^[0-9a-f]{64}$/;

/** Files by content: the same bytes are kept once, under a name of ours, outside anything that is served. */
@Injectable()
export class FileStore {
  constructor(
    @InjectModel(StoredFileRow) private readonly rows: typeof StoredFileRow,
    private readonly writes: WriteQueue,
    private readonly settings: Settings,
  ) {}

  /**
   * Takes a file over, or writes bytes; call it before the write that refers to it, never inside one.
   * A path must lie in `settings.temporaryDir`, on the same disk as the store; the file is moved away from it.
   */
  async put(source: string | Buffer, label: FileLabel): Promise<Digest> {
    const temporary = typeof source === 'string' ? source : await this.writeTemporary(source);
    const digest = await digestOf(temporary);
    if (await exists(this.path(digest.sha256))) await fs.rm(temporary);
    else await moveDurably(temporary, this.path(digest.sha256));
    await this.writes.run((transaction) =>
      this.rows.findOrCreate({
        where: { sha256: digest.sha256 },
        defaults: { ...digest, ...label },
        transaction,
      }),
    );
    return digest;
  }

  path(sha256: string): string {
    if (!SHA256.test(sha256)) throw notFound('File', sha256.slice(0, 64));
    return path.join(this.settings.filesDir, sha256.slice(0, 2), sha256);
  }

  /** `range` as in HTTP, both ends included. */
  async stream(sha256: string, range?: { start: number; end: number }): Promise<ReadStream> {
    if (!(await exists(this.path(sha256)))) throw notFound('File', sha256);
    return createReadStream(this.path(sha256), range);
  }

  async describe(sha256: string): Promise<Digest & FileLabel & { createdAt: string }> {
    const row = await this.rows.findByPk(sha256);
    if (!row) throw notFound('File', sha256.slice(0, 64));
    const { bytes, fileName, mediaType, createdAt } = row;
    return { sha256, bytes, fileName, mediaType, createdAt };
  }

  private async writeTemporary(bytes: Buffer): Promise<string> {
    const temporary = path.join(this.settings.temporaryDir, randomUUID());
    await fs.writeFile(temporary, bytes, { flag: 'wx', mode: 0o600 });
    return temporary;
  }
}

async function exists(file: string): Promise<boolean> {
  try {
    await fs.access(file);
    return true;
  } catch {
    return false; // access has no other way to say no
  }
}
