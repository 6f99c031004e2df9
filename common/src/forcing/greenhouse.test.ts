import { expect, test } from 'vitest';
import { checkTable, numberIn } from '../../test/check-table';
import { calculateGreenhouse, type GreenhouseFormula, type GreenhouseRequest } from './greenhouse';

const lgm: GreenhouseRequest = {
  co2Ppm: 190,
  ch4Ppb: 375,
  n2oPpb: 200,
  reference: { co2Ppm: 284.3, ch4Ppb: 808.2, n2oPpb: 273 },
  formula: 'meinshausen2020',
};

// Independent evaluation, 10 digits printed, compared there with a public library to 5e-10 W m⁻².
test('three formulas equal independent values for every case and baseline', () => {
  for (const row of checkTable('general/ghg_forcing.csv')) {
    const answer = calculateGreenhouse({
      co2Ppm: numberIn(row, 'co2_ppm'),
      ch4Ppb: numberIn(row, 'ch4_ppb'),
      n2oPpb: numberIn(row, 'n2o_ppb'),
      reference: {
        co2Ppm: numberIn(row, 'co2_0_ppm'),
        ch4Ppb: numberIn(row, 'ch4_0_ppb'),
        n2oPpb: numberIn(row, 'n2o_0_ppb'),
      },
      formula: row.scheme as GreenhouseFormula,
    });
    const label = `${row.scheme} ${row.baseline} ${row.case}`;
    expect(Math.abs(answer.co2Wm2 - numberIn(row, 'forcing_co2_W_m2')), label).toBeLessThan(1e-8);
    expect(Math.abs(answer.ch4Wm2 - numberIn(row, 'forcing_ch4_W_m2')), label).toBeLessThan(1e-8);
    expect(Math.abs(answer.n2oWm2 - numberIn(row, 'forcing_n2o_W_m2')), label).toBeLessThan(1e-8);
    expect(Math.abs(answer.totalWm2 - numberIn(row, 'forcing_total_W_m2')), label).toBeLessThan(1e-8);
  }
});

test('glacial gases against pre-industrial ones give −2.76 W m⁻², and none against themselves', () => {
  expect(calculateGreenhouse(lgm).totalWm2).toBeCloseTo(-2.757, 3);
  for (const formula of ['myhre1998', 'etminan2016', 'meinshausen2020'] as const) {
    expect(
      Math.abs(calculateGreenhouse({ ...lgm.reference, reference: lgm.reference, formula }).totalWm2),
    ).toBe(0);
  }
});

test('gases outside the range of the fit of 2016 carry a caution that names them', () => {
  expect(calculateGreenhouse({ ...lgm, formula: 'etminan2016' }).cautions).toEqual([]);
  const low = calculateGreenhouse({ ...lgm, co2Ppm: 170, formula: 'etminan2016' });
  expect(low.cautions).toHaveLength(1);
  expect(low.cautions[0]!.message).toContain('co2Ppm leaves 180 to 2000 ppm');
});

test('a missing gas of the reference and an unknown formula are refused by name', () => {
  const { n2oPpb: _, ...partial } = lgm.reference;
  expect(() => calculateGreenhouse({ ...lgm, reference: partial as typeof lgm.reference })).toThrow(
    /reference.n2oPpb is missing/,
  );
  expect(() => calculateGreenhouse({ ...lgm, formula: 'guess' as GreenhouseFormula })).toThrow(
    /formula is guess; it must be one of/,
  );
  expect(() => calculateGreenhouse({ ...lgm, co2Ppm: 0 })).toThrow(/co2Ppm is 0 ppm/);
});
