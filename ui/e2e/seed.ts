import { cpSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { TestProject } from 'vitest/node';
import { startProduct } from './product';

declare module 'vitest' {
  interface ProvidedContext {
    seededDir: string;
  }
}

/** The invented scenario is played once; every walk begins with a copy of its data folder. */
export default async function seed(project: TestProject) {
  const seededDir = mkdtempSync(path.join(tmpdir(), 'siltlight-seeded-'));
  const product = await startProduct();
  await product.stop((dataDir) => cpSync(dataDir, seededDir, { recursive: true }));
  project.provide('seededDir', seededDir);
  return () => rmSync(seededDir, { recursive: true, force: true });
}
