import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { ageOrder } from './v17-age-order';

const at = (depthM: number, ageKaBp: number) => ({ depthM, ageKaBp });
const turned = rows(at(1, 5), at(2, 4), at(3, 6));

examplesOf(ageOrder, {
  quiet: {
    'ages rise with depth, in whatever order the rows stand': context(rows(at(3, 6), at(1, -0.05), at(2, 5))),
    'equal depths carry two ages': context(rows(at(1, 5), at(1, 4))),
    'no depth is given': context(rows({ ageKaBp: 5 }, { ageKaBp: 4 })),
  },
  fires: {
    'an age falls in a loess section': {
      context: context(turned, { metadata: { ...answers, archive: 'loess' } }),
      first: { severity: 'error', row: 3, field: 'ageKaBp', remedyKind: 'mend' },
    },
    'an age falls in an ice core with a stated age model': {
      context: context(turned),
      first: { severity: 'warning', row: 3, remedyKind: 'waive' },
    },
    'an age falls in an ice core without one': {
      context: context(turned, { metadata: { ...answers, ageModel: ' ' } }),
      first: { severity: 'error' },
    },
  },
});
