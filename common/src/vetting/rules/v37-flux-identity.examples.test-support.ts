import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { fluxIdentity } from './v37-flux-identity';

// 2 cm/kyr of 0.8 g cm-3 with a tenth of dust: 0.16 g cm-2 kyr-1 = 1.6 g m-2 yr-1
const factors = { sedimentationRateCmKyr: 2, densityGCm3: 0.8, dustFraction: 0.1 };

examplesOf(fluxIdentity, {
  quiet: {
    'flux and product agree within 5 %': context(rows({ ...factors, fluxGM2Yr: 1.65 })),
    'a factor is not given': context(rows({ ...factors, dustFraction: null, fluxGM2Yr: 99 })),
  },
  fires: {
    'the flux is left in g cm-2 kyr-1': {
      context: context(rows({ ...factors, fluxGM2Yr: 0.16 })),
      first: { severity: 'error', row: 2, field: 'fluxGM2Yr', remedyKind: 'mend' },
    },
  },
});
