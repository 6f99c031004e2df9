import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { wetDensity } from './v31-wet-density';

const marine = { metadata: { ...answers, archive: 'marine' as const } };

examplesOf(wetDensity, {
  quiet: {
    'marine mud is light': context(rows({ densityGCm3: 0.7 }), marine),
    'loess is heavy': context(rows({ densityGCm3: 1.6 }), { metadata: { ...answers, archive: 'loess' } }),
  },
  fires: {
    'marine mud weighs 1.55 g cm-3': {
      context: context(rows({ densityGCm3: 1.55 }, { densityGCm3: 1.56 }), marine),
      first: { severity: 'warning', row: null, field: 'densityGCm3' },
    },
  },
});
