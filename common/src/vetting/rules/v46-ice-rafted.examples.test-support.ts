import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { iceRafted } from './v46-ice-rafted';

const marine = { metadata: { ...answers, archive: 'marine' as const } };
const stated = { metadata: { ...marine.metadata, note: 'IRD > 150 µm sieved off' } };
const atlantic = { latitudeDeg: 55, longitudeDeg: -25 };

examplesOf(iceRafted, {
  quiet: {
    'the core is tropical': context(rows({ latitudeDeg: 5, longitudeDeg: -25 }), marine),
    'the note speaks of it': context(rows(atlantic), stated),
    'the core is from the North Pacific': context(rows({ latitudeDeg: 50, longitudeDeg: 170 }), marine),
  },
  fires: {
    'nothing is said of two samples of a North Atlantic core': {
      context: context(rows(atlantic, atlantic), marine),
      first: { severity: 'warning', row: 2, field: 'site', remedyKind: 'answer' },
    },
  },
});
