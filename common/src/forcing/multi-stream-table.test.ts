import fc from 'fast-check';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import { readCsv } from '../../../reference/read';
import { numberIn } from '../../test/check-table';
import { measureTable } from '../../test/measure-multi-stream-table';
import { upscatterAt, upscatterMean } from '../optics/upscatter';
import { addingDoubling } from './adding-doubling-scheme';
import { buildMultiStreamTable } from './build-multi-stream-table';
import { firstOrderBracket } from './first-order-layer';
import { albedoChange, overSurface } from './lambertian-surface';
import { tabulatedMultiStream, type MultiStreamTable } from './multi-stream-table';

const file = path.join(__dirname, '..', '..', '..', 'reference', 'forcing', 'multi_stream.json');
const text = readFileSync(file, 'utf8');
const table = JSON.parse(text) as MultiStreamTable;
const scheme = tabulatedMultiStream(table);

// The bound of the method; what was measured with more points stands in reference/forcing/multi_stream_errors.csv.
test('the table is within 0.2 % of direct computation above τ 0.003 and within 1e-6 of the sunlight below', () => {
  const written = readCsv('forcing/multi_stream_errors.csv');
  expect(written.length).toBe(10);
  for (const row of written) {
    if (numberIn(row, 'tau_from') >= 3e-3) expect(numberIn(row, 'max_error_percent')).toBeLessThan(0.2);
    else expect(numberIn(row, 'max_abs_error_reflected')).toBeLessThan(1e-6);
  }
  for (const { opticalDepthFrom, maxPercent, maxError } of measureTable(scheme, 4)) {
    if (opticalDepthFrom >= 3e-3) expect(maxPercent).toBeLessThan(0.2);
    else expect(maxError).toBeLessThan(1e-6);
  }
  expect(Buffer.byteLength(text)).toBeLessThan(10e6);
});

test('the table kept is the one its maker makes', () => {
  // The first of its asymmetries, which takes the fewest streams.
  const axes = { ...table.axes, asymmetry: { from: 0.4, to: 0.5, points: 2 } };
  const made = buildMultiStreamTable(axes);
  const perAsymmetry = made.reflectance.length / 2;
  for (let i = 0; i < perAsymmetry; i += 1) {
    expect(Math.abs(made.reflectance[i]! / table.reflectance[i]! - 1)).toBeLessThan(2e-7);
    // At τ 1e-4 and ω 1 − 1e-6 rounding shows in the seventh digit of what is absorbed.
    expect(Math.abs(made.absorptance[i]! / table.absorptance[i]! - 1)).toBeLessThan(1e-4);
  }
});

test('energy is kept, every share lies within 0 to 1, and a thin layer has the first-order slope, by table', () => {
  fc.assert(
    fc.property(
      fc.double({ min: Math.log(1e-4), max: Math.log(6), noNaN: true }),
      fc.double({ min: 0.6, max: 1, noNaN: true }),
      fc.double({ min: 0.4, max: 0.9, noNaN: true }),
      fc.double({ min: 0.001, max: 1, noNaN: true }),
      fc.double({ min: 0, max: 1, noNaN: true }),
      (logDepth, omega, g, mu, surface) => {
        const depth = Math.exp(logDepth);
        const solve = scheme.prepare(g, Float64Array.of(mu));
        const { reflectances, transmittances, diffuse } = solve(depth, omega);
        const beam = { reflectance: reflectances[0]!, transmittance: transmittances[0]! };
        for (const light of [beam, diffuse]) {
          const over = overSurface(light, diffuse, surface);
          const toGround = (1 - surface) * over.transmittance;
          for (const part of [over.reflectance, toGround, over.absorptance]) {
            expect(part).toBeGreaterThan(-1e-9);
            expect(part).toBeLessThan(1 + 1e-9);
          }
        }
        const thin = solve(1e-4, omega);
        const change = albedoChange(thin.reflectances[0]!, thin.transmittances[0]!, thin.diffuse, surface);
        const bracket = firstOrderBracket(omega, surface, upscatterAt(g, mu), upscatterMean(g), mu);
        // The second order is about τ/μ₀ of the first, and diffuse light near the horizon adds τ ln τ.
        expect(Math.abs((mu * change) / 1e-4 - bracket)).toBeLessThan(2e-3 + 1e-4 / mu);
      },
    ),
    { numRuns: 10_000 },
  );
});

test('outside the table the answer is the direct one', () => {
  const suns = Float64Array.of(0.5);
  for (const [tau, omega, g] of [
    [20, 0.9, 0.7],
    [0.1, 0.3, 0.7],
    [0.1, 0.9, 0.1],
    [0, 0.9, 0.7],
  ] as const) {
    const direct = addingDoubling.prepare(g, suns)(tau, omega);
    const answer = scheme.prepare(g, suns)(tau, omega);
    expect(answer.reflectances[0]).toBe(direct.reflectances[0]);
    expect(answer.diffuse).toEqual(direct.diffuse);
  }
});
