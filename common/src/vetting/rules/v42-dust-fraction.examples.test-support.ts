import { examplesOf } from './examples.test-support';
import { context, row, rows, unreadable } from './rows.test-support';
import { dustFraction } from './v42-dust-fraction';

const refused = { dustFraction: unreadable('35', 'outside-range') };

examplesOf(dustFraction, {
  quiet: { 'a third is dust': context(rows({ dustFraction: 0.33 }, { dustFraction: 1 })) },
  fires: {
    'a fraction is in per cent': {
      context: context(rows({ dustFraction: 35 })),
      first: { severity: 'error', row: 2, field: 'dustFraction', remedyKind: 'mend' },
    },
    'it was refused on reading': {
      context: context([row({ cells: refused })]),
      first: { severity: 'error', row: 2 },
    },
  },
});
