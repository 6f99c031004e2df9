import { expect, test } from 'vitest';
import { datasetKind } from '../dataset/kinds';
import { sampleText, sampleWorkbook, sheetOfValues } from '../sheet/fixtures.test-support';
import type { RawWorkbook } from '../sheet/grid';
import { normaliseWorkbook } from '../sheet/normalise';
import { proposeWorkbook } from '../sheet/propose';
import type { VettingContext } from './context';
import { answers } from './rules/rows.test-support';
import { counts, vet } from './vet';

const dust = datasetKind('dust-flux');

/** A file as a contributor drops it, with the proposal unchanged. */
function submission(workbook: RawWorkbook, changes: Partial<VettingContext> = {}): VettingContext {
  const mapping = proposeWorkbook(workbook, dust);
  const { rows, missingCodes } = normaliseWorkbook(workbook, dust, mapping);
  return {
    ...{ workbook, mapping, rows, missingCodes, metadata: answers },
    ...{ formOffered: true, heldSites: [], limits: {} },
    ...changes,
  };
}

const iceCores = () => sampleWorkbook('A_EDC_NGRIP_dust_v3_final.xlsx');
const germanExport = () => sampleText('B_Staubfluesse_Export.csv', ';', 'latin1');

test.each([
  ['the ice-core workbook', iceCores],
  ['the German text export', germanExport],
])('%s passes without error once the form is answered, its fluxes within the limits for ice', (_, read) => {
  const findings = vet(submission(read()));
  expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
  expect(findings.filter(({ code }) => ['V07', 'V12', 'V32', 'V33', 'V37'].includes(code))).toEqual([]);
});

test.each([
  ['the ice-core workbook', iceCores],
  ['the German text export', germanExport],
])('%s is not blocked either when it is checked without a form', (_, read) => {
  const findings = vet(submission(read(), { metadata: {}, formOffered: false }));
  expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
});

test('an unanswered form is asked for archive, reference, dust definition, size cut-off and licence only', () => {
  const findings = vet(submission(iceCores(), { metadata: {} }));
  const wanted = findings.filter(({ severity }) => severity === 'error').map(({ field }) => field);
  expect([...wanted].sort()).toEqual([
    'archive',
    'dustDefinition',
    'licence',
    'publicationDoi',
    'sizeCutoff',
  ]);
});

test('rows without a flux are noted row by row and once a sheet, and the codes once a column', () => {
  const context = submission(germanExport());
  const findings = vet(context);
  expect(counts(context, findings)).toMatchObject({ rows: 18, withoutValue: 1, errors: 0 });
  const notes = findings.filter(({ code }) => code === 'V05');
  expect(notes.map(({ severity, row }) => [severity, row])).toEqual([
    ['note', null],
    ['note', 5],
  ]);
  const codes = findings.filter(({ code }) => code === 'V04').map(({ column }) => column);
  expect(codes).toEqual(['E', 'F']);
});

test('tracer fluxes are kept under their name and warned of once a sheet and tracer', () => {
  const findings = vet(submission(sampleWorkbook('wolff2006edc-chem.xls')));
  const subjects = findings.filter(({ code }) => code === 'V43').map(({ subject }) => subject);
  expect(new Set(subjects)).toEqual(new Set(['nssCa', 'Fe']));
});

test('findings on a turned table are pinned to the cells of the sheet, and whole fields to no column', () => {
  const sheet = sheetOfValues('Sheet1', [
    ['Site', 'North', 'South', 'East'],
    ['Lat', 70.52, -70.52, 10.25],
    ['Lon', -40.52, 20.52, 30.25],
    ['Age (ka BP)', 1, 2, 3],
    ['Dust flux (g/m2/yr)', 0.05, -0.01, 0.07],
  ]);
  const findings = vet(submission({ fileName: 'made.xlsx', format: 'xlsx', sheets: [sheet], readNotes: [] }));
  const negative = findings.find(({ code }) => code === 'V32');
  expect(negative).toMatchObject({ sheet: 'Sheet1', row: 5, column: 'C', field: 'fluxGM2Yr' });
  expect(findings.find(({ code }) => code === 'V54')).toMatchObject({ column: null });
});
