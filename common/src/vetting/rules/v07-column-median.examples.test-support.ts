import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { columnMedian } from './v07-column-median';

const fluxes = (...values: number[]) => context(rows(...values.map((fluxGM2Yr) => ({ fluxGM2Yr }))));

examplesOf(columnMedian, {
  quiet: {
    // Dome C, g m-2 yr-1, of the kind in the shipped sample file
    'Dome C fluxes are in the right unit': fluxes(0.0004963, 0.0005157, 0.0064477, 0.0087),
    'there are too few values for a median': fluxes(4, 5),
  },
  fires: {
    'milligrams were taken as grams': {
      context: fluxes(0.4963, 0.5157, 6.4477, 8.7),
      first: { severity: 'warning', row: null, field: 'fluxGM2Yr', remedyKind: 'waive' },
    },
  },
});
