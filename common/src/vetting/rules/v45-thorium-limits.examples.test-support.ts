import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { thoriumLimits } from './v45-thorium-limits';

const normalised = { metadata: { ...answers, archive: 'marine' as const, method: '230Th-normalised' } };
const plain = { metadata: { ...answers, archive: 'marine' as const, method: 'not 230Th-normalised' } };

examplesOf(thoriumLimits, {
  quiet: {
    'the core is deep and young': context(rows({ waterDepthM: 4000 }), normalised),
    'fluxes are not normalised': context(rows({ waterDepthM: 400 }), plain),
  },
  fires: {
    'the core is shallow': {
      context: context(rows({ waterDepthM: 400 }), normalised),
      first: { field: 'waterDepthM' },
    },
    'a sample is 400 ka old': {
      context: context(rows({ ageKaBp: 400 }), normalised),
      first: { severity: 'warning', row: null, field: 'ageKaBp', remedyKind: 'waive' },
    },
  },
});
