import { examplesOf } from './examples.test-support';
import { opticalDepth } from './rows.test-support';
import { cloudScreening } from './v72-cloud-screening';

const bare = opticalDepth({}, {});

examplesOf(cloudScreening, {
  quiet: {
    'the method names the level': {
      ...bare,
      metadata: { ...bare.metadata, method: 'sun photometer, Level 2.0' },
    },
    'every row carries its level as a remark': {
      ...bare,
      rows: bare.rows.map((row) => ({ ...row, remark: 'lev15' })),
    },
    'the values are of a model': { ...bare, metadata: { ...bare.metadata, method: 'model run' } },
  },
  fires: {
    'nothing is said': {
      context: bare,
      first: { severity: 'warning', sheet: null, field: 'method', remedyKind: 'answer' },
    },
  },
});
