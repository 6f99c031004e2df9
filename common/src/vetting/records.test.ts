import { expect, test } from 'vitest';
import { readableKind, RECORD_KINDS } from '../dataset/record-kinds';
import { sampleText, textWorkbook } from '../sheet/fixtures.test-support';
import type { RawWorkbook } from '../sheet/grid';
import { normaliseRecords } from '../sheet/normalise-records';
import { proposeWorkbook } from '../sheet/propose';
import type { VettingContext } from './context';
import { recordsAsSamples } from './record-samples';
import { answers } from './rules/rows.test-support';
import { vet } from './vet';

function submission(workbook: RawWorkbook, id: string): VettingContext {
  const kind = readableKind(id);
  const mapping = proposeWorkbook(workbook, kind);
  const { rows, missingCodes } = normaliseRecords(workbook, kind, mapping);
  return {
    ...{ workbook, mapping, rows: recordsAsSamples(rows), missingCodes, metadata: answers, kind: id },
    ...{ formOffered: true, heldSites: [], limits: {} },
  };
}
const codes = (context: VettingContext) =>
  vet(context).map(({ code, severity, field }) => `${code} ${severity} ${field ?? ''}`.trim());

test.each([
  ['gas-record', 'data_antarctica2015co2.txt', '\t'],
  ['age-series', 'LR04stack.txt', '\t'],
  ['age-series', 'GIS_table.txt', '\t'],
  ['refractive-index', 'du_ri_table_Woodward.txt', /\s{2,}/],
] as const)('as %s, the published file %s passes without error', (id, name, delimiter) => {
  const findings = vet(submission(sampleText(`open/${name}`, delimiter, 'utf8'), id));
  expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
});

test('a refractive index without wavelengths is asked for them and not for a site', () => {
  expect(codes(submission(textWorkbook('n,k\n1.53,0.005\n1.52,0.004'), 'refractive-index'))).toEqual([
    'V05 error wavelengthNm',
  ]);
});

test('cells that cannot be read and impossible values are errors in records too', () => {
  const grid = submission(
    textWorkbook('lat,lon,dust load (mg m-2)\n95,0,1\n10,0,about 3\n20,0,2'),
    'gridded-field',
  );
  expect(codes(grid)).toEqual(expect.arrayContaining(['V09 error latitudeDeg', 'V03 error gridValue']));
  const optics = submission(
    textWorkbook('species,wavelength (nm),SSA,g\ndust,550,0.5,0.7\ndust,670,0.9,-0.3'),
    'optical-set',
  );
  expect(codes(optics)).toEqual(
    expect.arrayContaining(['V69 error singleScatteringAlbedo', 'V69 error asymmetry']),
  );
});

test('no rule breaks on an empty file of any kind', () => {
  for (const { id } of RECORD_KINDS) {
    const findings = vet(submission(textWorkbook(''), id));
    expect(findings.filter(({ key }) => key.includes('rule-broke'))).toEqual([]);
  }
});
