import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { relativeUncertainty } from './v55-relative-uncertainty';

const errors = (...values: number[]) =>
  context(rows(...values.map((fluxSigmaGM2Yr) => ({ fluxGM2Yr: 0.01, fluxSigmaGM2Yr }))));

examplesOf(relativeUncertainty, {
  quiet: { 'errors are 10 %': errors(0.001, 0.001) },
  fires: {
    'two errors are 1 %': {
      context: errors(0.0001, 0.0001, 0.001),
      first: { severity: 'warning', row: null, field: 'fluxSigmaGM2Yr', remedyKind: 'waive' },
    },
    'an error is five times the value': { context: errors(0.05), first: { severity: 'warning' } },
  },
});
