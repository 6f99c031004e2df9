import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { depthOrder } from './v16-depth-order';

const depths = (...values: number[]) => context(rows(...values.map((depthM) => ({ depthM }))));
const between = (depthTopM: number, depthBaseM: number) => ({ depthTopM, depthBaseM });

examplesOf(depthOrder, {
  quiet: {
    'depths run down-core': depths(1, 2, 3),
    'the core is listed deepest first': depths(3, 2, 1),
    'samples follow one another': context(rows(between(0, 0.1), between(0.1, 0.2))),
    'two cores stand one after the other': context(rows({ depthM: 5 }, { depthM: 1, site: 'Core B' })),
  },
  fires: {
    'one depth of a core is out of order': {
      context: depths(1, 2, 30, 4, 5, 6),
      first: { severity: 'error', row: 5, field: 'depthM', remedyKind: 'mend' },
    },
    'the rows are in no order at all': {
      context: depths(1, 5, 2, 8, 3, 9, 4),
      first: { severity: 'warning', row: null },
    },
    'the top of a sample lies below its base': {
      context: context(rows(between(0.2, 0.1))),
      first: { severity: 'error', field: 'depthTopM' },
    },
    'two samples overlap': {
      context: context(rows(between(0, 0.2), between(0.1, 0.3))),
      first: { severity: 'error', row: 3 },
    },
  },
});
