import { examplesOf } from './examples.test-support';
import { opticalDepth } from './rows.test-support';
import { days } from './v71-days';

examplesOf(days, {
  quiet: {
    'means are of twelve days': opticalDepth({ sampleCount: 12 }),
    'the number of days is not given': opticalDepth({}),
  },
  fires: {
    'two means are of two days': {
      context: opticalDepth({ sampleCount: 2 }, { sampleCount: 20 }, { sampleCount: 2 }),
      first: { severity: 'warning', sheet: 'Data', field: 'sampleCount', remedyKind: 'leave-out' },
    },
  },
});
