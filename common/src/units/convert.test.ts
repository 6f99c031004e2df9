import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type Conversion, convertTo, UNIT_KINDS, type UnitKind } from './convert';
import { isUnitProblem, type UnitProblem } from './unit';

const factorOf = (kind: UnitKind, text: string): number => {
  const result = convertTo(kind, text);
  if (isUnitProblem(result)) throw new Error(result.message);
  return result.factor;
};

// Factors by hand from the SI and a Julian year of 365.25 days (31 557 600 s).
const FLUXES: [string, number][] = [
  ['g m-2 yr-1', 1],
  ['g/m2/a', 1],
  ['g/m²/yr', 1],
  ['mg m^-2 d^-1', 0.36525],
  ['mg m-2 d-1', 0.36525],
  ['mg·m⁻²·d⁻¹', 0.36525],
  ['g cm-2 kyr-1', 10],
  ['g cm−2 ka−1', 10],
  ['mg/cm2/kyr', 0.01],
  ['\u00b5g/m²/yr', 1e-6],
  ['\u03bcg m⁻² a⁻¹', 1e-6],
  ['ug/m2/yr', 1e-6],
  ['kg m-2 s-1', 31557600000],
  ['g.m-2.yr-1', 1],
  ['g m -2 yr -1', 1],
  ['gm-2yr-1', 1],
  ['mgm-2d-1', 0.36525],
  ['g_m2_yr', 1],
  ['g/(m2 yr)', 1],
  ['g/m2 yr', 1],
  ['[mg m-2 yr-1]', 1e-3],
  ['x 10-3 g m-2 yr-1', 1e-3],
  ['10⁻³ g m⁻² yr⁻¹', 1e-3],
  ['mg m$^{-2}$ yr$^{-1}$', 1e-3],
  ['g m<sup>-2</sup> yr<sup>-1</sup>', 1],
  ['kg/m**2/year', 1000],
  ['t ha-1 yr-1', 100],
  ['mg dust m-2 yr-1', 1e-3],
  ['grams per square metre per year', 1],
  ['Gramm pro Quadratmeter und Jahr', 1],
  ['g par m2 par an', 1],
  ['g por m2 por año', 1],
];

describe('units as people type them', () => {
  test.each(FLUXES)('the flux unit %s has its factor to g m-2 yr-1', (text, factor) => {
    expect(factorOf('massFlux', text) / factor).toBeCloseTo(1, 12);
  });

  test.each([
    ['concentration', 'ng/g', 1],
    ['concentration', 'µg kg-1', 1],
    ['concentration', 'ppb', 1],
    ['concentration', 'mg/kg', 1000],
    ['concentration', 'ng/mL', 1],
    ['accumulation', 'kg m-2 yr-1', 1],
    ['accumulation', 'cm w.e. yr-1', 10],
    ['accumulation', 'm ice eq. a-1', 917],
    ['density', 'g/cc', 1],
    ['density', 'kg m-3', 1e-3],
    ['sedimentationRate', 'cm/kyr', 1],
    ['sedimentationRate', 'mm/a', 100],
    ['massFraction', '%', 0.01],
    ['massFraction', 'wt.%', 0.01],
    ['massFraction', 'per cent', 0.01],
    ['length', 'mbsf', 1],
    ['angle', '°', 1],
    ['wavelength', 'µm', 1000],
    ['duration', 'Ma', 1000],
    ['massExtinction', 'm2/kg', 1e-3],
    ['moleFractionPpm', 'ppmv', 1],
    ['moleFractionPpm', 'µmol/mol', 1],
    ['moleFractionPpm', 'ppb', 1e-3],
    ['moleFractionPpb', 'nmol mol-1', 1],
    ['moleFractionPpb', 'ppm by volume', 1000],
    ['temperature', 'K', 1],
    ['temperature', '°F', 5 / 9],
  ] as [UnitKind, string, number][])('as %s, %s has the factor %d', (kind, text, factor) => {
    expect(factorOf(kind, text) / factor).toBeCloseTo(1, 12);
  });

  test.each([
    ['massFlux', 'furlong', 'unknown-unit'],
    ['massFlux', 'wrong units!', 'unknown-unit'],
    ['massFlux', '', 'empty-unit'],
    ['massFlux', 'ng/g', 'not-convertible'],
    ['massFlux', '1s', 'not-convertible'],
    ['massFlux', 'MG M-2 YR-1', 'ambiguous-unit'],
    ['accumulation', 'm/yr', 'not-convertible'],
  ] as [UnitKind, string, string][])(
    'as %s, "%s" is refused as %s and the message names it',
    (kind, text, code) => {
      const result = convertTo(kind, text) as UnitProblem;
      expect(result.code).toBe(code);
      expect(result.message).toContain(text === '' ? 'No unit' : text.split(' ')[0]);
      expect(result.message).toContain('wanted');
    },
  );

  test('temperatures meet at the fixed points: 0 °C and 32 °F are 273.15 K, −40 °C is −40 °F', () => {
    const kelvin = (value: number, unit: string): number => {
      const { factor, offset } = convertTo('temperature', unit) as Conversion;
      return value * factor + offset;
    };
    expect(kelvin(0, '°C')).toBeCloseTo(273.15, 9);
    expect(kelvin(32, '°F')).toBeCloseTo(273.15, 9);
    expect(kelvin(-40, 'deg C')).toBeCloseTo(kelvin(-40, 'Fahrenheit'), 9);
    expect((convertTo('temperature', 'ng/g') as UnitProblem).code).toBe('unknown-unit');
  });

  test('the explanation shows the factor and what was assumed', () => {
    expect((convertTo('massFlux', 'mg m-2 d-1') as Conversion).explanation).toBe(
      'mg m-2 d-1 × 0.36525 = g m-2 yr-1',
    );
    expect((convertTo('massFlux', 'g/m2 yr') as Conversion).explanation).toContain('everything after "/"');
  });

  test('each canonical unit converts to itself with the factor 1', () => {
    for (const kind of Object.keys(UNIT_KINDS) as UnitKind[])
      expect(factorOf(kind, UNIT_KINDS[kind].canonical), kind).toBe(1);
  });
});

describe('unit strings put together from parts', () => {
  const mass = fc.constantFrom(['g', 1], ['mg', 1e-3], ['µg', 1e-6], ['kg', 1e3], ['ng', 1e-9]);
  const area = fc.constantFrom(['m', 1], ['cm', 1e-4], ['km', 1e6]);
  const time = fc.constantFrom(
    ['yr', 1],
    ['a', 1],
    ['kyr', 1e3],
    ['ka', 1e3],
    ['d', 1 / 365.25],
    ['s', 1 / 31557600],
  );
  const spelling = fc.constantFrom(
    (m: string, l: string, t: string) => `${m} ${l}-2 ${t}-1`,
    (m: string, l: string, t: string) => `${m}/${l}2/${t}`,
    (m: string, l: string, t: string) => `${m} ${l}^-2 ${t}^-1`,
    (m: string, l: string, t: string) => `${m}·${l}⁻²·${t}⁻¹`,
    (m: string, l: string, t: string) => `${m}/(${l}² ${t})`,
    (m: string, l: string, t: string) => `${m} per ${l}2 per ${t}`,
  );

  test('every spelling of the same unit has the same factor, the product of its parts', () => {
    fc.assert(
      fc.property(mass, area, time, spelling, (m, l, t, spell) => {
        const expected = (m[1] as number) / (l[1] as number) / t[1];
        expect(factorOf('massFlux', spell(String(m[0]), String(l[0]), String(t[0]))) / expected).toBeCloseTo(
          1,
          12,
        );
      }),
    );
  });

  test('a value taken to the canonical unit and back is the same value', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e6, noNaN: true }), mass, time, (value, m, t) => {
        const factor = factorOf('massFlux', `${m[0]} m-2 ${t[0]}-1`);
        expect((value * factor) / factor / value).toBeCloseTo(1, 12);
      }),
    );
  });

  test('no text makes the parser throw or answer a factor that is not finite', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 30 }), (text) => {
        const result = convertTo('massFlux', text);
        expect(isUnitProblem(result) || Number.isFinite(result.factor)).toBe(true);
      }),
      { numRuns: 500 },
    );
  });
});
