import { examplesOf } from './examples.test-support';
import { opticalDepth } from './rows.test-support';
import { angstromExponent } from './v64-angstrom-exponent';

examplesOf(angstromExponent, {
  quiet: {
    'dust has 0.2 and haze 1.6': opticalDepth(
      { angstromExponent: 0.2 },
      { angstromExponent: 1.6, aerosolSpecies: 'total' },
    ),
  },
  fires: {
    'dust has 1.6': {
      context: opticalDepth({ angstromExponent: 1.6 }),
      first: { severity: 'warning', row: 2 },
    },
    'haze has 4': {
      context: opticalDepth({ angstromExponent: 4, aerosolSpecies: 'total' }),
      first: { field: 'angstromExponent', remedyKind: 'waive' },
    },
  },
});
