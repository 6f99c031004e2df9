import { examplesOf } from './examples.test-support';
import { opticalDepth } from './rows.test-support';
import { wavelengthConversion } from './v63-wavelength-conversion';

examplesOf(wavelengthConversion, {
  quiet: {
    'a depth at 500 nm needs little': opticalDepth({ wavelengthNm: 500 }),
    'a depth at 870 nm has its exponent': opticalDepth({ wavelengthNm: 870, angstromExponent: 0.3 }),
  },
  fires: {
    'a depth at 870 nm has none': {
      context: opticalDepth({ wavelengthNm: 870 }),
      first: { severity: 'warning', sheet: 'Data', field: 'angstromExponent' },
    },
  },
});
