import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { archiveSurface } from './v12-archive-surface';

const as = (archive: 'marine' | 'loess' | 'ice') => ({ metadata: { ...answers, archive } });

examplesOf(archiveSurface, {
  quiet: {
    'Dome C is an ice core': context(rows({}), as('ice')),
    'NorthGRIP is an ice core': context(rows({ latitudeDeg: 75.1, longitudeDeg: -42.32 }), as('ice')),
    'a marine core lies in the equatorial Pacific, given as 0 to 360°': context(
      rows({ latitudeDeg: 0.5, longitudeDeg: 220 }),
      as('marine'),
    ),
    'the position is off the globe, which another rule says': context(
      rows({ latitudeDeg: 95 }),
      as('marine'),
    ),
  },
  fires: {
    'an ice core lies in the Alps, where no ice sheet is known': {
      context: context(rows({ latitudeDeg: 45.93, longitudeDeg: 7.87 }), as('ice')),
      first: { severity: 'warning', subject: 'ice-sheet', remedyKind: 'waive' },
    },
    'a marine core lies in Kazakhstan': {
      context: context(rows({ latitudeDeg: 47, longitudeDeg: 67 }), as('marine')),
      first: { severity: 'warning', row: 2, remedyKind: 'waive' },
    },
    'loess lies in mid-Pacific': {
      context: context(rows({ latitudeDeg: 10, longitudeDeg: -140 }), as('loess')),
      first: { severity: 'warning' },
    },
  },
});
