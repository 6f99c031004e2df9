import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { repeatedSample } from './v57-repeated-sample';

examplesOf(repeatedSample, {
  quiet: {
    'samples differ in age, depth, size or quantity': context(
      rows({}, { ageKaBp: 22 }, { depthM: 3 }, { sizeCutoff: '<10 µm' }, { quantity: 'nssCa' }),
    ),
  },
  fires: {
    'a row stands twice': {
      context: context(rows({}, {})),
      first: { severity: 'warning', row: 3, remedyKind: 'leave-out' },
    },
    'a sample has two values': {
      context: context(rows({ site: 'Core A' }, { site: 'core-a', fluxGM2Yr: 0.02 })),
      first: { severity: 'warning', row: 3, field: 'fluxGM2Yr' },
    },
  },
});
