import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { precision } from './v40-precision';

const long = rows({ fluxGM2Yr: 0.0123456789 });

examplesOf(precision, {
  quiet: {
    'values have four figures': context(rows({ fluxGM2Yr: 0.0004963 })),
    'the values are said to be digitised': context(long, { metadata: { ...answers, method: 'digitised' } }),
  },
  fires: {
    'a flux has nine figures': {
      context: context(long),
      first: { severity: 'note', row: null, field: 'fluxGM2Yr', remedyKind: 'none' },
    },
  },
});
