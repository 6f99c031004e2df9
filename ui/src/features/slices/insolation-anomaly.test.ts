import type { SliceContent } from '@siltlight/common/wire/slices';
import { insolationAnomaly } from './insolation-anomaly';
import { orbitSeries, precessionOf } from './orbit-series';
import { orbitalAgeText, timesInWords } from './slice-words';

// Orbital elements of the PMIP4 protocol (Kageyama et al. 2017, Otto-Bliesner et al. 2017).
const glacial = {
  orbit: { eccentricity: 0.018994, obliquityDeg: 22.949, perihelionLongitudeDeg: 114.42 },
  solarConstantWm2: 1360.747,
} satisfies Partial<SliceContent>;
const reference = {
  orbit: { eccentricity: 0.016764, obliquityDeg: 23.459, perihelionLongitudeDeg: 100.33 },
  solarConstantWm2: 1360.747,
} satisfies Partial<SliceContent>;

test('a slice against itself has no anomaly anywhere', () => {
  const cells = insolationAnomaly(reference, reference);
  expect(cells).toHaveLength(12 * 36);
  expect(cells.every((cell) => cell.anomalyWm2 === 0)).toBe(true);
});

test('the glacial orbit with its smaller obliquity gives the far north less light in June', () => {
  const cells = insolationAnomaly(glacial, reference);
  const june = cells.find((cell) => cell.month === 5 && cell.latitudeDeg === 72.5)!;
  expect(june.anomalyWm2).toBeLessThan(-5);
  expect(june.anomalyWm2).toBeGreaterThan(-20);
});

test('the orbit through time keeps to the bounds of its elements and starts with those of 1950', () => {
  const series = orbitSeries();
  expect(series).toHaveLength(301);
  // Berger (1978): e = 0.016724, ε = 23.446° at 1950 CE.
  expect(series[0]!.eccentricity).toBeCloseTo(0.016724, 4);
  expect(series[0]!.obliquityDeg).toBeCloseTo(23.446, 2);
  for (const point of series) {
    expect(Math.abs(point.precession)).toBeLessThanOrEqual(point.eccentricity);
    expect(point.obliquityDeg).toBeGreaterThan(22);
    expect(point.obliquityDeg).toBeLessThan(24.6);
  }
  expect(precessionOf(reference.orbit)).toBeCloseTo(0.01649, 4);
});

test('window and orbital age are said apart, and a young age by its year', () => {
  const times = { windowYoungKa: 19, windowOldKa: 23, orbitalAgeKa: 21, kind: 'evidence' as const };
  expect(timesInWords(times)).toMatch(/from 23 to 19 ka before 1950.*those of 21 ka: a single time/);
  expect(orbitalAgeText({ orbitalAgeKa: 0.1 })).toBe('1850 CE');
});
