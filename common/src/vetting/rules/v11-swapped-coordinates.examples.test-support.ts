import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { swappedCoordinates } from './v11-swapped-coordinates';

const marine = { metadata: { ...answers, archive: 'marine' as const } };

examplesOf(swappedCoordinates, {
  quiet: {
    'a marine core lies in the North Atlantic': context(rows({ latitudeDeg: 40, longitudeDeg: -40 }), marine),
  },
  fires: {
    'a marine core lies in Kazakhstan for want of a minus sign': {
      context: context(rows({ latitudeDeg: 47, longitudeDeg: 60 }, {}).slice(0, 1), marine),
      first: { severity: 'warning', row: 2, field: 'latitudeDeg' },
    },
  },
});
