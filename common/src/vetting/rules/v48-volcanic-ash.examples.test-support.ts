import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { volcanicAsh } from './v48-volcanic-ash';

examplesOf(volcanicAsh, {
  quiet: { 'a remark is of something else': context(rows({ remark: 'Ca x 5' }, { remark: 'washed' })) },
  fires: {
    'a sample holds a tephra layer': {
      context: context(rows({}, { remark: 'Toba tephra' })),
      first: { severity: 'warning', row: 3, field: 'remark', remedyKind: 'waive' },
    },
  },
});
