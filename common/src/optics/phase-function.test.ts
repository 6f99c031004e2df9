import { expect, test } from 'vitest';
import { checkTable, numberIn, relativeError } from '../../test/check-table';
import { mie } from './mie';
import { mieAmplitudes } from './mie-amplitudes';
import { modeOptics, type OpticalMode } from './mode-optics';
import {
  backscatterFraction,
  legendreMoments,
  phaseAt,
  phaseFunction,
  upscatterMeanOf,
  upscatterOf,
} from './phase-function';
import { gaussLegendre } from './gauss-legendre';

const rows = checkTable('optics/upscatter_mie.csv');
const modes = rows.map((row): OpticalMode => ({
  medianRadiusUm: numberIn(row, 'median_radius_um'),
  geometricStdDev: numberIn(row, 'sigma_g'),
  minRadiusUm: numberIn(row, 'rmin_um'),
  maxRadiusUm: numberIn(row, 'rmax_um'),
  numberFraction: 1,
  densityGCm3: 1,
  refractiveIndex: { real: numberIn(row, 'n'), imaginary: numberIn(row, 'k') },
}));
const phases = modes.map((mode) => phaseFunction([mode], 0.55));

// The table is good to about 3e-4 (1200 angles, 3200 radii) and prints five digits.
test('the upscatter fraction of the Mie phase function follows the table', () => {
  rows.forEach((row, i) => {
    const label = `${row.mode}, k ${row.k}`;
    expect(
      relativeError(upscatterMeanOf(phases[i]!), numberIn(row, 'beta_mean_from_mie_phase_function')),
      label,
    ).toBeLessThan(4e-4);
    expect(
      relativeError(backscatterFraction(phases[i]!), numberIn(row, 'backscatter_hemisphere_b_mie')),
      label,
    ).toBeLessThan(1e-3);
    expect(Math.abs(legendreMoments(phases[i]!, 1)[1]! - numberIn(row, 'g')), label).toBeLessThan(1e-4);
    expect(phases[i]!.cautions).toEqual([]);
  });
});

test('moments of the phase function agree with the sums over coefficients', () => {
  modes.forEach((mode, i) => {
    const moments = legendreMoments(phases[i]!, 8);
    expect(moments[0]).toBeCloseTo(1, 8);
    // Both from 1600 points or more of the same integral; 1e-4 is its stated error.
    expect(relativeError(moments[1]!, modeOptics([mode], 0.55).asymmetry)).toBeLessThan(1e-4);
  });
});

test('the mean over sun angles of the upscatter fraction is the hemispheric mean', () => {
  const { nodes, weights } = gaussLegendre(32);
  for (const phase of phases) {
    const mean = nodes.reduce(
      (sum, node, i) => sum + (weights[i]! / 2) * upscatterOf(phase, (node + 1) / 2),
      0,
    );
    expect(relativeError(mean, upscatterMeanOf(phase))).toBeLessThan(2e-3); // kinks between the Gauss angles
    expect(upscatterOf(phase, 0)).toBeCloseTo(0.5, 6);
    expect(upscatterOf(phase, 1)).toBeCloseTo(backscatterFraction(phase), 10);
  }
});

test('the amplitudes give extinction by the optical theorem and the backscatter at 180°', () => {
  for (const [x, real, imaginary] of [
    [0.5, 1.53, 0.008],
    [5.213, 1.55, 0],
    [50, 5, 0.4],
  ] as const) {
    const sphere = mie(x, { real, imaginary });
    const ahead = mieAmplitudes(x, { real, imaginary }, 1);
    expect(relativeError((4 / x ** 2) * ahead.s1.re, sphere.qExt)).toBeLessThan(1e-11);
    expect(ahead.s1).toEqual({ re: expect.closeTo(ahead.s2.re, 9), im: expect.closeTo(ahead.s2.im, 9) });
    const back = mieAmplitudes(x, { real, imaginary }, -1);
    expect(relativeError((4 / x ** 2) * (back.s1.re ** 2 + back.s1.im ** 2), sphere.qBack)).toBeLessThan(
      1e-9,
    );
  }
});

test('tiny spheres scatter as Rayleigh, ¾(1 + cos²θ)', () => {
  const tiny = {
    ...modes[0]!,
    medianRadiusUm: 0.001,
    geometricStdDev: 1.2,
    minRadiusUm: 1e-4,
    maxRadiusUm: 0.01,
  };
  const cosines = Float64Array.from([0, 0.5, 1]);
  const { forward, backward } = phaseAt([tiny], 0.55, cosines, 100);
  cosines.forEach((mu, i) => {
    expect(forward[i]).toBeCloseTo(0.75 * (1 + mu * mu), 2);
    expect(backward[i]).toBeCloseTo(0.75 * (1 + mu * mu), 2);
  });
});

test('too few angles for the forward peak are cautioned, and nothing to scatter is refused', () => {
  const coarse = { ...modes[1]!, medianRadiusUm: 5 };
  expect(phaseFunction([coarse], 0.55, { angles: 20, sizePoints: 50 }).cautions.map((c) => c.code)).toEqual([
    'forward-peak-unresolved',
  ]);
  expect(() => phaseFunction([{ ...coarse, refractiveIndex: { real: 1, imaginary: 0 } }], 0.55)).toThrow(
    'nothing scatters',
  );
  expect(() => phaseFunction([coarse], 0.55, { angles: 2 })).toThrow('angles is 2');
});
