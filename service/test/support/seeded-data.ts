import * as fs from 'node:fs/promises';
import * as os from 'node:os';
import * as path from 'node:path';

/** One folder for each run of the test runner: jest.config.js names the run, and its worker processes inherit the name. */
export const seededDir = (): string =>
  path.join(os.tmpdir(), `siltlight-seeded-${process.env['SILTLIGHT_TEST_RUN'] ?? process.pid}`);

const WAIT_MS = 100;
const PATIENCE_MS = 240_000;

/**
 * Fills a data folder with the invented scenario. Whoever comes first lets `seed` make it; everybody copies it, since
 * making it takes ten seconds of computing.
 */
export async function copySeededData(dataDir: string, seed: (into: string) => Promise<void>): Promise<void> {
  const dir = seededDir();
  await fs.mkdir(dir, { recursive: true });
  const [made, ready] = [path.join(dir, 'data'), path.join(dir, 'ready')];
  if (await isFirst(dir)) {
    await seed(made);
    await fs.writeFile(ready, '');
  }
  await appeared(ready);
  await fs.cp(made, dataDir, { recursive: true });
}

async function isFirst(dir: string): Promise<boolean> {
  try {
    await fs.mkdir(path.join(dir, 'claimed'));
    return true;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'EEXIST') return false;
    throw error;
  }
}

async function appeared(file: string): Promise<void> {
  const until = performance.now() + PATIENCE_MS;
  while (performance.now() < until) {
    const found = await fs.stat(file).catch(() => null);
    if (found) return;
    await new Promise((later) => setTimeout(later, WAIT_MS));
  }
  throw new Error('The invented scenario was not made in time; look at the test that began to make it.');
}
