import fc from 'fast-check';
import { expect, test } from 'vitest';
import { calculateForcing, type ForcingRequest } from './calculate-forcing';
import { FORCING_METHOD_LIST, FORCING_METHODS } from './methods';

const codes = (request: ForcingRequest) => calculateForcing(request).cautions.map((caution) => caution.code);

test('efficiency multiplies optical depth, all sky', () => {
  const answer = calculateForcing({
    method: 'efficiency',
    opticalDepth: 0.1,
    shortwaveEfficiencyWm2: -33,
    longwaveEfficiencyWm2: 8,
  });
  expect(answer.shortwaveWm2).toBeCloseTo(-3.3, 12);
  expect(answer.longwaveWm2).toBeCloseTo(0.8, 12);
  expect(answer.netWm2).toBeCloseTo(-2.5, 12);
  expect(answer.criticalSingleScatteringAlbedo).toBeNull();
  expect(answer.method.name).toBe('Efficiency times optical depth');
});

test('a clear-sky efficiency counts in the clear part of the sky, longwave in the part free of high cloud', () => {
  const request = {
    method: 'efficiency',
    opticalDepth: 0.1,
    shortwaveEfficiencyWm2: -30,
    longwaveEfficiencyWm2: 10,
    efficiencySky: 'clear',
    cloudFraction: 0.6,
    highCloudFraction: 0.2,
  } as const;
  const answer = calculateForcing(request);
  expect(answer.shortwaveWm2).toBeCloseTo(-1.2, 12);
  expect(answer.longwaveWm2).toBeCloseTo(0.8, 12);
  expect(() => calculateForcing({ ...request, cloudFraction: undefined })).toThrow(
    /cloudFraction is missing/,
  );
  expect(() => calculateForcing({ ...request, efficiencySky: 'all' })).toThrow(
    /cloudFraction is 0.6; it must be left out/,
  );
});

test('a longwave block replaces the longwave efficiency, and both together are refused', () => {
  const base = { method: 'efficiency', opticalDepth: 0.1, shortwaveEfficiencyWm2: -30 } as const;
  expect(calculateForcing({ ...base, longwave: { efficiencyWm2: 10 } }).longwaveWm2).toBeCloseTo(1, 12);
  expect(() =>
    calculateForcing({ ...base, longwaveEfficiencyWm2: 10, longwave: { efficiencyWm2: 10 } }),
  ).toThrow(/longwaveEfficiencyWm2 is 10; it must be left out when longwave is given/);
  expect(codes(base)).toContain('longwave-left-out');
});

test('simple albedo is −Q T² (1−A_c) Δα, and darkening bright ground warms', () => {
  const base = {
    method: 'simple-albedo',
    insolationWm2: 340.25,
    transmittance: 0.76,
    cloudFraction: 0.6,
  } as const;
  const answer = calculateForcing({ ...base, albedoChange: 0.01 });
  expect(answer.shortwaveWm2).toBeCloseTo(-340.25 * 0.5776 * 0.4 * 0.01, 12);
  expect(answer.cautions).toEqual([]);
  fc.assert(
    fc.property(fc.double({ min: 1e-6, max: 1, noNaN: true }), (drop) => {
      expect(calculateForcing({ ...base, albedoChange: -drop }).shortwaveWm2).toBeGreaterThan(0);
    }),
  );
});

test('an unknown method is refused with the list of those there are', () => {
  expect(() => calculateForcing({ method: 'guess' } as unknown as ForcingRequest)).toThrow(
    /method is guess; it must be one of slanted-layer, two-stream, multi-stream, thin-layer-daily, thin-layer, simple-albedo, efficiency/,
  );
});

test('every method is listed under its own id with a formula, a source and declared inputs', () => {
  expect(FORCING_METHOD_LIST.map((method) => method.id)).toEqual(Object.keys(FORCING_METHODS));
  for (const method of FORCING_METHOD_LIST) {
    expect(method.formula, method.id).toContain('\\Delta F');
    expect(method.source, method.id).toMatch(/\d{4}|practice/);
    for (const input of method.inputs) {
      expect(input.min, `${method.id} ${input.field}`).toBeLessThan(input.max);
      if (input.default !== undefined) expect(input.required, input.field).toBe(false);
    }
  }
});
