import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { ageConversion, parseAgeUnit, toAgeKaBp } from './age';
import { isUnitProblem } from './unit';

const conversionOf = (unit: string, heading = '') => {
  const parsed = parseAgeUnit(unit, heading);
  if (isUnitProblem(parsed)) throw new Error(parsed.message);
  return ageConversion(parsed);
};
const age = (value: number, unit: string, heading = '') => toAgeKaBp(value, conversionOf(unit, heading));

describe('ages', () => {
  test.each([
    [21, 'ka BP', '', 21],
    [10800, 'yr', 'Age b2k', 10.75],
    [3500, 'a v. 1950', 'Alter', 3.5],
    [3500, 'Jahre vor 1950', '', 3.5],
    [10800, 'a b2k', '', 10.75],
    [10800, 'years before 2000', '', 10.75],
    [18000, 'cal yr BP', '', 18],
    [18, 'kyr', 'Age / kyr, EDC3', 18],
    [0.371, '', 'EDC3Age(kyrBP)', 0.371],
    [1.5, '', 'age_ka_BP', 1.5],
    [1.2, 'Ma', '', 1200],
    [1950, 'year CE', '', 0],
    [2010, '', 'Year AD', -0.06],
    [1, 'BCE', 'year', 1.95],
    [-51.03, '', 'Gasage (yr BP)', -0.05103],
    [-42, 'yr BP', '', -0.042],
  ])('%d "%s" under the heading "%s" is %d ka BP', (value, unit, heading, expected) => {
    expect(age(value, unit, heading)).toBeCloseTo(expected, 9);
  });

  test('a unit without a datum is taken before 1950 CE and says so', () => {
    expect(conversionOf('ka').datumAssumed).toBe(true);
    expect(conversionOf('ka BP').datumAssumed).toBe(false);
    expect(conversionOf('ka').explanation).toContain('no datum is named');
  });

  test('uncalibrated radiocarbon years are flagged, calibrated ones are not', () => {
    expect(conversionOf('14C yr BP').radiocarbon).toBe(true);
    expect(conversionOf('cal yr BP').radiocarbon).toBe(false);
  });

  test('a unit that is no time is refused with what is wanted', () => {
    for (const [unit, heading] of [
      ['ng/g', 'Age'],
      ['', 'Age_BP'],
      ['', ''],
    ] as const) {
      const problem = parseAgeUnit(unit, heading);
      expect(isUnitProblem(problem) && problem.message).toContain('ka BP');
    }
  });

  test('an age b2k is 0.05 ka larger than the same moment in BP, at any age', () => {
    fc.assert(
      fc.property(fc.double({ min: -60, max: 1e6, noNaN: true }), (years) => {
        expect(age(years, 'yr BP') - age(years, 'yr b2k')).toBeCloseTo(0.05, 8);
      }),
    );
  });

  test('a calendar year and the years before 1950 name the same moment', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 2100 }), (year) => {
        expect(age(year, 'year CE')).toBe(age(1950 - year, 'yr BP'));
      }),
    );
  });
});
