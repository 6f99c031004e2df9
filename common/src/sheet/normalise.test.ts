import { describe, expect, test } from 'vitest';
import { datasetKind } from '../dataset/kinds';
import type { SampleRow } from '../dataset/sample-row';
import {
  type ExpectedRow,
  expectedRows,
  sampleText,
  sampleWorkbook,
  sheetOfValues,
  textWorkbook,
} from './fixtures.test-support';
import type { RawWorkbook } from './grid';
import type { Correction, Mapping } from './mapping';
import { normaliseWorkbook } from './normalise';
import { proposeWorkbook } from './propose';

const dust = datasetKind('dust-flux');
const read = (workbook: RawWorkbook, corrections?: Correction[]) =>
  normaliseWorkbook(workbook, dust, proposeWorkbook(workbook, dust), corrections);
const withFlux = (rows: SampleRow[]) => rows.filter((row) => row.fluxGM2Yr !== null);

/** 0.002 relative: the file of expected rows allows a year of 365, 365.2425 or 365.25 days; 1e-6 on ages. */
function expectSame(rows: SampleRow[], expected: ExpectedRow[]): void {
  expect(rows.length).toBe(expected.length);
  for (const [i, wanted] of expected.entries()) {
    const row = rows[i]!;
    const where = `${row.sheet} row ${row.row}`;
    expect(row.site, where).toBe(wanted.site);
    expect(row.latitudeDeg, where).toBeCloseTo(wanted.lat, 6);
    expect(row.longitudeDeg, where).toBeCloseTo(wanted.lon, 6);
    expect(Math.abs(row.ageKaBp! - wanted.age), where).toBeLessThan(1e-6);
    expect(Math.abs(row.fluxGM2Yr! / wanted.flux - 1), where).toBeLessThan(0.002);
    if (wanted.uncertainty !== null)
      expect(Math.abs(row.fluxSigmaGM2Yr! / wanted.uncertainty - 1), where).toBeLessThan(0.002);
    expect(row.quantity, where).toBe(wanted.quantity ?? 'dust');
  }
}

describe('submissions as people mail them', () => {
  test('the ice-core workbook gives its expected rows, one for one and in order', () => {
    const { rows } = read(sampleWorkbook('A_EDC_NGRIP_dust_v3_final.xlsx'));
    expectSame(withFlux(rows), expectedRows('A_expected.csv'));
    expect(rows.length).toBeGreaterThan(withFlux(rows).length);
    expect(rows.filter((row) => row.sheet === 'EDC').length).toBe(149);
  });

  test('the German text export gives its expected rows; the row of missing codes stays, without a flux', () => {
    const { rows, missingCodes, columnNotes } = read(sampleText('B_Staubfluesse_Export.csv', ';', 'latin1'));
    expectSame(withFlux(rows), expectedRows('B_expected.csv'));
    expect(rows[0]).toMatchObject({ row: 5, ageKaBp: 0.1, fluxGM2Yr: null, remark: 'zu wenig Proben' });
    expect(missingCodes).toEqual({ '-999': 2 });
    expect(columnNotes.some((note) => note.column === 'E' && note.code === 'number-format')).toBe(true);
  });

  test('the published chemistry workbook gives tracer fluxes of its revised block, never called dust', () => {
    const { rows } = read(sampleWorkbook('wolff2006edc-chem.xls'));
    expectSame(withFlux(rows), expectedRows('R_wolff2006_expected.csv'));
  });

  test('every value carries its cell, raw text, unit and rule', () => {
    const row = read(sampleText('B_Staubfluesse_Export.csv', ';', 'latin1')).rows[1]!;
    expect(row.cells.fluxGM2Yr).toEqual({
      cell: 'E6',
      raw: '0,0008264',
      value: row.fluxGM2Yr,
      unit: 'g m-2 yr-1',
      rule: 'mg m-2 d-1 × 0.36525 = g m-2 yr-1',
    });
    expect(row.cells.fluxSigmaGM2Yr?.cell).toBe('F6');
  });

  test('a text file of thousands of rows is read in time that grows with its rows', () => {
    const text = (n: number) =>
      `site,lat,lon,age (ka BP),dust flux (g/m2/yr)\n${Array.from({ length: n }, (_row, i) => `A,-75.1,123.3,${i / 10},0.5`).join('\n')}`;
    const { rows } = read(textWorkbook(text(20_000)));
    expect(rows.length).toBe(20_000);
    expect(rows.at(-1)).toMatchObject({ row: 20_001, ageKaBp: 1999.9 });
  });
});

const table = (...lines: string[]) =>
  textWorkbook(['Site;Lat;Lon;Age (ka BP);Dust flux (g/m2/yr);Error', ...lines].join('\n'), ';');

describe('cells that are no plain numbers', () => {
  test('a detection limit is kept as limit and is no flux', () => {
    const row = read(table('A;1.25;2.25;3.5;<0.02;', 'A;1.25;2.25;4.5;0.5;0.1')).rows[0]!;
    expect(row.fluxGM2Yr).toBeNull();
    expect(row.cells.fluxGM2Yr).toMatchObject({ value: 0.02, belowDetection: true });
  });

  test('an uncertainty behind ± goes to the uncertainty field', () => {
    const row = read(
      textWorkbook('Site;Lat;Lon;Age (ka BP);Dust flux (mg/m2/yr)\nA;1.25;2.25;3.5;50 ± 4', ';'),
    ).rows[0]!;
    expect(row.fluxGM2Yr).toBeCloseTo(0.05, 12);
    expect(row.fluxSigmaGM2Yr).toBeCloseTo(0.004, 12);
  });

  test('a latitude of 95 and a dry bulk density of 9 are refused with a code and the range; a negative flux is left to vetting', () => {
    const text =
      'Site;Lat;Lon;Age (ka BP);Dust flux (g/m2/yr);Dry bulk density (g/cm3)\nA;95.25;2.25;3.5;-0.02;9';
    const row = read(textWorkbook(text, ';')).rows[0]!;
    expect(row.latitudeDeg).toBeNull();
    expect(row.cells.latitudeDeg?.problem?.code).toBe('outside-range');
    expect(row.cells.densityGCm3?.problem?.message).toContain('0.01 to 3 g cm-3');
    expect(row.fluxGM2Yr).toBe(-0.02);
  });

  test('a unit in the cell counts for that cell', () => {
    const { rows } = read(
      table('A;1.25;2.25;3.5;20 mg/m2/yr;', 'A;1.25;2.25;4.5;0.5;0.1', 'A;1.25;2.25;5.5;3 ng/g;'),
    );
    expect(rows[0]!.fluxGM2Yr).toBeCloseTo(0.02, 12);
    expect(rows[2]!.cells.fluxGM2Yr?.problem?.code).toBe('not-convertible');
  });

  test('an unknown unit leaves every value null and names the unit', () => {
    const { rows, columnNotes } = read(
      textWorkbook('Site;Lat;Lon;Age (ka BP);Dust flux (furlong/yr)\nA;1.25;2.25;3.5;5', ';'),
    );
    expect(rows[0]!.fluxGM2Yr).toBeNull();
    expect(rows[0]!.cells.fluxGM2Yr?.problem).toMatchObject({ code: 'unknown-unit' });
    expect(columnNotes.find((note) => note.code === 'unknown-unit')?.message).toContain('furlong');
  });

  test('a column headed 2σ is halved and the note says so', () => {
    const { rows, columnNotes } = read(
      textWorkbook('Site;Lat;Lon;Age (ka BP);Dust flux (g/m2/yr);2σ\nA;1.25;2.25;3.5;5;0.4', ';'),
    );
    expect(rows[0]!.fluxSigmaGM2Yr).toBeCloseTo(0.2, 12);
    expect(columnNotes.map((note) => note.code)).toContain('two-sigma');
  });
});

describe('corrections and changed mappings', () => {
  const workbook = table('A;1.25;2.25;3.5;abc;', 'A;1.25;2.25;4.5;0.5;0.1');
  const sheet = workbook.sheets[0]!.name;

  test('a mend lies over the raw text, which stays', () => {
    expect(read(workbook).rows[0]!.cells.fluxGM2Yr?.problem?.code).toBe('not-a-number');
    const row = read(workbook, [{ sheet, row: 2, column: 'E', text: '0.7' }]).rows[0]!;
    expect(row.fluxGM2Yr).toBe(0.7);
    expect(row.cells.fluxGM2Yr).toMatchObject({ raw: 'abc', mended: '0.7', cell: 'E2' });
  });

  test('rows of an incomplete mapping still come, with nulls', () => {
    const mapping: Mapping = proposeWorkbook(workbook, dust);
    const without = {
      ...mapping,
      columns: mapping.columns.map((one) => (one.field === 'ageKaBp' ? { ...one, field: null } : one)),
    };
    const { rows } = normaliseWorkbook(workbook, dust, without);
    expect(rows.map((row) => row.ageKaBp)).toEqual([null, null]);
    expect(rows[1]!.fluxGM2Yr).toBe(0.5);
  });

  test('the datum that the form answers holds for ages that name none', () => {
    const unnamed = textWorkbook('Site;Lat;Lon;Age (yr);Dust flux (g/m2/yr)\nA;1.25;2.25;10800;5', ';');
    const mapping = proposeWorkbook(unnamed, dust);
    expect(normaliseWorkbook(unnamed, dust, mapping).rows[0]!.ageKaBp).toBe(10.8);
    expect(normaliseWorkbook(unnamed, dust, mapping, [], { ageDatum: 'b2k' }).rows[0]!.ageKaBp).toBe(10.75);
    expect(normaliseWorkbook(unnamed, dust, mapping).columnNotes.map((note) => note.code)).toContain(
      'datum-assumed',
    );
  });

  test('a flux is computed where only its parts are given, and never from a concentration alone', () => {
    const columns = ['Age (ka BP)', 'Dust concentration (ng/g)', 'Accumulation (kg m-2 yr-1)'];
    const ice = {
      fileName: 'ice.xlsx',
      format: 'xlsx' as const,
      readNotes: [],
      sheets: [sheetOfValues('Core X', [columns, [1.5, 20, 25], [2.5, 40, null]])],
    };
    const { rows } = read(ice);
    expect(rows[0]).toMatchObject({ site: 'Core X', fluxGM2Yr: 0.0005 });
    expect(rows[0]!.cells.fluxGM2Yr?.rule).toContain('concentration × accumulation');
    expect(rows[1]!.fluxGM2Yr).toBeNull();
  });
});
