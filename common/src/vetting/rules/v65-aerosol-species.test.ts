import { examplesOf } from './examples.test-support';
import { opticalDepth } from './rows.test-support';
import { aerosolSpecies } from './v65-aerosol-species';

const bare = opticalDepth({ species: null });
const said = { ...bare, metadata: { ...bare.metadata, method: 'coarse mode of a sun photometer' } };

examplesOf(aerosolSpecies, {
  quiet: {
    'every row names its species': opticalDepth(
      { opticalDepth: 0.1 },
      { opticalDepth: 0.4, species: 'total' },
    ),
    'the method names it': said,
  },
  fires: {
    'nothing names it': {
      context: bare,
      first: { severity: 'error', sheet: 'Data', field: 'species', remedyKind: 'answer' },
    },
    'nothing names it in a file without a form': {
      context: { ...bare, formOffered: false },
      first: { severity: 'warning' },
    },
    'dust is more than the total': {
      context: opticalDepth({ opticalDepth: 0.5 }, { opticalDepth: 0.4, species: 'total' }),
      first: { severity: 'error', row: 2, field: 'opticalDepth', remedyKind: 'mend' },
    },
  },
});
