import fc from 'fast-check';
import { expect, test } from 'vitest';
import { calculateForcing } from './calculate-forcing';
import { snowDarkening } from './snow-darkening';

const snow = { depositionGM2Yr: 1, accumulationKgM2Yr: 100, specificSurfaceM2PerKg: 20 };

// 10 ppm dust counts as 0.1 ppm soot: 0.1^0.55 / (0.16 + 0.6·√200 + 1.8·0.1^0.6·200^−0.25), worked by hand.
test('one gram of dust in a hundred kilograms of snow takes about 0.03 off its albedo', () => {
  const answer = snowDarkening(snow);
  expect(answer.dustPpm).toBeCloseTo(10, 12);
  expect(answer.albedoChange).toBeCloseTo(-0.0322, 3);
  expect(answer.albedoChangeLowest).toBeLessThan(answer.albedoChange);
  expect(answer.albedoChangeHighest).toBeGreaterThan(answer.albedoChange);
  expect(answer.cautions.map(({ code }) => code)).toEqual(['snow-darkening-from-memory']);
});

test('clean snow keeps its albedo; more dust and coarser grains darken it more', () => {
  expect(snowDarkening({ ...snow, depositionGM2Yr: 0 })).toMatchObject({ albedoChange: 0, cautions: [] });
  fc.assert(
    fc.property(
      fc.double({ min: 0.001, max: 10, noNaN: true }),
      fc.double({ min: 2, max: 90, noNaN: true }),
      (depositionGM2Yr, specificSurfaceM2PerKg) => {
        const input = { ...snow, depositionGM2Yr, specificSurfaceM2PerKg };
        const { albedoChange } = snowDarkening(input);
        expect(albedoChange).toBeLessThan(0);
        expect(albedoChange).toBeGreaterThan(-1);
        expect(snowDarkening({ ...input, depositionGM2Yr: 2 * depositionGM2Yr }).albedoChange).toBeLessThan(
          albedoChange,
        );
        const coarser = { ...input, specificSurfaceM2PerKg: specificSurfaceM2PerKg / 2 };
        expect(snowDarkening(coarser).albedoChange).toBeLessThan(albedoChange);
      },
    ),
  );
});

test('snow so dusty that the relation was not made for it says so; snow that does not fall is refused', () => {
  const codes = snowDarkening({ ...snow, depositionGM2Yr: 150 }).cautions.map(({ code }) => code);
  expect(codes).toContain('snow-darkening-beyond-range');
  expect(() => snowDarkening({ ...snow, accumulationKgM2Yr: 0 })).toThrow(
    /accumulationKgM2Yr is 0 kg m⁻² yr⁻¹/,
  );
});

test('as a change of the surface it warms, in a result of its own', () => {
  const { albedoChange } = snowDarkening(snow);
  const answer = calculateForcing({
    method: 'simple-albedo',
    insolationWm2: 200,
    transmittance: 0.8,
    cloudFraction: 0.5,
    albedoChange,
  });
  expect(answer.shortwaveWm2).toBeGreaterThan(0);
});
