import { expect, test } from 'vitest';
import { checkTable, numberIn, relativeError } from '../../test/check-table';
import { PMIP_SLICES } from '../tables/pmip-slices';
import { dailyInsolation } from './daily-insolation';
import { bergerOrbit, protocolOrbit } from './elements';

const turn = (a: number, b: number) => Math.abs(((a - b + 540) % 360) - 180);

// An independent program over the same 47 + 19 + 78 terms; the table prints 12 to 13 digits.
test('the series reproduces independently computed elements from 0 to 999 ka to 1e-9', () => {
  for (const row of checkTable('orbit/berger1978_elements.csv')) {
    const { orbit, climaticPrecession, cautions } = bergerOrbit(numberIn(row, 'age_ka_before_1950'));
    const age = `${row.age_ka_before_1950} ka`;
    expect(relativeError(orbit.eccentricity, numberIn(row, 'eccentricity')), age).toBeLessThan(1e-9);
    expect(relativeError(orbit.obliquityDeg, numberIn(row, 'obliquity_deg')), age).toBeLessThan(1e-9);
    expect(
      turn(orbit.perihelionLongitudeDeg, numberIn(row, 'longitude_of_perihelion_deg')),
      age,
    ).toBeLessThan(1e-8);
    expect(Math.abs(climaticPrecession - numberIn(row, 'climatic_precession_e_sin_omega')), age).toBeLessThan(
      1e-11,
    );
    expect(cautions, age).toEqual([]);
  }
});

// The protocols print 5 to 6 digits; Berger's own program sample prints the perihelion to 0.1° with fewer terms.
test('the series agrees with the elements that protocols and the program of 1978 print', () => {
  for (const row of checkTable('orbit/published_elements.csv')) {
    const { orbit } = bergerOrbit(numberIn(row, 'age_ka_before_1950'));
    expect(Math.abs(orbit.eccentricity - numberIn(row, 'published_eccentricity')), row.case).toBeLessThan(
      5e-6,
    );
    expect(Math.abs(orbit.obliquityDeg - numberIn(row, 'published_obliquity_deg')), row.case).toBeLessThan(
      5e-4,
    );
    expect(
      turn(orbit.perihelionLongitudeDeg, numberIn(row, 'published_longitude_of_perihelion_deg')),
      row.case,
    ).toBeLessThan(0.05);
  }
});

// 8 to 10 printed digits; insolation at 65° N in June to four decimals.
test('elements and midsummer insolation equal the compared solutions, Berger & Loutre 1991 from its printed table', () => {
  for (const row of checkTable('orbit/solutions_compared.csv')) {
    const { orbit } = bergerOrbit(numberIn(row, 'age_ka_before_1950'));
    const age = `${row.age_ka_before_1950} ka`;
    expect(Math.abs(orbit.eccentricity - numberIn(row, 'b78_eccentricity')), age).toBeLessThan(1e-9);
    expect(Math.abs(orbit.obliquityDeg - numberIn(row, 'b78_obliquity_deg')), age).toBeLessThan(1e-6);
    expect(turn(orbit.perihelionLongitudeDeg, numberIn(row, 'b78_perihelion_deg')), age).toBeLessThan(1e-5);
    const printed = {
      eccentricity: numberIn(row, 'bl91_eccentricity'),
      obliquityDeg: numberIn(row, 'bl91_obliquity_deg'),
      perihelionLongitudeDeg: numberIn(row, 'bl91_perihelion_deg'),
    };
    const midsummer = (of: typeof orbit) => dailyInsolation(65, 90, of, 1361).dailyMeanWm2;
    expect(Math.abs(midsummer(orbit) - numberIn(row, 'q65N_jun_b78_W_m2_S0_1361')), age).toBeLessThan(1e-4);
    expect(Math.abs(midsummer(printed) - numberIn(row, 'q65N_jun_bl91_W_m2_S0_1361')), age).toBeLessThan(
      1e-4,
    );
  }
});

test('the 180° trap: e sin ϖ is +0.0164 in 1950 CE, so the perihelion falls in early January', () => {
  const { climaticPrecession, orbit } = bergerOrbit(0);
  expect(climaticPrecession).toBeCloseTo(0.0164, 4);
  expect(orbit.perihelionLongitudeDeg).toBeCloseTo(102.04, 2);
});

test('protocol orbits lie within their rounding of the series, apart from the adjusted year 1850', () => {
  for (const { name, ageKaBp } of PMIP_SLICES) {
    const printed = protocolOrbit(name)!;
    const { orbit } = bergerOrbit(ageKaBp);
    expect(Math.abs(orbit.eccentricity - printed.eccentricity), name).toBeLessThan(6e-6);
    expect(Math.abs(orbit.obliquityDeg - printed.obliquityDeg), name).toBeLessThan(1e-3);
    expect(turn(orbit.perihelionLongitudeDeg, printed.perihelionLongitudeDeg), name).toBeLessThan(0.02);
  }
  expect(protocolOrbit('a slice of no protocol')).toBeNull();
});

test('an age beyond one million years carries a caution, and beyond five it is refused', () => {
  expect(bergerOrbit(1000).cautions).toEqual([]);
  expect(bergerOrbit(-1000.5).cautions.map((caution) => caution.code)).toEqual(['berger1978-beyond-range']);
  expect(() => bergerOrbit(5001)).toThrow(/ageKaBp is 5001 ka BP; it must lie within -5000 to 5000/);
  expect(() => bergerOrbit(Number.NaN)).toThrow(/ageKaBp/);
});
