import { writeSync } from 'node:fs';
import { workerData } from 'node:worker_threads';

export interface Watched {
  residentBytes: number;
  cpuSeconds: number;
  wallSeconds: number;
}

/**
 * A second thread of the reading process. A parser that is busy hears nothing from its parent, so this thread
 * ends the process when the parent is gone, and where /proc is missing it alone can see the memory grow.
 */
const { residentBytes, cpuSeconds, wallSeconds } = workerData as Watched;
const parent = process.ppid;
const started = performance.now();

function cpuSecondsUsed(): number {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1e6;
}

function end(reason: string): void {
  writeSync(2, `${reason}\n`);
  process.kill(process.pid, 'SIGKILL');
}

setInterval(() => {
  if (process.ppid !== parent) end('parent-gone');
  else if (process.memoryUsage.rss() > residentBytes) end('too-much-memory');
  else if (cpuSecondsUsed() > cpuSeconds) end('too-much-cpu');
  // The parent's own clock comes first; this one is for a parent that is stopped.
  else if (performance.now() - started > (wallSeconds + 5) * 1000) end('took-too-long');
}, 100);
