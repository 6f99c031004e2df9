import { expect, test } from 'vitest';
import { exampleEstimate } from '../../test/example-estimate';
import { runEstimate } from './run-estimate';

const codes = (change: Parameters<typeof exampleEstimate>[0]) =>
  runEstimate(exampleEstimate(change)).cautions.map((caution) => caution.code);

test('every run says what its interval covers, that its base field is coarse and how much area is filled by rule', () => {
  const found = codes({});
  for (const code of [
    'interval-covers-varied-inputs',
    'coarse-base-field',
    'few-sites',
    'hatched-area',
    'backdrop-split',
  ]) {
    expect(found).toContain(code);
  }
  expect(new Set(found).size).toBe(found.length);
});

test('longwave left out and longwave by efficiency each carry their own caution', () => {
  expect(codes({ longwave: null })).toContain('longwave-off');
  expect(codes({})).toContain('longwave-by-efficiency');
  expect(codes({})).not.toContain('longwave-off');
});

test('the half-day form warns about regions, most of all at high latitude', () => {
  const result = runEstimate(exampleEstimate({ method: 'thin-layer' }));
  expect(result.cautions.map((c) => c.code)).toContain('half-day-per-region');
  const of = (code: string) =>
    result.regions.find((region) => region.code === code)!.cautions.map((c) => c.code);
  expect(of('EAN')).toContain('half-day-high-latitude');
  expect(of('SAH')).not.toContain('half-day-high-latitude');
});

test('thick dust is named by region and an efficiency by its place', () => {
  const thick = runEstimate(exampleEstimate({})).cautions.find((c) => c.code === 'thin-layer-beyond-range')!;
  expect(thick.message).toContain('SAH');
  expect(codes({ method: 'efficiency' })).toContain('efficiency-out-of-place');
  expect(codes({ method: 'efficiency' })).not.toContain('thin-layer-beyond-range');
  expect(
    codes({ optics: { singleScatteringAlbedo: 0.8, asymmetry: 0.7, massExtinctionM2PerG: 0.6 } }),
  ).toContain('strong-absorption');
});

test('impossible inputs are refused by name', () => {
  const run = (change: Parameters<typeof exampleEstimate>[0]) => () => runEstimate(exampleEstimate(change));
  expect(run({ transmittance: 1.2 })).toThrow(/transmittance is 1.2/);
  expect(run({ method: 'efficiency', shortwaveEfficiency: undefined })).toThrow(/shortwave efficiency/);
  expect(run({ backdrop: [] })).toThrow(/bands from −90 to 90/);
  const twice = exampleEstimate();
  const parameters = [twice.ensemble.parameters[0]!, twice.ensemble.parameters[0]!];
  expect(run({ ensemble: { ...twice.ensemble, parameters } })).toThrow(/each once/);
  const efficiency = {
    name: 'shortwaveEfficiencyWm2',
    distribution: { kind: 'constant', value: -13 },
    unit: '',
    source: '',
  } as const;
  expect(run({ ensemble: { ...twice.ensemble, parameters: [efficiency] } })).toThrow(
    /inputs that this method uses/,
  );
});
