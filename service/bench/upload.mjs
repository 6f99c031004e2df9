// How long the server's own loop is held up while a large file is read apart from it.
import { createRequire } from 'node:module';
import fs from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { monitorEventLoopDelay } from 'node:perf_hooks';
import { timed } from './measure.mjs';

const { readUpload } = createRequire(import.meta.url)('../dist/workers/upload-reader.js');
const ROWS = 100_000;

export async function uploadRows() {
  const folder = await fs.mkdtemp(path.join(os.tmpdir(), 'siltlight-bench-'));
  const file = path.join(folder, 'large.csv');
  const lines = Array.from(
    { length: ROWS },
    (_, i) => `Core ${i % 50},-75.1,123.35,${i / 1000},${1 + (i % 7)},0.1,bulk`,
  );
  await fs.writeFile(file, `site,lat,lon,age ka BP,flux,error,cut-off\n${lines.join('\n')}\n`);
  const delay = monitorEventLoopDelay({ resolution: 5 });
  delay.enable();
  const { result, wallMs, cpuMs } = await timed(() => readUpload({ path: file, fileName: 'large.csv' }));
  delay.disable();
  await fs.rm(folder, { recursive: true });
  const rows = result.sheets[0].rows.length;
  if (rows !== ROWS + 1) throw new Error(`${rows} rows were read of ${ROWS + 1}: nothing was timed.`);
  const ms = (nanoseconds) => (nanoseconds / 1e6).toFixed(0);
  return [
    `${ROWS.toLocaleString('en-GB')} rows of CSV: ${wallMs.toFixed(0)} ms on the clock, ${cpuMs.toFixed(0)} ms CPU in the server; ` +
      `its loop was held up ${ms(delay.percentile(99))} ms at the 99th percentile, ${ms(delay.max)} ms at most`,
  ];
}
