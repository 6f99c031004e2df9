import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { localMaterial } from './v49-local-material';

examplesOf(localMaterial, {
  quiet: { 'a remark is of something else': context(rows({ remark: 'mean of two' }, {})) },
  fires: {
    'a sample is reworked loess': {
      context: context(rows({ remark: 'reworked loess' })),
      first: { severity: 'warning', row: 2, field: 'remark', remedyKind: 'waive' },
    },
  },
});
