import { examplesOf } from './examples.test-support';
import { context, row, rows, unreadable } from './rows.test-support';
import { coordinateRange } from './v09-coordinate-range';

const above = { latitudeDeg: 95, cells: { latitudeDeg: { cell: 'B2', raw: '95', value: 95 } } };

examplesOf(coordinateRange, {
  quiet: {
    'the position is on the globe': context(rows({}, { longitudeDeg: 317.68 })),
    'a row without flux has no usable position': context([row({ fluxGM2Yr: null, latitudeDeg: 95 })]),
  },
  fires: {
    'a latitude is 95': {
      context: context([row({ row: 9, latitudeDeg: 95 })]),
      first: { severity: 'error', row: 9, field: 'latitudeDeg', remedyKind: 'mend' },
    },
    'the unit parser refused a longitude': {
      context: context([
        row({ longitudeDeg: null, cells: { longitudeDeg: unreadable('400', 'outside-range') } }),
      ]),
      first: { field: 'longitudeDeg' },
    },
    'one bad latitude above the table serves many rows, said once': {
      context: context(rows({ row: 5, ...above }, { row: 6, ...above }, { row: 7, ...above })),
      first: { row: 2, column: 'B' },
    },
    'both coordinates are 0': {
      context: context([row({ latitudeDeg: 0, longitudeDeg: 0 })]),
      first: { severity: 'error' },
    },
  },
});
