import { expect } from 'vitest';
import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { precision } from './v40-precision';

const long = rows({ fluxGM2Yr: 0.0123456789 });

/** The value is converted and has many figures; the text is what counts. */
const written = (raw: string) => ({
  fluxGM2Yr: 0.123456789,
  cells: { fluxGM2Yr: { raw, value: 0.123456789 } },
});

examplesOf(precision, {
  quiet: {
    'values have four figures': context(rows({ fluxGM2Yr: 0.0004963 })),
    'the text has few figures beside its uncertainty, power, unit or thousands': context(
      rows(
        written('0.50 ± 0.04'),
        written('1.25 x 10^-3'),
        written('12.5 mg m-2 yr-1'),
        written('0.000120'),
        written('120000'),
        written('1 250,5'),
      ),
    ),
    'the values are said to be digitised': context(long, { metadata: { ...answers, method: 'digitised' } }),
  },
  fires: {
    'the text has six figures though the value has few': {
      context: context(rows({ fluxGM2Yr: 0.5, cells: { fluxGM2Yr: { raw: '500.000 ± 2', value: 0.5 } } })),
      first: { severity: 'note', message: expect.stringContaining('1 flux value') },
    },
    'a flux has nine figures': {
      context: context(long),
      first: { severity: 'note', row: null, field: 'fluxGM2Yr', remedyKind: 'none' },
    },
  },
});
