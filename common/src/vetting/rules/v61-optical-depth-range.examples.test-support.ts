import { examplesOf } from './examples.test-support';
import { opticalDepth, unreadable } from './rows.test-support';
import { opticalDepthRange } from './v61-optical-depth-range';

const of = (...values: number[]) => opticalDepth(...values.map((value) => ({ aod: value })));
const refused = { cells: { aod: unreadable('9', 'outside-range') } };

examplesOf(opticalDepthRange, {
  quiet: { 'depths are usual, one of them noise': of(0.3, -0.02) },
  fires: {
    'a depth is 7': {
      context: of(7),
      first: { severity: 'error', row: 2, field: 'aod', remedyKind: 'mend' },
    },
    'a depth is -0.4': { context: of(-0.4), first: { severity: 'error' } },
    'a depth is 3.5': { context: of(3.5), first: { severity: 'warning', remedyKind: 'waive' } },
    'a depth was refused on reading': {
      context: opticalDepth(refused),
      first: { severity: 'error', row: 2 },
    },
  },
});
