import { expect } from 'vitest';
import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { missingCodes } from './v04-missing-codes';

const coded = (raw: string) => ({ fluxGM2Yr: null, cells: { fluxGM2Yr: { raw, value: null } } });

examplesOf(missingCodes, {
  quiet: { 'cells hold values or nothing': context(rows({}, { fluxGM2Yr: null })) },
  fires: {
    'a flux column mixes -999 and NaN': {
      context: context(rows(coded('-999'), coded('-999'), coded('NaN'), {})),
      first: {
        severity: 'warning',
        row: null,
        field: 'fluxGM2Yr',
        message: expect.stringContaining('3 cells'),
      },
    },
    'a value is below detection': {
      context: context(rows({ cells: { fluxGM2Yr: { raw: '<0.01', value: 0.01, belowDetection: true } } })),
      first: { message: expect.stringContaining('below detection 1 ×') },
    },
  },
});
