import { describe, expect, test } from 'vitest';
import { DomainError } from '../physical/domain-error';
import { datasetKind } from '../dataset/kinds';
import { readableKind } from '../dataset/record-kinds';
import type {
  BackdropTableRow,
  GasRecordRow,
  GriddedFieldRow,
  OpticalSetRow,
  RecordRow,
  RefractiveIndexRow,
} from '../dataset/record-row';
import { sheetOfValues, textWorkbook } from './fixtures.test-support';
import type { RawSheet, RawWorkbook } from './grid';
import { normaliseRecords } from './normalise-records';
import { normaliseWorkbook } from './normalise';
import { proposeWorkbook } from './propose';

const dust = datasetKind('dust-flux');
const book = (...sheets: RawSheet[]): RawWorkbook => ({
  fileName: 'made.xlsx',
  format: 'xlsx',
  sheets,
  readNotes: [],
});
function records<T extends RecordRow>(workbook: RawWorkbook, id: string): T[] {
  const kind = readableKind(id);
  return normaliseRecords(workbook, kind, proposeWorkbook(workbook, kind)).rows as T[];
}

describe('kinds of records', () => {
  test('a grid in long form gives a row a cell, with the unit of its column and folded longitudes', () => {
    const rows = records<GriddedFieldRow>(
      textWorkbook(
        'lat,lon,month,Dust deposition (g m-2 yr-1)\n-45,0,1,0.5\n-45,270,Feb,0.6\n45,0,annual,-999',
      ),
      'gridded-field',
    );
    expect(rows).toMatchObject([
      {
        latitudeDeg: -45,
        longitudeDeg: 0,
        month: 1,
        gridValue: 0.5,
        quantity: 'Dust deposition',
        unit: 'g m-2 yr-1',
      },
      { latitudeDeg: -45, longitudeDeg: -90, month: 2, gridValue: 0.6 },
    ]);
  });

  test('a grid as matrix gives the same rows as in long form, its column axis from the headings', () => {
    const rows = records<GriddedFieldRow>(
      book(
        sheetOfValues('grid', [
          ['Dust load (mg m-2)'],
          ['lat\\lon', 0, 120, 240],
          [-45, 1, 2, 3],
          [0, 4, null, 6],
          [45, 7, 8, 9],
        ]),
      ),
      'gridded-field',
    );
    expect(rows).toHaveLength(8);
    expect(rows[2]).toMatchObject({
      row: 3,
      latitudeDeg: -45,
      longitudeDeg: -120,
      gridValue: 3,
      quantity: 'Dust load',
      unit: 'mg m-2',
    });
    expect(
      rows.find(({ latitudeDeg, longitudeDeg }) => latitudeDeg === 45 && longitudeDeg === 0)?.gridValue,
    ).toBe(7);
    expect(rows[2]!.cells.gridValue).toMatchObject({ cell: 'D3', raw: '3' });
  });

  test('a matrix with longitudes down and latitudes across is told by its corner', () => {
    const rows = records<GriddedFieldRow>(
      book(
        sheetOfValues('grid', [
          ['lon / lat', -45, 0, 45],
          [0, 1, 4, 7],
          [120, 2, 5, 8],
        ]),
      ),
      'gridded-field',
    );
    expect(rows[0]).toMatchObject({ longitudeDeg: 0, latitudeDeg: -45, gridValue: 1 });
    expect(rows.at(-1)).toMatchObject({ longitudeDeg: 120, latitudeDeg: 45, gridValue: 8 });
  });

  test('a backdrop table by band and month is brought to fractions and kelvin', () => {
    const rows = records<BackdropTableRow>(
      textWorkbook(
        'lat south;lat north;month;albedo;cloud cover (%);temperature (°C)\n-90;-80;1;0.84;59;-28.5\n-80;-70;1;0.77;65;-20',
        ';',
      ),
      'backdrop-table',
    );
    expect(rows[0]).toMatchObject({
      latitudeSouthDeg: -90,
      latitudeNorthDeg: -80,
      month: 1,
      surfaceAlbedo: 0.84,
      cloudFraction: 0.59,
    });
    expect(rows[0]!.temperatureK).toBeCloseTo(244.65, 9);
  });

  test('a backdrop table of regions by months takes what it holds from its title', () => {
    const rows = records<BackdropTableRow>(
      book(
        sheetOfValues('2021', [
          ['Cloud cover (%)'],
          ['Region', 'Jan', 'Feb', 'Mar'],
          ['SAH', 20, 30, 40],
          ['EAN', 60, 61, 62],
        ]),
      ),
      'backdrop-table',
    );
    expect(rows).toHaveLength(6);
    expect(rows[1]).toMatchObject({ region: 'SAH', month: 2, cloudFraction: 0.3, surfaceAlbedo: null });
  });

  test('the imaginary part is kept as magnitude, whichever sign convention, and its rule says so', () => {
    const rows = records<RefractiveIndexRow>(
      textWorkbook('wavelength (µm),n,k\n0.55,1.53,-0.0055\n0.67,1.53,-0.0045'),
      'refractive-index',
    );
    expect(rows[0]).toMatchObject({ wavelengthNm: 550, realPart: 1.53, imaginaryPart: 0.0055 });
    expect(rows[0]!.cells.imaginaryPart?.rule).toContain('|k|');
    expect(rows[0]!.cells.imaginaryPart?.raw).toBe('-0.0055');
  });

  test('an optical set takes efficiency, albedo and asymmetry, each with its unit', () => {
    const rows = records<OpticalSetRow>(
      textWorkbook(
        'species,wavelength (nm),MEE (m2/kg),SSA,g\ndust,550,600,0.95,0.72\ndust,870,550,0.97,0.7',
      ),
      'optical-set',
    );
    expect(rows[0]).toMatchObject({
      aerosolSpecies: 'dust',
      massExtinctionM2G: 0.6,
      singleScatteringAlbedo: 0.95,
      asymmetry: 0.72,
    });
  });

  test('a gas record takes three gases, their errors and the datum of the age', () => {
    const rows = records<GasRecordRow>(
      textWorkbook(
        'gas age (yr b2k),CO2 (ppm),CO2 error,CH4 (ppb),N2O (nmol/mol)\n1050,280.5,1.2,690,265\n2050,279 ± 2,,,0.264 ppm',
      ),
      'gas-record',
    );
    expect(rows[0]).toMatchObject({ ageKaBp: 1, co2Ppm: 280.5, co2SigmaPpm: 1.2, ch4Ppb: 690, n2oPpb: 265 });
    expect(rows[1]).toMatchObject({ ageKaBp: 2, co2Ppm: 279, co2SigmaPpm: 2, ch4Ppb: null, n2oPpb: 264 });
  });

  test('a kind of samples is refused by the reader of records, which names it', () => {
    expect(() => normaliseRecords(book(), dust, { tables: [], columns: [], constants: [] })).toThrow(
      DomainError,
    );
  });
});

describe('layouts of samples', () => {
  const read = (workbook: RawWorkbook) => {
    const mapping = proposeWorkbook(workbook, dust);
    return { mapping, rows: normaliseWorkbook(workbook, dust, mapping).rows };
  };
  const turned = sheetOfValues('Sheet1', [
    ['Compilation of an invented transect'],
    ['Site', null, 'North', 'South', 'East'],
    ['Lat', '°', 70.5, -70.5, 10.25],
    ['Lon', '°', 10.5, 20.5, 30.25],
    ['Age', 'ka BP', 1, 2, 3],
    ['Dust flux', 'mg/m2/yr', 500, '<20', 700],
    ['Error', 'mg/m2/yr', 50, null, 70],
  ]);

  test('a table whose fields run down the first column is recognised with its reason and read turned', () => {
    const { mapping, rows } = read(book(turned));
    expect(mapping.tables).toMatchObject([{ firstRow: 2, lastRow: 7, used: true }]);
    expect(mapping.tables[0]?.reason).toContain('Turned: the fields run down column A');
    expect(
      rows.map(({ site, latitudeDeg, ageKaBp, fluxGM2Yr, fluxSigmaGM2Yr }) => [
        site,
        latitudeDeg,
        ageKaBp,
        fluxGM2Yr,
        fluxSigmaGM2Yr,
      ]),
    ).toEqual([
      ['North', 70.5, 1, 0.5, 0.05],
      ['South', -70.5, 2, null, null],
      ['East', 10.25, 3, 0.7, 0.07],
    ]);
  });

  test('values and mends of a turned table keep the addresses of the sheet', () => {
    const workbook = book(turned);
    const mapping = proposeWorkbook(workbook, dust);
    const mend = { sheet: 'Sheet1', row: 6, column: 'D', text: '30' };
    const { rows } = normaliseWorkbook(workbook, dust, mapping, [mend]);
    expect(rows[0]!.cells.fluxGM2Yr?.cell).toBe('C6');
    expect(rows[1]!.cells.fluxGM2Yr).toMatchObject({ cell: 'D6', raw: '<20', mended: '30' });
    expect(rows[1]!.fluxGM2Yr).toBeCloseTo(0.03, 12);
  });

  const beside = (titles: (string | number | null)[][]) =>
    sheetOfValues('Sheet1', [
      ...titles,
      ['Age (ka BP)', 'Dust flux (g/m2/yr)', null, 'Age (ka BP)', 'Dust flux (g/m2/yr)'],
      [1, 0.5, null, 10, 5],
      [2, 0.6, null, 11, 6],
      [null, null, null, 12, 7],
    ]);

  test.each([
    [
      'labels',
      [
        ['Site', 'North', null, 'Site', 'South'],
        ['Lat', 70.5, null, 'Lat', -70.5],
        ['Lon', 10.5, null, 'Lon', 20.5],
      ],
    ],
    ['titles with positions', [['North (70.5°N, 10.5°E)', null, null, 'South (70.5°S, 20.5°E)']]],
  ] as [string, (string | number | null)[][]][])(
    'two sites side by side under %s are two tables',
    (_how, titles) => {
      const { mapping, rows } = read(book(beside(titles)));
      expect(mapping.tables.map(({ used }) => used)).toEqual([true, true]);
      expect(mapping.tables[1]?.reason).toContain('side by side: columns D–E');
      expect(
        rows.map(({ site, latitudeDeg, ageKaBp, fluxGM2Yr }) => [site, latitudeDeg, ageKaBp, fluxGM2Yr]),
      ).toEqual([
        ['North', 70.5, 1, 0.5],
        ['North', 70.5, 2, 0.6],
        ['South', -70.5, 10, 5],
        ['South', -70.5, 11, 6],
        ['South', -70.5, 12, 7],
      ]);
    },
  );

  test('blocks without a place of their own stay versions of one table, of which one is taken', () => {
    const { mapping, rows } = read(book(beside([['EDC, two age models']])));
    expect(mapping.tables).toHaveLength(1);
    expect(rows.map(({ ageKaBp }) => ageKaBp)).toEqual([1, 2, null]);
  });

  test('the datum of ages that the notes sheet states in prose is applied with its reason', () => {
    const { mapping, rows } = read(
      book(
        sheetOfValues('READ ME', [['Fluxes of one core. All ages are in years b2k (before 2000 CE).']]),
        sheetOfValues('Core X', [
          ['Age (kyr)', 'Dust flux (g/m2/yr)'],
          [1.05, 0.5],
          [2.05, 0.6],
        ]),
      ),
    );
    expect(rows[0]!.ageKaBp).toBeCloseTo(1, 9);
    expect(mapping.columns[0]?.reason).toContain('sheet "READ ME" says: "All ages are in years b2k');
  });

  test('a datum in the heading goes before the prose, and prose that names two is not followed', () => {
    const note = (text: string) => sheetOfValues('READ ME', [[text]]);
    const core = (unit: string) =>
      sheetOfValues('Core X', [
        [`Age (${unit})`, 'Dust flux (g/m2/yr)'],
        [1, 0.5],
        [2, 0.6],
      ]);
    expect(read(book(note('All ages are in b2k.'), core('ka BP'))).rows[0]!.ageKaBp).toBe(1);
    expect(
      read(book(note('Old ages are in b2k. New ages are in BP.'), core('ka'))).mapping.columns[0],
    ).toMatchObject({ unit: 'ka' });
  });
});
