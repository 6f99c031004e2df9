import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable, numberIn, relativeError } from '../../test/check-table';
import { calculateUpscatter } from './calculate-upscatter';
import { gaussLegendre } from './gauss-legendre';
import {
  hgUpscatterCoefficients,
  upscatterAt,
  upscatterMean,
  upscatterMeanLinear,
  upscatterOrder,
} from './upscatter';

const anyAsymmetry = fc.double({ min: -0.95, max: 0.95, noNaN: true });

// 40-digit series, 12 decimals printed.
test('the upscatter fraction at a sun angle equals the 40-digit series', () => {
  for (const row of checkTable('optics/upscatter_mu0.csv')) {
    const beta = upscatterAt(numberIn(row, 'g'), numberIn(row, 'mu0'));
    expect(Math.abs(beta - numberIn(row, 'beta_mu0')), `g ${row.g}, μ₀ ${row.mu0}`).toBeLessThan(1e-12);
  }
});

test('the hemispheric mean equals the closed form of an independent program, the linear one its own', () => {
  for (const row of checkTable('optics/upscatter_mean.csv')) {
    const g = numberIn(row, 'g');
    expect(Math.abs(upscatterMean(g) - numberIn(row, 'beta_mean_isotropic')), row.g).toBeLessThan(1e-12);
    expect(Math.abs(upscatterMeanLinear(g) - numberIn(row, 'half_1_minus_7g_over_8')), row.g).toBeLessThan(
      1e-8,
    );
    expect(Math.abs(upscatterAt(g, 1) - numberIn(row, 'hemispheric_backscatter_b')), row.g).toBeLessThan(
      1e-12,
    );
  }
});

test('the mean over sun angles is the hemispheric mean, and the flux-weighted one is (1 − g)/2', () => {
  const rule = gaussLegendre(120);
  fc.assert(
    fc.property(fc.double({ min: -0.8, max: 0.8, noNaN: true }), (g) => {
      let mean = 0;
      let weighted = 0;
      rule.nodes.forEach((node, i) => {
        const mu = (1 + node) / 2;
        const beta = upscatterAt(g, mu);
        mean += (rule.weights[i]! / 2) * beta;
        weighted += rule.weights[i]! * mu * beta;
      });
      expect(Math.abs(mean - upscatterMean(g))).toBeLessThan(1e-10);
      expect(Math.abs(weighted - (1 - g) / 2)).toBeLessThan(1e-10);
    }),
  );
});

test('upscatter lies between 0 and 1, is one half on the horizon, and turns over with the sign of g', () => {
  fc.assert(
    fc.property(anyAsymmetry, fc.double({ min: 0, max: 1, noNaN: true }), (g, mu) => {
      const beta = upscatterAt(g, mu);
      expect(beta).toBeGreaterThanOrEqual(0);
      expect(beta).toBeLessThanOrEqual(1);
      expect(Math.abs(beta + upscatterAt(-g, mu) - 1)).toBeLessThan(1e-13);
      expect(upscatterAt(g, 0)).toBe(0.5);
    }),
  );
});

test('series and closed form of the mean meet without a step, and the far end stays in range', () => {
  const step = upscatterMean(0.05) - upscatterMean(0.05 - 1e-9);
  expect(step).toBeLessThan(0);
  expect(step).toBeGreaterThan(-1e-9);
  expect(upscatterMean(0.999)).toBeGreaterThan(0);
  expect(upscatterAt(0.999, 0.5)).toBeGreaterThan(0);
  expect(upscatterAt(0.999, 0.5)).toBeLessThan(0.001);
});

test('the coefficients of odd Legendre polynomials give the fraction at any sun angle', () => {
  const g = 0.7;
  const order = upscatterOrder(g);
  const coefficients = hgUpscatterCoefficients(g, order);
  expect(coefficients).toHaveLength((order + 1) / 2);
  const mu = 0.37;
  let [lower, upper, sum] = [1, mu, 0];
  for (let n = 1; n <= order; n += 1) {
    if (n % 2 === 1) sum += coefficients[(n - 1) / 2]! * upper;
    [lower, upper] = [upper, ((2 * n + 1) * mu * upper - n * lower) / (n + 1)];
  }
  expect(Math.abs(0.5 - 0.5 * sum - upscatterAt(g, mu))).toBeLessThan(1e-14);
});

test('Gauss–Legendre weights equal independent ones', () => {
  for (const row of checkTable('general/gaussian_grid_rows.csv')) {
    const points = numberIn(row, 'latitudes');
    const { nodes, weights } = gaussLegendre(points);
    const i = points - numberIn(row, 'row_from_north');
    expect(Math.abs((Math.asin(nodes[i]!) * 180) / Math.PI - numberIn(row, 'latitude_deg'))).toBeLessThan(
      1e-9,
    );
    expect(relativeError(weights[i]!, numberIn(row, 'gauss_weight'))).toBeLessThan(1e-11);
  }
});

test('the calculator answers the mean without a sun angle and refuses the linear form with one', () => {
  expect(calculateUpscatter({ asymmetry: 0.7 }).upscatterFraction).toBe(upscatterMean(0.7));
  expect(calculateUpscatter({ asymmetry: 0.7, cosSolarZenith: 0.5 }).upscatterFraction).toBe(
    upscatterAt(0.7, 0.5),
  );
  const linear = calculateUpscatter({ asymmetry: 0.7, approximation: 'linear' });
  expect(linear.upscatterFraction).toBeCloseTo(0.19375, 12);
  expect(linear.cautions.map((caution) => caution.code)).toEqual(['linear-upscatter']);
  expect(() => calculateUpscatter({ asymmetry: 0.7, cosSolarZenith: 0.5, approximation: 'linear' })).toThrow(
    /cosSolarZenith is 0.5; it must be left out with the linear approximation/,
  );
  expect(() => calculateUpscatter({ asymmetry: 1.2 })).toThrow(/asymmetry is 1.2; it must lie within/);
  expect(() => calculateUpscatter({} as { asymmetry: number })).toThrow(/asymmetry is missing/);
  expect(() => calculateUpscatter({ asymmetry: 0.5, mu0: 1 } as { asymmetry: number })).toThrow(
    /mu0 is 1; it must be left out/,
  );
});
