import { expect, test } from 'vitest';
import { readCsv } from '../../../reference/read';
import { context, row } from './rules/rows.test-support';
import { vet } from './vet';

/** Rows that should come out of the shipped sample files, on one sheet a site as contributors send them. */
function rowsOf(name: string) {
  return readCsv(name).map((line, index) =>
    row({
      sheet: line.site!,
      row: index + 2,
      site: line.site!,
      latitudeDeg: Number(line.lat),
      longitudeDeg: Number(line.lon),
      ageKaBp: Number(line.age_ka_BP),
      fluxGM2Yr: Number(line.flux_g_m2_yr),
      fluxSigmaGM2Yr: Number(line.uncertainty_g_m2_yr),
    }),
  );
}

test.each(['samples/A_expected.csv', 'samples/B_expected.csv'])(
  'the rows of %s pass with no error once the form is answered, and lie within the limits for ice',
  (name) => {
    const findings = vet(context(rowsOf(name)));
    expect(findings.filter(({ severity }) => severity === 'error')).toEqual([]);
    expect(findings.filter(({ code }) => ['V07', 'V12', 'V32', 'V33'].includes(code))).toEqual([]);
  },
);
