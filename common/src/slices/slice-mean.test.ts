import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkTable } from '../../test/check-table';
import { expectedOverlapKa } from './expected-overlap';
import type { FluxSample } from './sample-interval';
import { sliceMean, type SliceMean } from './slice-mean';

function sample(id: string, ageKaBp: number, fluxGM2Yr: number, more: Partial<FluxSample> = {}): FluxSample {
  return { id, ageKaBp, fluxGM2Yr, quantity: 'dust', sizeCutoff: 'bulk', ...more };
}

function meanOf(samples: FluxSample[], youngKaBp: number, oldKaBp: number): SliceMean {
  const mean = sliceMean(samples, { youngKaBp, oldKaBp });
  if ('reason' in mean) throw new Error(mean.reason);
  return mean;
}

// 1e-11 relative: the table prints twelve digits.
test('time-weighted slice means and coverages of made-up cores equal the table', () => {
  for (const row of checkTable('general/time_slice_mean_flux.csv')) {
    const bounds = String(row.segment_boundaries_ka).split(' ').map(Number);
    const fluxes = String(row.segment_flux_g_m2_yr).split(' ').map(Number);
    const segments = fluxes.map((flux, i) =>
      sample(`segment ${i}`, (bounds[i]! + bounds[i + 1]!) / 2, flux, {
        ageYoungKaBp: bounds[i]!,
        ageOldKaBp: bounds[i + 1]!,
      }),
    );
    const got = meanOf(segments, Number(row.slice_young_ka), Number(row.slice_old_ka));
    expect(Math.abs(got.meanFluxGM2Yr / Number(row.slice_mean_flux_g_m2_yr) - 1)).toBeLessThan(1e-11);
    expect(got.coverage).toBeCloseTo(Number(row.coverage_fraction), 11);
  }
});

test('a sample without bounds reaches half-way to its neighbours', () => {
  // 2 stands for 1.5 to 3, 4 for 3 to 5: in a window of 2 to 4 both weigh the same
  const got = meanOf([sample('a', 1, 9), sample('b', 2, 1), sample('c', 4, 3)], 2, 4);
  expect(got.samples.map((s) => s.id)).toEqual(['b', 'c']);
  expect(got.meanFluxGM2Yr).toBeCloseTo(2, 12);
  expect(got.coverage).toBeCloseTo(1, 12);
});

test('a record with no sample in the window gives a reason, also when its gap spans the window', () => {
  const none = { reason: 'no-sample-in-window' };
  expect(sliceMean([], { youngKaBp: 0, oldKaBp: 4 })).toEqual(none);
  expect(sliceMean([sample('a', 11, 1), sample('b', 12, 1)], { youngKaBp: 0, oldKaBp: 4 })).toEqual(none);
  expect(sliceMean([sample('a', 2, 1), sample('b', 40, 1)], { youngKaBp: 19, oldKaBp: 23 })).toEqual(none);
});

test('an age error spreads a sample over the edge of the window and keeps its expected length', () => {
  const interval = { youngKaBp: 3.5, oldKaBp: 4.5 };
  // by symmetry about the edge half of it lies inside, whatever the error
  expect(expectedOverlapKa(interval, { youngKaBp: -1000, oldKaBp: 4 }, 0.7)).toBeCloseTo(0.5, 10);
  expect(expectedOverlapKa(interval, { youngKaBp: -1000, oldKaBp: 1000 }, 0.7)).toBeCloseTo(1, 9);
  const sharp = expectedOverlapKa(interval, { youngKaBp: 0, oldKaBp: 4 }, 1e-6);
  expect(sharp).toBeCloseTo(0.5, 6);
});

test('a sample whose age error alone brings it near the window by a hair is left aside', () => {
  const far = { ageYoungKaBp: 6, ageOldKaBp: 7, ageSigmaKa: 0.5 };
  const got = sliceMean([sample('a', 6.5, 1, far)], { youngKaBp: 0, oldKaBp: 4 });
  expect(got).toEqual({ reason: 'no-sample-in-window' });
});

test('bulk and fine fluxes, or two quantities, are never averaged together', () => {
  const window = { youngKaBp: 0, oldKaBp: 4 };
  expect(() => sliceMean([sample('a', 1, 1), sample('b', 2, 1, { sizeCutoff: '<10 um' })], window)).toThrow(
    /sizeCutoff/,
  );
  expect(() => sliceMean([sample('a', 1, 1), sample('b', 2, 1, { quantity: 'nssCa' })], window)).toThrow(
    /quantity/,
  );
});

test('one sample keeps its own error, several take the larger of error and scatter', () => {
  expect(meanOf([sample('a', 2, 5)], 0, 4).standardErrorGM2Yr).toBeNull();
  expect(meanOf([sample('a', 2, 5, { fluxSigmaGM2Yr: 0.5 })], 0, 4).standardErrorGM2Yr).toBeCloseTo(0.5, 12);
  const bounds = [0, 1, 2, 3, 4];
  const scattered = [1, 3, 1, 3].map((flux, i) =>
    sample(`${i}`, i + 0.5, flux, {
      ageYoungKaBp: bounds[i]!,
      ageOldKaBp: bounds[i + 1]!,
      fluxSigmaGM2Yr: 0.01,
    }),
  );
  // sample sd of 1, 3, 1, 3 is √(4/3); over √4
  expect(meanOf(scattered, 0, 4).standardErrorGM2Yr).toBeCloseTo(Math.sqrt(4 / 3) / 2, 12);
});

test('doubling every flux doubles the mean, order does not matter, the mean lies among the fluxes', () => {
  const record = fc.array(
    fc.record({
      age: fc.double({ min: 0, max: 10, noNaN: true }),
      flux: fc.double({ min: 0.01, max: 50, noNaN: true }),
    }),
    { minLength: 1, maxLength: 15 },
  );
  fc.assert(
    fc.property(record, (rows) => {
      const samples = rows.map((r, i) => sample(`${i}`, r.age, r.flux, { ageSigmaKa: 0.3 }));
      const window = { youngKaBp: 2, oldKaBp: 8 };
      const got = sliceMean(samples, window);
      if ('reason' in got) return;
      const doubled = samples.map((s) => ({ ...s, fluxGM2Yr: 2 * s.fluxGM2Yr }));
      expect((sliceMean(doubled, window) as SliceMean).meanFluxGM2Yr).toBeCloseTo(2 * got.meanFluxGM2Yr, 9);
      expect((sliceMean([...samples].reverse(), window) as SliceMean).meanFluxGM2Yr).toBeCloseTo(
        got.meanFluxGM2Yr,
        9,
      );
      expect(got.meanFluxGM2Yr).toBeGreaterThanOrEqual(Math.min(...rows.map((r) => r.flux)) - 1e-9);
      expect(got.meanFluxGM2Yr).toBeLessThanOrEqual(Math.max(...rows.map((r) => r.flux)) + 1e-9);
      expect(got.samples.reduce((sum, s) => sum + s.weight, 0)).toBeCloseTo(1, 9);
      expect(got.coverage).toBeLessThanOrEqual(1 + 1e-12);
    }),
  );
});
