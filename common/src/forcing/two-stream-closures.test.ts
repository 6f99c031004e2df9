import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable, numberIn } from '../../test/check-table';
import { upscatterAt } from '../optics/upscatter';
import { coakleyChylek, coakleyChylekLayer } from './coakley-chylek';
import { albedoChange } from './lambertian-surface';
import { twoStreamScheme } from './two-stream-scheme';
import { CLOSURE_IDS, twoStreamLayer, type ClosureId } from './two-stream-closures';

const share = fc.double({ min: 0, max: 1, noNaN: true });

/** Names of the closures as the table writes them. */
const COLUMNS: [ClosureId, string][] = CLOSURE_IDS.map((id) => [id, id.replaceAll('-', '_')]);

// Matrix exponential of the same equations, 8 decimals printed; ω = 1 is approached to 1e-9, good to 2e-8.
test('every closure equals the matrix exponential of its equations over the whole table', () => {
  for (const row of checkTable('optics/rt_twostream.csv')) {
    const [tau, omega, g, mu] = ['tau', 'omega', 'g', 'mu0'].map((column) => numberIn(row, column)) as [
      number,
      number,
      number,
      number,
    ];
    const label = JSON.stringify(row);
    for (const [closure, column] of COLUMNS) {
      const { reflectance, transmittance } = twoStreamLayer(closure, tau, omega, g, mu);
      expect(Math.abs(reflectance - numberIn(row, `R_${column}`)), `${column} ${label}`).toBeLessThan(3e-8);
      expect(Math.abs(transmittance - numberIn(row, `T_${column}`)), `${column} ${label}`).toBeLessThan(3e-8);
    }
    const slanted = coakleyChylekLayer(tau, omega, upscatterAt(g, mu), mu);
    expect(Math.abs(slanted.reflectance - numberIn(row, 'R_coakley_chylek_1')), label).toBeLessThan(2e-8);
    expect(Math.abs(slanted.transmittance - numberIn(row, 'T_coakley_chylek_1')), label).toBeLessThan(2e-8);
  }
});

// Four digits printed; the table's mean has 32 points too.
test('the mean albedo change by delta-Eddington is the tabulated one', () => {
  const scheme = twoStreamScheme('delta-eddington');
  for (const row of checkTable('optics/error_mean_case.csv')) {
    const solve = scheme.prepare(numberIn(row, 'g'), new Float64Array());
    const { diffuse } = solve(numberIn(row, 'tau'), numberIn(row, 'omega'));
    const change = albedoChange(
      diffuse.reflectance,
      diffuse.transmittance,
      diffuse,
      numberIn(row, 'surface_albedo'),
    );
    const expected = numberIn(row, 'delta_eddington_delta_albedo');
    expect(Math.abs(change - expected), JSON.stringify(row)).toBeLessThan(6e-5 * Math.abs(expected) + 5e-8);
  }
});

test('neither thick layers, conservative ones nor resonant sun angles make a closure overflow or jump', () => {
  for (const closure of CLOSURE_IDS) {
    expect(twoStreamLayer(closure, 1e6, 0.9, 0.7, 0.5).transmittance).toBeCloseTo(0, 12);
    const white = twoStreamLayer(closure, 10, 1, 0.7, 0.5);
    expect(white.reflectance + white.transmittance).toBeCloseTo(1, 6);
  }
  // k μ₀ = 1 for Eddington at ω 0, g 0: k = √3.
  const at = (mu: number) => twoStreamLayer('eddington', 1, 0.05, 0.2, mu).reflectance;
  for (let mu = 0.5; mu < 0.7; mu += 1e-4) expect(Math.abs(at(mu + 1e-4) - at(mu))).toBeLessThan(1e-5);
});

test('the slanted layer keeps its energy, and each part of it lies within 0 to 1', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0, max: 100, noNaN: true }),
      share,
      fc.double({ min: -0.98, max: 0.98, noNaN: true }),
      fc.double({ min: 1e-4, max: 1, noNaN: true }),
      (tau, omega, g, mu) => {
        const { reflectance, transmittance } = coakleyChylekLayer(tau, omega, upscatterAt(g, mu), mu);
        expect(Math.min(reflectance, transmittance)).toBeGreaterThanOrEqual(0);
        expect(reflectance + transmittance).toBeLessThanOrEqual(1 + 1e-12);
      },
    ),
    { numRuns: 10_000 },
  );
  for (const tau of [0.01, 1, 30]) {
    const { diffuse } = coakleyChylek.prepare(0.7, new Float64Array())(tau, 1);
    expect(diffuse.reflectance + diffuse.transmittance).toBeCloseTo(1, 12);
  }
});
