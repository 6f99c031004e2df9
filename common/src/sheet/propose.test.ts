import * as fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { DATASET_KINDS, datasetKind } from '../dataset/kinds';
import { isRecordKind, RECORD_KINDS } from '../dataset/record-kinds';
import { sampleText, sampleWorkbook, sheetOfValues, textWorkbook } from './fixtures.test-support';
import type { RawSheet, RawWorkbook } from './grid';
import { normaliseRecords } from './normalise-records';
import { normaliseWorkbook } from './normalise';
import { proposeWorkbook } from './propose';

const dust = datasetKind('dust-flux');
const propose = (workbook: RawWorkbook) => proposeWorkbook(workbook, dust);
const book = (...sheets: RawSheet[]): RawWorkbook => ({
  fileName: 'made.xlsx',
  format: 'xlsx',
  sheets,
  readNotes: [],
});
const fieldsOf = (workbook: RawWorkbook, sheet?: string) =>
  Object.fromEntries(
    propose(workbook)
      .columns.filter((one) => sheet === undefined || one.sheet === sheet)
      .map((one) => [one.column, one.field]),
  );

describe('the ice-core workbook', () => {
  const workbook = sampleWorkbook('A_EDC_NGRIP_dust_v3_final.xlsx');
  const mapping = propose(workbook);
  const tableOf = (sheet: string) => mapping.tables.find((one) => one.sheet === sheet);

  test('tables are found between header rows, units row, mean row and footnote', () => {
    expect(tableOf('EDC')).toMatchObject({
      headerRows: [4, 5, 6],
      unitsRow: 6,
      firstRow: 7,
      lastRow: 155,
      used: true,
    });
    expect(tableOf('NGRIP')).toMatchObject({
      headerRows: [3, 4],
      unitsRow: 4,
      firstRow: 5,
      lastRow: 103,
      used: true,
    });
  });

  test('notes and the superseded sheet are left alone, with the reason quoted', () => {
    expect(tableOf('READ ME')).toMatchObject({ used: false, reason: 'Notes: no table of numbers.' });
    expect(tableOf('old calc')?.used).toBe(false);
    expect(tableOf('old calc')?.reason).toContain('is superseded, please ignore');
    expect(tableOf('old calc')?.reason).toContain('wrong units!');
  });

  test('merged headings reach their columns and each column is taken for what it is', () => {
    expect(
      mapping.columns
        .filter((one) => one.sheet === 'EDC')
        .map((one) => [one.column, one.heading, one.field, one.unit]),
    ).toEqual([
      ['A', 'Age', 'ageKaBp', 'ka BP'],
      ['B', 'Samples n', 'sampleCount', null],
      ['C', 'Dust in ice mean', 'concentrationNgG', 'ng/g'],
      ['D', 'Dust in ice s.d.', null, 'ng/g'],
      ['E', 'Accumulation', 'accumulationKgM2Yr', 'kg m-2 yr-1'],
      ['F', 'Dust flux mean', 'fluxGM2Yr', 'mg m-2 yr-1'],
      ['G', 'Dust flux error', 'fluxSigmaGM2Yr', 'mg m-2 yr-1'],
    ]);
    expect(fieldsOf(workbook, 'NGRIP')).toMatchObject({
      A: 'ageKaBp',
      B: null,
      C: null,
      E: null,
      F: 'fluxGM2Yr',
      G: 'fluxSigmaGM2Yr',
      H: 'remark',
    });
  });

  test('positions above the tables and names of the sheets become constants with their cells', () => {
    const constants = mapping.constants.map(({ sheet, field, text, cell }) => [sheet, field, text, cell]);
    expect(constants).toContainEqual(['EDC', 'latitudeDeg', "75°06'S", 'B2']);
    expect(constants).toContainEqual(['EDC', 'longitudeDeg', "123°21'E", 'D2']);
    expect(constants).toContainEqual(['EDC', 'elevationM', '3233', 'F2']);
    expect(constants).toContainEqual(['NGRIP', 'latitudeDeg', '75.1', 'G1']);
    expect(constants).toContainEqual(['EDC', 'site', 'EDC', null]);
  });
});

test('German headings, units inside them, and an error column without a unit are understood', () => {
  const mapping = propose(sampleText('B_Staubfluesse_Export.csv', ';', 'latin1'));
  expect(mapping.tables[0]).toMatchObject({
    headerRows: [4],
    unitsRow: null,
    firstRow: 5,
    lastRow: 22,
    used: true,
  });
  expect(mapping.columns.map((one) => [one.field, one.unit])).toEqual([
    ['site', null],
    ['latitudeDeg', '°'],
    ['longitudeDeg', '°'],
    ['ageKaBp', 'a v. 1950'],
    ['fluxGM2Yr', 'mg m-2 d-1'],
    ['fluxSigmaGM2Yr', 'mg m-2 d-1'],
    ['remark', null],
  ]);
});

test('of two blocks side by side the revised one is taken, tracers keep their names, sea salt is left out', () => {
  const mapping = propose(sampleWorkbook('wolff2006edc-chem.xls'));
  const used = mapping.columns.filter((one) => one.sheet === 'byAge' && one.field !== null);
  expect(used.map((one) => [one.column, one.field, one.quantity])).toEqual([
    ['G', 'ageKaBp', undefined],
    ['H', 'fluxGM2Yr', 'nssCa'],
    ['I', 'fluxGM2Yr', 'Fe'],
  ]);
  expect(mapping.tables.find((one) => one.sheet === 'byDepth')?.reason).toContain(
    'concentrations (Na, Ca, SO4)',
  );
});

describe('headings of other hands', () => {
  test.each([
    ['French', 'Carotte;Latitude;Longitude;Âge (ka BP);Flux de poussière (g/m2/an);Incertitude;Remarques'],
    ['Spanish', 'Sitio;Latitud;Longitud;Edad (ka BP);Flujo de polvo (g/m2/año);Incertidumbre;Observaciones'],
    ['English', 'Core ID;Lat. (°N);Long. (°E);Age [cal kyr BP];Dust MAR [g/m²/yr];1σ;Comments'],
    ['column names', 'site;lat;lon;age_ka_BP;dust_flux_g_m2_yr;uncertainty_g_m2_yr;remark'],
    ['canonical names', 'site;latitude;longitude;age (ka BP);dust flux, g m-2 yr-1;± ;note'],
  ])('%s headings are proposed alike', (_language, headings) => {
    const workbook = textWorkbook(
      `${headings}\nA;45.25;12.5;20.5;1.5;0.2;x\nB;46.25;13.5;21.5;1.6;0.2;y`,
      ';',
    );
    expect(Object.values(fieldsOf(workbook))).toEqual([
      'site',
      'latitudeDeg',
      'longitudeDeg',
      'ageKaBp',
      'fluxGM2Yr',
      'fluxSigmaGM2Yr',
      'remark',
    ]);
  });

  test('an age error goes to the age, a top age is a bound, a total accumulation rate is no dust', () => {
    const workbook = textWorkbook(
      'Core,Top age (ka BP),Age (ka BP),Age error,Total MAR (g/m2/yr),Dust flux (g/m2/yr),Error\nA,1,2,0.1,30,3,0.1\nA,2,3,0.1,30,3,0.1',
    );
    expect(fieldsOf(workbook)).toEqual({
      A: 'site',
      B: 'ageYoungKaBp',
      C: 'ageKaBp',
      D: 'ageSigmaKa',
      E: null,
      F: 'fluxGM2Yr',
      G: 'fluxSigmaGM2Yr',
    });
  });

  test('the error of a calcium flux goes with it and is not taken for the dust flux’s', () => {
    const workbook = textWorkbook(
      'Age (ka BP),Ca flux (g/m2/yr),Ca flux error,Dust flux (g/m2/yr)\n1,2,0.1,10\n2,3,0.1,15',
    );
    expect(fieldsOf(workbook)).toEqual({ A: 'ageKaBp', B: null, C: null, D: 'fluxGM2Yr' });
  });
});

describe('layouts', () => {
  const head = ['Age (ka BP)', 'Dust flux (g/m2/yr)'];

  test('two tables of one sheet are both read, each with the position above it', () => {
    const sheet = sheetOfValues('Cores', [
      ['Site', 'North', 'Lat', 70.5, 'Lon', 10.5],
      head,
      [1, 0.5],
      [2, 0.6],
      [null],
      ['Site', 'South', 'Lat', -70.5, 'Lon', 20.5],
      head,
      [3, 0.7],
      ['mean', 0.7],
    ]);
    const mapping = propose(book(sheet));
    expect(mapping.tables.map((one) => [one.firstRow, one.lastRow, one.used])).toEqual([
      [3, 4, true],
      [8, 8, true],
    ]);
    const { rows } = normaliseWorkbook(book(sheet), dust, mapping);
    expect(rows.map((row) => [row.row, row.site, row.latitudeDeg, row.ageKaBp])).toEqual([
      [3, 'North', 70.5, 1],
      [4, 'North', 70.5, 2],
      [8, 'South', -70.5, 3],
    ]);
  });

  test('a sheet of very many tables is read up to a limit, and the rest is named', () => {
    const many = Array.from({ length: 100 }, () => [head, [1, 0.5], [2, 0.6], [null]]).flat();
    const { tables } = propose(book(sheetOfValues('Report', many)));
    expect(tables).toHaveLength(61);
    expect(tables.at(-1)).toMatchObject({ used: false, lastRow: 400 });
    expect(tables.at(-1)?.reason).toContain('more than 60 tables');
  });

  test('subtotals, sub-headings and blank rows inside a table are passed over', () => {
    const rows = [
      ['Site', ...head],
      ['A', 1, 5],
      ['mean', null, 5],
      [null],
      ['lower part'],
      ['A', 2, 6],
      ['* estimated'],
    ];
    const workbook = book(sheetOfValues('Data', rows));
    const mapping = propose(workbook);
    expect(mapping.tables).toHaveLength(1);
    expect(normaliseWorkbook(workbook, dust, mapping).rows.map((row) => row.row)).toEqual([2, 6]);
  });

  test('a sheet without a flux is left alone and says what it holds instead', () => {
    const [table] = propose(
      book(
        sheetOfValues('ions', [
          ['Depth (m)', 'Ca (ng/g)'],
          [1, 5],
          [2, 6],
        ]),
      ),
    ).tables;
    expect(table).toMatchObject({ used: false });
    expect(table?.reason).toContain('concentrations (Ca (ng/g))');
  });

  test('an empty workbook gives an empty mapping and no error', () => {
    const mapping = propose(book({ name: 'Sheet1', rows: [], columnCount: 0 }));
    expect(mapping.tables).toMatchObject([{ used: false, reason: 'The sheet is empty.' }]);
    expect(mapping.columns).toEqual([]);
  });

  test('a note that names another sheet does not set this one aside', () => {
    const notes = sheetOfValues('notes', [['The sheet "v1" is obsolete and replaced by "v2".']]);
    const mapping = propose(
      book(notes, sheetOfValues('v1', [head, [1, 5], [2, 5]]), sheetOfValues('v2', [head, [1, 5], [2, 5]])),
    );
    expect(mapping.tables.map((one) => [one.sheet, one.used])).toEqual([
      ['notes', false],
      ['v1', false],
      ['v2', true],
    ]);
  });

  test('a wavelength in the heading of an optical depth holds for its column', () => {
    const workbook = textWorkbook(
      'Site,Lat,Lon,Date,AOD_500nm\nA,1.25,2.5,2001-01,0.12\nA,1.25,2.5,2001-02,0.15',
    );
    const mapping = proposeWorkbook(workbook, datasetKind('point-optical-depth'));
    expect(mapping.constants).toMatchObject([{ field: 'wavelengthNm', text: '500', unit: 'nm' }]);
    expect(mapping.columns.at(-1)).toMatchObject({ field: 'aod' });
  });

  test('of many wavelengths the one with values nearest to 550 nm is proposed', () => {
    const workbook = textWorkbook(
      'Site,Lat,Lon,AOD_1020nm,AOD_555nm,AOD_500nm\nA,1.25,2.5,0.1,-999,0.12\nA,1.25,2.5,0.1,-999,0.15',
    );
    const mapping = proposeWorkbook(workbook, datasetKind('point-optical-depth'));
    expect(mapping.columns.filter((one) => one.field === 'aod').map((one) => one.column)).toEqual(['F']);
    expect(mapping.constants).toMatchObject([{ field: 'wavelengthNm', text: '500' }]);
  });
});

test('whatever a sheet holds, proposing and reading neither throw nor give a number that is not finite', () => {
  const word = fc.constantFrom(
    'Age',
    'Dust flux',
    'ka BP',
    'g/m2/yr',
    'mean',
    'NaN',
    '-999',
    '1,234',
    '<0.02',
    '±',
    '75°S',
    'Lat',
    '#',
    '2σ',
    '=1/0',
    'Lon',
    'Jan',
    'k',
    'CO2 (ppm)',
    'All ages are b2k.',
    'Column 1: age (ka BP)',
  );
  const value = fc.oneof(
    word,
    fc.string({ unit: 'grapheme', maxLength: 12 }),
    fc.double({ noNaN: true, noDefaultInfinity: true }),
    fc.constant(null),
  );
  const grid = fc.array(fc.array(value, { maxLength: 6 }), { maxLength: 14 });
  fc.assert(
    fc.property(grid, fc.constantFrom(...[...DATASET_KINDS, ...RECORD_KINDS]), (rows, kind) => {
      const workbook = book(sheetOfValues('Any', rows));
      const mapping = proposeWorkbook(workbook, kind);
      const read: object[] = isRecordKind(kind)
        ? normaliseRecords(workbook, kind, mapping).rows
        : normaliseWorkbook(workbook, kind, mapping).rows;
      const numbers = read.flatMap((one) => Object.values(one)).filter((one) => typeof one === 'number');
      expect(numbers.every(Number.isFinite)).toBe(true);
    }),
    { numRuns: 300 },
  );
});
