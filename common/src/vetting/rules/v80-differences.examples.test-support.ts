import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { differences } from './v80-differences';

const earlier = rows({ ageKaBp: 20 }, { ageKaBp: 21 });

examplesOf(differences, {
  quiet: {
    'there was no upload before': context(rows({})),
    'nothing changed but the order': context([...earlier].reverse(), { earlierRows: earlier }),
  },
  fires: {
    'a flux changed and a row went, summed up first': {
      context: context(rows({ ageKaBp: 20, fluxGM2Yr: 0.02 }), { earlierRows: earlier }),
      hits: 2,
      first: { severity: 'note', sheet: null, remedyKind: 'none' },
    },
  },
});
