import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { belowDetection } from './v39-below-detection';

const marked = { fluxGM2Yr: 0.02, cells: { fluxGM2Yr: { raw: '<0.02', value: 0.02, belowDetection: true } } };

examplesOf(belowDetection, {
  quiet: {
    'every small value has its limit': context(rows(marked, {})),
    'there are only zeros': context(rows({ fluxGM2Yr: 0 })),
  },
  fires: {
    'zeros stand beside limits': {
      context: context(rows(marked, { fluxGM2Yr: 0 })),
      first: { severity: 'warning', row: null, field: 'fluxGM2Yr', remedyKind: 'waive' },
    },
  },
});
