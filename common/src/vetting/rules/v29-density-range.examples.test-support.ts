import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { densityRange } from './v29-density-range';

const of = (densityGCm3: number, archive: 'peat' | 'loess' | 'marine') =>
  context(rows({ densityGCm3 }), { metadata: { ...answers, archive } });

examplesOf(densityRange, {
  quiet: { 'peat is light': of(0.08, 'peat'), 'loess is usual': of(1.5, 'loess') },
  fires: {
    'loess is as light as peat': {
      context: of(0.08, 'loess'),
      first: { severity: 'error', remedyKind: 'mend' },
    },
    'a density is in kg m-3': { context: of(1500, 'loess'), first: { severity: 'error', row: 2 } },
    'marine mud is heavy': {
      context: of(1.8, 'marine'),
      first: { severity: 'warning', remedyKind: 'waive' },
    },
  },
});
