import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { sedimentationRate } from './v26-sedimentation-rate';

const marine = { metadata: { ...answers, archive: 'marine' as const } };

examplesOf(sedimentationRate, {
  quiet: {
    'a marine core gains 2 cm/kyr': context(rows({ sedimentationRateCmKyr: 2 }), marine),
    'an ice core gains metres': context(rows({ depthM: 1, ageKaBp: 0 }, { depthM: 90, ageKaBp: 1 })),
  },
  fires: {
    'a stated rate is 2000 cm/kyr at sea': {
      context: context(rows({ sedimentationRateCmKyr: 2000 }), marine),
      first: { severity: 'warning', row: 2, field: 'sedimentationRateCmKyr', remedyKind: 'waive' },
    },
    'the rate between two samples is 10 m/kyr': {
      context: context(rows({ depthM: 1, ageKaBp: 1 }, { depthM: 11, ageKaBp: 2 }), marine),
      first: { severity: 'warning', row: 3, field: 'depthM' },
    },
  },
});
