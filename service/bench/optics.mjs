// One mode of coarse dust at 30 wavelengths; against plain C where a compiler is present, else that row says so.
import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { PRECISIONS, scatterMode, sizeGrid } from '@siltlight/common/optics/mode-scattering';
import { median, timed } from './measure.mjs';

const mode = { medianRadiusUm: 0.5, geometricStdDev: 2.2, minRadiusUm: 0.02, maxRadiusUm: 5 };
const index = { real: 1.53, imaginary: 0.003 };
const wavelengthsUm = Array.from({ length: 30 }, (_, i) => 0.3 * (4 / 0.3) ** (i / 29));
const SIZES = 200;
const ROUNDS = 7;

const spectrum = (points) =>
  wavelengthsUm.map((wavelengthUm) => scatterMode(mode, index, wavelengthUm, points));

async function msOf(points, rounds = ROUNDS) {
  spectrum(points);
  const times = [];
  for (let round = 0; round < rounds; round++) times.push((await timed(() => spectrum(points))).cpuMs);
  return median(times);
}

/** Over the same sizes: the range of the integral is the mode's at every wavelength here. */
function plainC(folder) {
  const program = path.join(folder, 'mie-plain');
  execFileSync('cc', ['-O2', '-o', program, path.join(import.meta.dirname, 'mie-plain.c'), '-lm'], {
    stdio: 'pipe',
  });
  const { low, high } = limits();
  const numbers = [SIZES, mode.medianRadiusUm, low, high, mode.geometricStdDev, index.real, index.imaginary];
  const run = () =>
    execFileSync(program, ['20', ...numbers.map(String), ...wavelengthsUm.map(String)], { encoding: 'utf8' })
      .trim()
      .split(' ')
      .map(Number);
  const runs = Array.from({ length: ROUNDS }, run);
  const [, scattering, extinction, forward] = runs[0];
  return { ms: median(runs.map(([ms]) => ms)), scattering, extinction, forward };
}

function limits() {
  const { sizeParameters } = sizeGrid(mode, wavelengthsUm[0], SIZES);
  const step = sizeParameters[1] / sizeParameters[0];
  const radius = (x) => (x * wavelengthsUm[0]) / (2 * Math.PI);
  return {
    low: radius(sizeParameters[0]) / Math.sqrt(step),
    high: radius(sizeParameters.at(-1)) * Math.sqrt(step),
  };
}

/** C ends its series at the published term, ours a little later: 1e-7 apart. */
function agree({ scattering, extinction, forward }) {
  const ours = spectrum(SIZES).reduce(
    (sum, { scatteringUm2, absorptionUm2, forwardUm2 }) => [
      sum[0] + scatteringUm2,
      sum[1] + scatteringUm2 + absorptionUm2,
      sum[2] + forwardUm2,
    ],
    [0, 0, 0],
  );
  [scattering, extinction, forward].forEach((value, i) => {
    if (Math.abs(value / ours[i] - 1) > 1e-6) throw new Error(`C gives ${value}, ours ${ours[i]}: no ratio.`);
  });
}

async function ratioRow() {
  const name = `${SIZES} sizes at 30 wavelengths against plain C`;
  const folder = mkdtempSync(path.join(os.tmpdir(), 'siltlight-bench-'));
  try {
    const c = plainC(folder);
    agree(c);
    const ms = await msOf(SIZES, 4 * ROUNDS);
    return `${name}: ${ms.toFixed(1)} ms against ${c.ms.toFixed(1)} ms CPU, ratio ${(ms / c.ms).toPrecision(3)} (wanted: 1.5 at most)`;
  } catch (error) {
    if (error.code !== 'ENOENT') throw error;
    return `${name}: skipped, there is no C compiler here`;
  } finally {
    rmSync(folder, { recursive: true });
  }
}

export async function opticsRows() {
  const [fast, full] = [await msOf(PRECISIONS.fast.points), await msOf(PRECISIONS.full.points)];
  return [
    `one mode at 30 wavelengths: ${fast.toFixed(0)} ms with the fast setting, ${full.toFixed(0)} ms with the full one`,
    await ratioRow(),
  ];
}
