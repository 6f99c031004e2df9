import { expect, test } from 'vitest';
import { calculateInsolation } from './calculate-insolation';
import { calculateOrbit } from './calculate-orbit';
import { solarLongitudeOfDay } from './calendar';
import { dailyInsolation } from './daily-insolation';
import { bergerOrbit } from './elements';

const june = { latitudeDeg: 65, solarLongitudeDeg: 90 };

test('the orbit calculator answers the elements of the age and the climatic precession', () => {
  const answer = calculateOrbit({ ageKaBp: 21 });
  expect(answer.eccentricity).toBeCloseTo(0.018994, 5);
  expect(answer.obliquityDeg).toBeCloseTo(22.949, 3);
  expect(answer.perihelionLongitudeDeg).toBeCloseTo(114.42, 1);
  expect(answer.climaticPrecession).toBeCloseTo(0.0173, 4);
  expect(answer.cautions).toEqual([]);
  expect(answer.method.source).toContain('Berger (1978)');
});

test('an unknown solution and a misspelt age are refused by name', () => {
  expect(() => calculateOrbit({ ageKaBp: 21, solution: 'laskar' as 'berger1978' })).toThrow(
    /solution is laskar; it must be one of berger1978/,
  );
  expect(() => calculateOrbit({ ageKa: 21 } as unknown as { ageKaBp: number })).toThrow(
    /ageKa is 21; it must be left out/,
  );
  expect(() => calculateOrbit({ ageKaBp: '21' as unknown as number })).toThrow(/ageKaBp/);
});

test('insolation takes an age or an orbit, a longitude or a day', () => {
  const { orbit } = bergerOrbit(6);
  const byAge = calculateInsolation({ ...june, ageKaBp: 6 });
  expect(calculateInsolation({ ...june, orbit })).toEqual(byAge);
  expect(byAge.dailyMeanWm2).toBe(dailyInsolation(65, 90, orbit, 1361).dailyMeanWm2);
  const byDay = calculateInsolation({ latitudeDeg: 65, dayOfYear: 172, orbit, solarConstantWm2: 1365 });
  expect(byDay.dailyMeanWm2).toBe(
    dailyInsolation(65, solarLongitudeOfDay(172, orbit), orbit, 1365).dailyMeanWm2,
  );
});

test('both or none of two alternatives are refused', () => {
  const { orbit } = bergerOrbit(6);
  expect(() => calculateInsolation({ ...june, ageKaBp: 6, orbit })).toThrow(
    /ageKaBp is 6; it must be left out when orbit is given/,
  );
  expect(() => calculateInsolation(june)).toThrow(/orbit is undefined; it must be given, or ageKaBp instead/);
  expect(() => calculateInsolation({ ...june, ageKaBp: 6, dayOfYear: 1 })).toThrow(/dayOfYear/);
  expect(() => calculateInsolation({ ...june, orbit: { ...orbit, obliquityDeg: 91 } })).toThrow(
    /orbit.obliquityDeg is 91 °; it must lie within 0 to 90/,
  );
  expect(() => calculateInsolation({ ...june, latitudeDeg: 91, ageKaBp: 6 })).toThrow(/latitudeDeg is 91 °/);
});

test('an age beyond the trusted range brings its caution with the insolation', () => {
  expect(calculateInsolation({ ...june, ageKaBp: 1200 }).cautions.map((caution) => caution.code)).toEqual([
    'berger1978-beyond-range',
  ]);
});
