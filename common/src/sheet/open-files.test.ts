import { expect, test } from 'vitest';
import { datasetKind } from '../dataset/kinds';
import { readableKind } from '../dataset/record-kinds';
import type { AgeSeriesRow, GasRecordRow, RecordRow, RefractiveIndexRow } from '../dataset/record-row';
import { sampleText } from './fixtures.test-support';
import type { RawWorkbook } from './grid';
import type { Mapping } from './mapping';
import { normaliseRecords } from './normalise-records';
import { normaliseWorkbook } from './normalise';
import { proposeWorkbook } from './propose';

/** As the upload reader cuts files whose columns are aligned with blanks. */
const TWO_BLANKS = /\s{2,}|\t/;
const ONE_BLANK = /\s+/;

const open = (name: string, delimiter: string | RegExp, encoding: 'latin1' | 'utf8' = 'utf8') =>
  sampleText(`open/${name}`, delimiter, encoding);

function records<T extends RecordRow>(workbook: RawWorkbook, id: string): { rows: T[]; mapping: Mapping } {
  const kind = readableKind(id);
  const mapping = proposeWorkbook(workbook, kind);
  return { rows: normaliseRecords(workbook, kind, mapping).rows as T[], mapping };
}

const samples = (workbook: RawWorkbook, id: string) => {
  const kind = datasetKind(id);
  const mapping = proposeWorkbook(workbook, kind);
  return { rows: normaliseWorkbook(workbook, kind, mapping).rows, mapping };
};

// Every value below was read off the named file by eye, at the row the test names.

test('the LR04 stack (Lisiecki and Raymo 2005) is read as ages with isotope values and their errors', () => {
  const { rows } = records<AgeSeriesRow>(open('LR04stack.txt', '\t'), 'age-series');
  expect(rows).toHaveLength(2115);
  expect(rows[0]).toMatchObject({
    row: 6,
    quantity: 'Benthic d18O',
    unit: 'per mil',
    ageKaBp: 0,
    seriesValue: 3.23,
    seriesSigma: 0.03,
  });
  expect(rows[18]).toMatchObject({ row: 24, ageKaBp: 18, seriesValue: 5.02, seriesSigma: 0.03 });
  expect(rows.at(-1)).toMatchObject({ ageKaBp: 5320 });
});

test('of the four tables of the Dome C file (Lambert et al. 2008) the two of dust in ice are read, with the position in words', () => {
  const { rows, mapping } = samples(open('edc-dust2008.txt', TWO_BLANKS, 'latin1'), 'dust-flux');
  expect(mapping.tables.map(({ firstRow, lastRow, used }) => [firstRow, lastRow, used])).toEqual([
    [100, 5854, true],
    [5869, 7029, true],
    [7042, 7435, false],
    [7448, 7637, false],
  ]);
  expect(rows[0]).toMatchObject({
    ...{ row: 100, site: 'EPICA Dome C', latitudeDeg: -75.1, longitudeDeg: 123.35, elevationM: 3233 },
    ...{ depthM: 24.2, ageKaBp: 0.371, concentrationNgG: 22.5, fluxGM2Yr: null },
  });
  expect(rows[2]!.cells.concentrationNgG).toMatchObject({ raw: 'NaN', value: null, rule: 'missing code' });
  expect(rows.find(({ row }) => row === 5869)).toMatchObject({
    site: 'EPICA Dome C',
    depthM: 11.8269,
    ageKaBp: 0.124,
    concentrationNgG: 13.8594,
  });
});

test('as a record by age all four tables of the Dome C file are read, each under its own name', () => {
  const { rows } = records<AgeSeriesRow>(open('edc-dust2008.txt', TWO_BLANKS, 'latin1'), 'age-series');
  const byName = (name: string) => rows.filter(({ quantity }) => quantity === name);
  expect(byName('CCFPP(norm)')[0]).toMatchObject({ row: 7448, ageKaBp: 3.117, seriesValue: -2.9618 });
  expect(byName('LaserFPP(norm)')[0]).toMatchObject({ row: 7042, ageKaBp: 44.431, seriesValue: 0.883178788 });
  expect(byName('CCDust')[0]).toMatchObject({ unit: 'ng/g', seriesValue: 13.8594 });
  expect(byName('LaserDust')).toHaveLength(5755 - 592);
});

test('the composite of carbon dioxide (Bereiter et al. 2015) keeps negative gas ages and its sigma', () => {
  const { rows } = records<GasRecordRow>(open('data_antarctica2015co2.txt', '\t'), 'gas-record');
  expect(rows).toHaveLength(1901);
  expect(rows[0]).toMatchObject({
    row: 16,
    ageKaBp: -0.05103,
    co2Ppm: 368.02,
    co2SigmaPpm: 0.06,
    ch4Ppb: null,
  });
  expect(rows[1]).toMatchObject({ ageKaBp: -0.048, co2Ppm: 361.78, co2SigmaPpm: 0.37 });
});

test('ages of the Greenland table (after Rasmussen et al. 2014) are b2k because its second line says so', () => {
  const { rows, mapping } = records<AgeSeriesRow>(open('GIS_table.txt', '\t'), 'age-series');
  const age = mapping.columns.find(({ field }) => field === 'ageKaBp');
  expect(age).toMatchObject({ unit: 'yr b2k' });
  expect(age?.reason).toContain('Cell A2 of sheet "GIS_table" says: "All ages are given in b2k"');
  expect(rows).toHaveLength(23);
  // 11703 b2k is 11653 before 1950; the counting error is a span of time and not shifted.
  expect(rows[0]).toMatchObject({ event: 'Holocene', quantity: 'event', ageKaBp: 11.653, ageSigmaKa: 0.099 });
  expect(rows[1]).toMatchObject({ event: 'GI-1e', ageKaBp: 14.642 });
});

test('the decadal means of NGRIP (Erhardt et al. 2019) take units and datum from the lines above the table', () => {
  const workbook = open('NGRIP_10yr.csv', ',');
  const { rows } = records<AgeSeriesRow>(workbook, 'age-series');
  const at = (row: number, name: string) => rows.find((one) => one.row === row && one.quantity === name);
  expect(at(19, 'lt')).toMatchObject({ ageKaBp: 10.155, seriesValue: 0.077, unit: 'm' });
  expect(at(19, 'Ca')).toBeUndefined();
  expect(at(28, 'Ca')).toMatchObject({ ageKaBp: 10.245, seriesValue: 10.72975, unit: 'ng/g' });
  expect(at(28, 'd18O')).toMatchObject({ seriesValue: -35.65385, unit: 'permille' });
  const [table] = samples(workbook, 'dust-flux').mapping.tables;
  expect(table).toMatchObject({ used: false });
  expect(table?.reason).toContain('concentrations (Na, Ca)');
});

test('of the sun-photometer file (AERONET, Mauna Loa) the depth with values nearest 550 nm is read with its place', () => {
  const { rows } = samples(open('aeronet-AOD15-first60rows.txt', ','), 'point-optical-depth');
  expect(rows).toHaveLength(60);
  expect(rows[0]).toMatchObject({
    row: 7,
    site: 'Mauna_Loa',
    latitudeDeg: 19.536006,
    longitudeDeg: -155.576755,
    elevationM: 3402,
  });
  expect(rows[0]!.cells).toMatchObject({
    aod: { cell: 'T7', value: 0.011728 },
    wavelengthNm: { value: 500 },
    angstromExponent: { value: 0.695596 },
    date: { value: '01:06:2000' },
  });
});

test.each([
  ['du_ri_table_Woodward.txt', TWO_BLANKS, 31, { wavelengthNm: 200, realPart: 1.53, imaginaryPart: 0.08 }],
  ['du_ri_table_composite.txt', TWO_BLANKS, 26, { wavelengthNm: 200, realPart: 1.55, imaginaryPart: 0.005 }],
  [
    'ss_ri_table.txt',
    ONE_BLANK,
    732,
    { wavelengthNm: 250, realPart: 1.51, imaginaryPart: 5e-6, humidityClass: '1' },
  ],
] as const)('the refractive index of %s is brought from metres to nm', (name, delimiter, count, first) => {
  const { rows } = records<RefractiveIndexRow>(open(name, delimiter), 'refractive-index');
  expect(rows).toHaveLength(count);
  expect(rows[0]).toMatchObject(first);
});
