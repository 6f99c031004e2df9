import { examplesOf } from './examples.test-support';
import { context, row, rows, unreadable } from './rows.test-support';
import { fluxSign } from './v32-flux-sign';

const refused = unreadable('-0.4', 'outside-range');

examplesOf(fluxSign, {
  quiet: { 'fluxes are positive or missing': context(rows({}, { fluxGM2Yr: null })) },
  fires: {
    'a flux is negative': {
      context: context(rows({ fluxGM2Yr: -0.4 })),
      first: { severity: 'error', row: 2, field: 'fluxGM2Yr', remedyKind: 'mend' },
    },
    'a negative flux was refused on conversion': {
      context: context([row({ fluxGM2Yr: null, cells: { fluxGM2Yr: refused } })]),
      first: { severity: 'error' },
    },
    'a flux is zero': {
      context: context(rows({ fluxGM2Yr: 0 })),
      first: { severity: 'warning', remedyKind: 'waive' },
    },
  },
});
