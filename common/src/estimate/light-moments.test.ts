import { expect, test } from 'vitest';
import { exampleEstimate } from '../../test/example-estimate';
import { dailyMeanUpscatter, dailyMoments } from '../forcing/daily-moments';
import { hgUpscatterCoefficients, upscatterOrder } from '../optics/upscatter';
import { annualMeanInsolation } from '../orbit/mean-insolation';
import { LIGHT_HIGHEST_ORDER, LIGHT_INSOLATION, lightMoments, LIGHTS } from './light-moments';
import { regionGeometry } from './region-geometry';

const { orbit } = exampleEstimate().slice;

// Tolerances: what the next terms of the series can add, measured; far below what the thin layer itself is off by.
test.each([
  [0.7, 2e-7],
  [0.76, 3e-6],
  [0.85, 5e-4],
  [0.9, 8e-3],
])('the series kept gives the daily upscatter of g = %s to %s', (asymmetry, tolerance) => {
  const full = upscatterOrder(asymmetry);
  for (const latitude of [-85, -45, 0, 30, 70]) {
    for (const longitude of [0, 45, 90, 270]) {
      const moments = dailyMoments(latitude, longitude, orbit, 1361, full);
      if (moments.incidentWm2 === 0) continue;
      const exact = dailyMeanUpscatter(hgUpscatterCoefficients(asymmetry, full), moments.legendre);
      const kept = dailyMeanUpscatter(
        hgUpscatterCoefficients(asymmetry, LIGHT_HIGHEST_ORDER),
        moments.legendre,
      );
      expect(Math.abs(kept / exact - 1), `${latitude}, ${longitude}`).toBeLessThan(tolerance);
    }
  }
});

// 3e-3: three nodes per month where the polar day begins within it; 2e-4 elsewhere.
test('months of three nodes give the annual insolation of every row', () => {
  const geometry = regionGeometry(2);
  const { months } = lightMoments(geometry, orbit, 1361);
  for (let row = 0; row < geometry.rows; row++) {
    const latitude = geometry.latitudesDeg[row]!;
    const mean = months.reduce(
      (sum, m) => sum + m.shareOfYear * m.byRow[row * LIGHTS + LIGHT_INSOLATION]!,
      0,
    );
    const tolerance = Math.abs(latitude) > 60 ? 3e-3 : 2e-4;
    expect(Math.abs(mean / annualMeanInsolation(latitude, orbit, 1361) - 1), `${latitude}`).toBeLessThan(
      tolerance,
    );
  }
});
