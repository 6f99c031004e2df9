import * as fs from 'node:fs/promises';
import { seededDir } from './seeded-data';

/** After the last test file. */
export default async function removeSeededData(): Promise<void> {
  await fs.rm(seededDir(), { recursive: true, force: true });
}
