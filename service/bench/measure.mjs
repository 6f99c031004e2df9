// Interleaved rounds after a warm-up; medians and their ratio, never a verdict on bare times.
export const median = (values) => [...values].sort((a, b) => a - b)[Math.floor(values.length / 2)];

export async function timed(work) {
  const before = process.cpuUsage();
  const start = performance.now();
  const result = await work();
  const cpu = process.cpuUsage(before);
  return { result, wallMs: performance.now() - start, cpuMs: (cpu.user + cpu.system) / 1000 };
}

/** @returns {Promise<{name: string, a: number, b: number, ratio: number, spread: number, settled: boolean}>} */
export async function compare(name, a, b, rounds = 5) {
  await a();
  await b();
  const [as, bs] = [[], []];
  for (let round = 0; round < rounds; round++) {
    as.push((await timed(a)).cpuMs);
    bs.push((await timed(b)).cpuMs);
  }
  const ratios = as.map((value, i) => value / bs[i]);
  const spread = (Math.max(...ratios) - Math.min(...ratios)) / median(ratios);
  return { name, a: median(as), b: median(bs), ratio: median(ratios), spread, settled: spread <= 0.4 };
}

export const row = ({ name, a, b, ratio, settled }) =>
  `${name}: ${a.toFixed(0)} ms against ${b.toFixed(0)} ms CPU, ratio ${ratio.toPrecision(3)}${settled ? '' : ' (unsettled)'}`;
