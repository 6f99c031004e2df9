import { examplesOf } from './examples.test-support';
import { opticalDepth } from './rows.test-support';
import { wavelength } from './v62-wavelength';

examplesOf(wavelength, {
  quiet: { 'depths are at 550 and 870 nm': opticalDepth({}, { wavelengthNm: 870 }) },
  fires: {
    'no wavelength is given': {
      context: opticalDepth({ wavelengthNm: null }, { wavelengthNm: null }),
      first: { severity: 'error', sheet: 'Data', row: null, field: 'wavelengthNm', remedyKind: 'answer' },
    },
    'a wavelength is in micrometres': {
      context: opticalDepth({ wavelengthNm: 0.55 }),
      first: { severity: 'error', row: 2, remedyKind: 'mend' },
    },
  },
});
