import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { fluxIce } from './v33-flux-ice';

const greenland = { latitudeDeg: 75.1, longitudeDeg: -42.32 };

examplesOf(fluxIce, {
  quiet: {
    // smallest and largest of the shipped Dome C table, g m-2 yr-1
    'Dome C holds its usual range': context(rows({ fluxGM2Yr: 0.0003018426 }, { fluxGM2Yr: 0.0092 })),
    'NorthGRIP gets more': context(rows({ ...greenland, fluxGM2Yr: 0.14595 })),
  },
  fires: {
    'the plateau gets as much as Greenland': {
      context: context(rows({ fluxGM2Yr: 0.14595 })),
      first: { severity: 'warning', row: 2, field: 'fluxGM2Yr', remedyKind: 'waive' },
    },
    'Greenland gets as much as a desert': {
      context: context(rows({ ...greenland, fluxGM2Yr: 146 })),
      first: { severity: 'warning' },
    },
  },
});
