import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { concentrationAlone } from './v08-concentration-alone';

const bare = { fluxGM2Yr: null, concentrationNgG: 19.09 };

examplesOf(concentrationAlone, {
  quiet: {
    'accumulation is given': context(rows({ ...bare, accumulationKgM2Yr: 26 })),
    'the flux is given': context(rows({ concentrationNgG: 19.09 })),
  },
  fires: {
    'only concentrations are given': {
      context: context(rows(bare, bare)),
      first: { severity: 'error', row: null, field: 'concentrationNgG' },
    },
  },
});
