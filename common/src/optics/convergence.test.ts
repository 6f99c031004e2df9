import { expect, test } from 'vitest';
import type { CsvRow } from '../../../reference/read';
import { checkTable, numberIn } from '../../test/check-table';
import type { RefractiveIndex } from './mie';
import { scatterMode, type ModeScattering } from './mode-scattering';

// The rows of our own rule: midpoints, 4.5 ln σ out; its upper end follows 3L² in the shortwave and r⁶ in the longwave.
const SHORT = 'midpoint in ln r on [r_g exp(2L^2-4.5L), r_g exp(3L^2+4.5L)]';
const LONG = 'midpoint in ln r on [r_g exp(2L^2-4.5L), r_g exp(6L^2+4.5L)]';

interface Case {
  sigma: number;
  radius: number;
  index: RefractiveIndex;
  wavelengthUm: number;
}

const WIDE = [1.6, 1.9, 2.2];
const cases = (indices: RefractiveIndex[], sigmas: number[], wavelengthUm: number): Case[] =>
  indices.flatMap((index) => sigmas.map((sigma) => ({ sigma, radius: 0.5, index, wavelengthUm })));
const ABSORBING = [0.0015, 0.008].map((imaginary) => ({ real: 1.53, imaginary }));

const GROUPS: [subject: string, rule: string, cases: Case[]][] = [
  [
    'size integral: shortwave, absorbing dust (k 0.0015-0.008), sigma_g 1.6-2.2',
    SHORT,
    cases(ABSORBING, WIDE, 0.55),
  ],
  ['size integral: shortwave, absorbing dust, narrow sigma_g 1.2', SHORT, cases(ABSORBING, [1.2], 0.55)],
  [
    'size integral: shortwave, non-absorbing, sigma_g 1.6-2.2',
    SHORT,
    cases([{ real: 1.53, imaginary: 0 }], WIDE, 0.55),
  ],
  [
    'size integral: longwave 10 um m=2.57-0.5i, sigma_g 1.6-2.2',
    LONG,
    cases([{ real: 2.57, imaginary: 0.5 }], WIDE, 10),
  ],
];

const scatter = ({ sigma, radius, index, wavelengthUm }: Case, points: number): ModeScattering =>
  scatterMode(
    { medianRadiusUm: radius, geometricStdDev: sigma, minRadiusUm: 0.005, maxRadiusUm: 40 },
    index,
    wavelengthUm,
    points,
  );

/** Largest relative error of extinction, ω and g. */
function errorOf(close: ModeScattering, exact: ModeScattering): number {
  const [a, b] = [close, exact].map((part) => part.scatteringUm2 + part.absorptionUm2) as [number, number];
  const pairs = [
    [a, b],
    [close.scatteringUm2 / a, exact.scatteringUm2 / b],
    [close.forwardUm2 / close.scatteringUm2, exact.forwardUm2 / exact.scatteringUm2],
  ] as const;
  return Math.max(...pairs.map(([value, expected]) => Math.abs(value / expected - 1)));
}

// The table's modes are not ours one by one, so its worst case is met within a factor of 4 and a floor of 1e-5, where
// the reference sums themselves differ.
test.each(GROUPS)('%s converges as fast as the table measured', (subject, rule, modes) => {
  const rows = checkTable('optics/convergence.csv').filter(
    (row: CsvRow) => row.subject === subject && row.rule!.startsWith(rule),
  );
  expect(rows.length).toBeGreaterThan(3);
  const exact = modes.map((mode) => scatter(mode, 12_800));
  for (const row of rows) {
    const worst = Math.max(
      ...modes.map((mode, i) => errorOf(scatter(mode, numberIn(row, 'points')), exact[i]!)),
    );
    expect(worst, `${row.points} points`).toBeLessThan(4 * numberIn(row, 'max_error') + 1e-5);
  }
});
