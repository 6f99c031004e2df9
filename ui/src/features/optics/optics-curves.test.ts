import { speciesOptics } from '@siltlight/common/optics/species-optics';
import { curveSteps, sizeCurve, spectrumWavelengths, type Curves } from './optics-curves';
import { startingDefinition } from './species-form';

function drained(definition = startingDefinition): { curves: Curves; steps: number } {
  const steps = curveSteps(definition, 'fast');
  for (let count = 0; ; count += 1) {
    const step = steps.next();
    if (step.done) return { curves: step.value, steps: count };
  }
}

test('the spectrum has 30 rising wavelengths, 0.55 µm among them', () => {
  const wavelengths = spectrumWavelengths();
  expect(wavelengths).toHaveLength(30);
  expect(wavelengths).toContain(0.55);
  expect([...wavelengths].sort((a, b) => a - b)).toEqual(wavelengths);
});

test('curves can be stopped between wavelengths and hold the value at 0.55 µm within its range', () => {
  const { curves, steps } = drained();
  expect(steps).toBeGreaterThan(30);
  const at = curves.spectrum.find((point) => point.wavelengthUm === 0.55)!;
  const alone = speciesOptics(startingDefinition, 0.55, 'fast');
  expect(at.singleScatteringAlbedo.central).toBe(alone.singleScatteringAlbedo);
  expect(at.asymmetry.low).toBeLessThanOrEqual(at.asymmetry.central);
  expect(at.asymmetry.high).toBeGreaterThanOrEqual(at.asymmetry.central);
  expect(curves.bands.at(-1)!.name).toBe('shortwave');
});

// ½∫P dμ = 1; one degree and the narrow forward peak leave a few per cent.
test('the phase function at 0.55 µm goes from ahead to straight back and is normalised', () => {
  const { phase } = drained().curves;
  expect(phase.map((point) => point.angleDeg)).toEqual(Array.from({ length: 181 }, (_, angle) => angle));
  const radians = Math.PI / 180;
  const integral = phase.reduce(
    (sum, { angleDeg, value }) => sum + (value * Math.sin(angleDeg * radians) * radians) / 2,
    0,
  );
  expect(Math.abs(integral - 1)).toBeLessThan(0.05);
});

test('by number, surface and volume the size distribution is one whole, and moves to larger radii', () => {
  const step = Math.log(5 / 0.02) / 240;
  const centres = (['number', 'surface', 'volume'] as const).map((measure) => {
    const points = sizeCurve(startingDefinition, measure);
    expect(points.reduce((sum, point) => sum + point.all * step, 0)).toBeCloseTo(1, 10);
    return points.reduce((best, point) => (point.all > best.all ? point : best)).radiusUm;
  });
  expect(centres[0]).toBeLessThan(centres[1]!);
  expect(centres[1]).toBeLessThan(centres[2]!);
});

test('a larger median radius changes extinction', () => {
  const larger = {
    ...startingDefinition,
    modes: startingDefinition.modes.map((mode) => ({ ...mode, medianRadiusUm: 1 })),
  };
  const [before, after] = [drained().curves, drained(larger).curves];
  expect(after.at550.massExtinctionM2PerG).toBeLessThan(0.8 * before.at550.massExtinctionM2PerG);
});

// Dry, f is 1 by definition; particles that take up water grow, and scatter more.
test('f(RH) begins at 1, rises to 95 % for what takes up water, and is left out for what takes up none', () => {
  const { humidity } = drained({ ...startingDefinition, kappa: 0.61, relativeHumidity: 0.8 }).curves;
  expect(humidity[0]).toEqual({ relativeHumidity: 0, ratio: 1 });
  expect(humidity.at(-1)!.relativeHumidity).toBe(0.95);
  humidity.slice(1).forEach(({ ratio }, at) => expect(ratio).toBeGreaterThan(humidity[at]!.ratio));
  expect(drained().curves.humidity).toEqual([]);
});
