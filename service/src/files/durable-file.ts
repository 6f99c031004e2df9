import { createHash } from 'node:crypto';
import * as fs from 'node:fs/promises';
import * as path from 'node:path';

export interface Digest {
  sha256: string;
  bytes: number;
}

export async function digestOf(file: string): Promise<Digest> {
  const hash = createHash('sha256');
  let bytes = 0;
  const handle = await fs.open(file, 'r');
  for await (const chunk of handle.createReadStream() as AsyncIterable<Buffer>) {
    hash.update(chunk);
    bytes += chunk.length;
  }
  return { sha256: hash.digest('hex'), bytes };
}

/** Data first, then the name, then the folder that holds the name: in this order a power cut leaves no half file. */
export async function moveDurably(from: string, to: string): Promise<void> {
  await syncPath(from);
  await fs.mkdir(path.dirname(to), { recursive: true });
  await fs.rename(from, to);
  await syncPath(path.dirname(to));
}

async function syncPath(target: string): Promise<void> {
  const handle = await fs.open(target, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}
