import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable, numberIn, relativeError } from '../../test/check-table';
import { upscatterMean } from '../optics/upscatter';
import { burdenOfDeposition } from './column';
import { criticalSingleScatteringAlbedo, criticalSurfaceAlbedo } from './critical-albedo';
import { thinLayer, thinLayerForcing } from './thin-layer';

const share = fc.double({ min: 0, max: 1, noNaN: true });
const base = { transmittance: 0.76, cloudFraction: 0.6, surfaceAlbedo: 0.1, opticalDepth: 0.05 };
const dust = { ...base, singleScatteringAlbedo: 0.9, upscatterFraction: 0.2 };
const codes = (input: Parameters<typeof thinLayer.evaluate>[0]) =>
  thinLayer.evaluate(input).cautions.map((caution) => caution.code);

// Independent evaluation of the formula, 10 digits printed (β̄ too).
test('the half-day form equals independent values over the whole grid', () => {
  for (const row of checkTable('optics/forcing_thin_layer.csv')) {
    const input = {
      solarConstantWm2: numberIn(row, 'S0_W_m2'),
      transmittance: numberIn(row, 'T_above'),
      cloudFraction: numberIn(row, 'cloud_fraction'),
      surfaceAlbedo: numberIn(row, 'surface_albedo'),
      opticalDepth: numberIn(row, 'tau'),
      singleScatteringAlbedo: numberIn(row, 'omega'),
      upscatterFraction: upscatterMean(numberIn(row, 'g')),
    };
    const label = JSON.stringify(row);
    const { shortwaveWm2 } = thinLayer.evaluate(input);
    // Next to the change of sign the value is a small difference: 1e-9 of the light falling in beside 1e-8 relative.
    const slack = 1e-9 * input.opticalDepth * 1361 * 0.5;
    expect(Math.abs(shortwaveWm2 - numberIn(row, 'dF_TOA_W_m2')), label).toBeLessThan(
      1e-8 * Math.abs(shortwaveWm2) + slack,
    );
    const clear = thinLayer.evaluate({ ...input, transmittance: 1, cloudFraction: 0 }).shortwaveWm2;
    expect(Math.abs(clear - numberIn(row, 'clear_sky_no_atmosphere_dF_W_m2')), label).toBeLessThan(
      1e-8 * Math.abs(clear) + slack,
    );
  }
});

// 10 decimals printed.
test('critical albedos equal independent values and are each other’s inverse', () => {
  for (const row of checkTable('optics/critical_ssa.csv')) {
    const beta = numberIn(row, 'beta_mean');
    const label = JSON.stringify(row);
    const omega = criticalSingleScatteringAlbedo(beta, numberIn(row, 'surface_albedo'));
    expect(Math.abs(omega - numberIn(row, 'critical_ssa')), label).toBeLessThan(1e-10);
    const surface = criticalSurfaceAlbedo(numberIn(row, 'omega_for_critical_albedo'), beta);
    expect(Math.abs(surface - numberIn(row, 'critical_surface_albedo')), label).toBeLessThan(1e-10);
  }
  fc.assert(
    fc.property(
      fc.double({ min: 0.02, max: 0.5, noNaN: true }),
      fc.double({ min: 0.01, max: 0.99, noNaN: true }),
      (beta, albedo) => {
        expect(criticalSurfaceAlbedo(criticalSingleScatteringAlbedo(beta, albedo), beta)).toBeCloseTo(
          albedo,
          7,
        );
      },
    ),
  );
});

// Inputs of Charlson et al. 1992 and Penner et al. 1994, seen second-hand; 8 and 10 digits printed.
test('the worked examples come out: sulfate, dust over ocean and snow, soot over desert, the critical ground', () => {
  const examples = new Map<string, Map<string, number>>();
  for (const row of checkTable('optics/forcing_worked_examples.csv')) {
    const values = examples.get(row.example!) ?? new Map<string, number>();
    examples.set(row.example!, values.set(row.quantity!, numberIn(row, 'value')));
  }
  expect(examples.size).toBe(5);
  for (const [name, values] of examples) {
    const of = (quantity: string) => values.get(quantity)!;
    if (name.startsWith('E1')) {
      const grams = of('anthropogenic sulfur source (as S)') * 1e12 * of('fraction oxidised to sulfate');
      const deposition = (grams * of('mass ratio sulfate to sulfur')) / of('area of the Earth');
      // The example counts 365 days a year.
      const burden =
        burdenOfDeposition(deposition, of('sulfate lifetime')) * (365.25 / of('days per year used'));
      expect(relativeError(burden, of('sulfate column burden'))).toBeLessThan(1e-7);
      const depth = burden * of('dry mass scattering efficiency') * of('humidity growth of scattering');
      expect(relativeError(depth, of('optical depth'))).toBeLessThan(1e-7);
      const { shortwaveWm2 } = thinLayer.evaluate({
        solarConstantWm2: of('S0'),
        transmittance: of('T above layer'),
        cloudFraction: 1 - of('1 - cloud fraction'),
        surfaceAlbedo: 1 - of('1 - surface albedo'),
        opticalDepth: depth,
        singleScatteringAlbedo: 1,
        upscatterFraction: of('beta mean'),
      });
      expect(relativeError(shortwaveWm2, of('dF TOA'))).toBeLessThan(1e-7);
      continue;
    }
    const answer = thinLayer.evaluate({
      solarConstantWm2: of('S0'),
      transmittance: of('T above layer'),
      cloudFraction: of('cloud fraction'),
      surfaceAlbedo: of('surface albedo'),
      opticalDepth: of('tau'),
      singleScatteringAlbedo: of('omega'),
      upscatterFraction: upscatterMean(of('g')),
    });
    expect(Math.abs(answer.shortwaveWm2 - of('dF TOA')), name).toBeLessThan(1e-8);
    expect(Math.abs(answer.criticalSingleScatteringAlbedo! - of('critical ssa')), name).toBeLessThan(1e-9);
  }
});

// Exact albedo changes by adding–doubling; four digits printed.
test('the albedo change behind the half-day form is the tabulated one, and its error is what the cautions say', () => {
  const errors = new Map<number, number[]>();
  for (const row of checkTable('optics/error_mean_case.csv')) {
    const [tau, omega, g, albedo] = ['tau', 'omega', 'g', 'surface_albedo'].map((column) =>
      numberIn(row, column),
    ) as [number, number, number, number];
    // S₀/4 of sunlight: ΔF = −(S₀/4) ΔA, the light of the half-day form is S₀/2.
    const change = -4 * thinLayerForcing(0.5, albedo, tau, omega, upscatterMean(g));
    const label = JSON.stringify(row);
    expect(Math.abs(change - numberIn(row, 'thin_layer_delta_albedo')), label).toBeLessThan(
      6e-5 * Math.max(0.1, Math.abs(change)) + 1e-7,
    );
    const dustOverDark = omega >= 0.9 && omega < 1 && g >= 0.65 && g <= 0.8 && albedo <= 0.1;
    if (!dustOverDark) continue;
    const exact = numberIn(row, 'exact_delta_albedo');
    errors.set(tau, [...(errors.get(tau) ?? []), (100 * (change - exact)) / exact]);
  }
  const within = (tau: number, low: number, high: number) => {
    expect(Math.min(...errors.get(tau)!), `τ ${tau}`).toBeGreaterThan(low);
    expect(Math.max(...errors.get(tau)!), `τ ${tau}`).toBeLessThan(high);
  };
  within(0.05, 14.5, 20.5);
  within(0.1, 22.5, 33.5);
  within(0.3, 47.5, 71.5);
});

test('no layer, no effect; the effect is linear in optical depth', () => {
  fc.assert(
    fc.property(
      share,
      share,
      share,
      share,
      share,
      (transmittance, cloudFraction, surfaceAlbedo, omega, beta) => {
        const input = {
          transmittance,
          cloudFraction,
          surfaceAlbedo,
          singleScatteringAlbedo: omega,
          upscatterFraction: beta,
        };
        expect(Math.abs(thinLayer.evaluate({ ...input, opticalDepth: 0 }).netWm2)).toBe(0);
        const one = thinLayer.evaluate({ ...input, opticalDepth: 0.1 }).shortwaveWm2;
        const two = thinLayer.evaluate({ ...input, opticalDepth: 0.2 }).shortwaveWm2;
        expect(Math.abs(two - 2 * one)).toBeLessThan(1e-10);
      },
    ),
  );
});

test('a layer that absorbs nothing never warms, and over white ground an absorbing one never cools', () => {
  fc.assert(
    fc.property(share, share, (surfaceAlbedo, upscatterFraction) => {
      const clear = { ...base, surfaceAlbedo, upscatterFraction };
      expect(thinLayer.evaluate({ ...clear, singleScatteringAlbedo: 1 }).shortwaveWm2).toBeLessThanOrEqual(0);
      const white = { ...clear, surfaceAlbedo: 1, singleScatteringAlbedo: surfaceAlbedo };
      expect(thinLayer.evaluate(white).shortwaveWm2).toBeGreaterThanOrEqual(0);
    }),
  );
});

test('the half-day form changes sign at the critical single-scattering albedo', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.02, max: 0.95, noNaN: true }),
      fc.double({ min: 0.05, max: 0.45, noNaN: true }),
      (surfaceAlbedo, upscatterFraction) => {
        const critical = criticalSingleScatteringAlbedo(upscatterFraction, surfaceAlbedo);
        const at = (singleScatteringAlbedo: number) =>
          thinLayer.evaluate({ ...base, surfaceAlbedo, upscatterFraction, singleScatteringAlbedo })
            .shortwaveWm2;
        expect(Math.abs(at(critical))).toBeLessThan(1e-10);
        expect(at(critical + (1 - critical) / 2)).toBeLessThan(0);
        expect(at(critical / 2)).toBeGreaterThan(0);
      },
    ),
  );
});

test('cautions come at the measured thresholds and no earlier', () => {
  expect(codes({ ...dust, opticalDepth: 0.02 })).toEqual(['longwave-left-out']);
  expect(codes({ ...dust, opticalDepth: 0.05 })).toContain('thin-layer-note');
  expect(codes({ ...dust, opticalDepth: 0.05, surfaceAlbedo: 0.7 })).not.toContain('thin-layer-note');
  expect(codes({ ...dust, opticalDepth: 0.2 })).toContain('thin-layer-beyond-range');
  expect(codes({ ...dust, opticalDepth: 0.4 })).toContain('thin-layer-far-beyond-range');
  expect(codes({ ...dust, singleScatteringAlbedo: 0.8 })).toContain('thin-layer-strongly-absorbing');
  expect(codes({ ...dust, surfaceAlbedo: 0.35 })).toContain('near-sign-change');
  expect(codes({ ...dust, surfaceAlbedo: 0.8 })).toContain('bright-surface');
  expect(codes({ ...dust, daylightFraction: 0.7 })).toContain('half-day-form-local');
});

test('an input of another method, a missing one and an impossible one are refused by name', () => {
  const odd = { ...dust, asymmetry: 0.7 } as typeof dust;
  expect(() => thinLayer.evaluate(odd)).toThrow(/asymmetry is 0.7; it must be left out: it is not used here/);
  const { opticalDepth: _, ...without } = dust;
  expect(() => thinLayer.evaluate(without as typeof dust)).toThrow(
    /opticalDepth is missing; it must be a number from 0 to 10/,
  );
  expect(() => thinLayer.evaluate({ ...dust, cloudFraction: 1.2 })).toThrow(
    /cloudFraction is 1.2; it must lie within 0 to 1/,
  );
  expect(() => thinLayer.evaluate({ ...dust, opticalDepth: Number.NaN })).toThrow(/opticalDepth is NaN/);
});
