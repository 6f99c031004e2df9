import { examplesOf } from './examples.test-support';
import { opticalDepth } from './rows.test-support';
import { aerosolSpecies } from './v65-aerosol-species';

const bare = opticalDepth({ aerosolSpecies: null });
const said = { ...bare, metadata: { ...bare.metadata, method: 'coarse mode of a sun photometer' } };

examplesOf(aerosolSpecies, {
  quiet: {
    'every row names its species': opticalDepth({ aod: 0.1 }, { aod: 0.4, aerosolSpecies: 'total' }),
    'the method names it': said,
  },
  fires: {
    'nothing names it': {
      context: bare,
      first: { severity: 'error', sheet: 'Data', field: 'aerosolSpecies', remedyKind: 'answer' },
    },
    'nothing names it in a file without a form': {
      context: { ...bare, formOffered: false },
      first: { severity: 'warning' },
    },
    'dust is more than the total': {
      context: opticalDepth({ aod: 0.5 }, { aod: 0.4, aerosolSpecies: 'total' }),
      first: { severity: 'error', row: 2, field: 'aod', remedyKind: 'mend' },
    },
  },
});
