import { examplesOf } from './examples.test-support';
import { context, row, rows, unreadable } from './rows.test-support';
import { dustFraction } from './v42-dust-fraction';

const refused = { dustFraction: unreadable('35', 'outside-range') };

const parts = (dustFraction: number, carbonate: number, opal: number) =>
  row({
    dustFraction,
    cells: { carbonateFraction: { value: carbonate }, opalFraction: { value: opal } },
  });

examplesOf(dustFraction, {
  quiet: {
    'a third is dust': context(rows({ dustFraction: 0.33 }, { dustFraction: 1 })),
    'dust, carbonate and opal make up the whole': context([parts(0.33, 0.6, 0.1)]),
  },
  fires: {
    'the parts add up to more than the whole': {
      context: context([parts(0.33, 0.6, 0.3)]),
      first: { severity: 'error', row: 2, field: 'carbonateFraction', subject: 'sum', remedyKind: 'mend' },
    },
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
