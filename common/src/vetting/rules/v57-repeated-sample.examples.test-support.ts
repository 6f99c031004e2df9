import { expect } from 'vitest';
import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { repeatedSample } from './v57-repeated-sample';

const held = {
  ...{ site: 'core-A', latitudeDeg: -75.1, longitudeDeg: 123.35, datasetTitle: 'Antarctic ice' },
  ...{ quantity: 'dust', sizeCutoff: 'bulk', ageKaBp: 21.0001, fluxGM2Yr: 0.02 },
};

examplesOf(repeatedSample, {
  quiet: {
    'Holdings have it with the same value': context(rows({}), {
      heldSamples: [{ ...held, fluxGM2Yr: 0.01 }],
    }),
    'samples differ in age, depth, size or quantity': context(
      rows({}, { ageKaBp: 22 }, { depthM: 3 }, { sizeCutoff: '<10 µm' }, { quantity: 'nssCa' }),
    ),
  },
  fires: {
    'Holdings have the sample with another value': {
      context: context(rows({}, { ageKaBp: 22 }), { heldSamples: [held] }),
      first: { severity: 'warning', row: 2, message: expect.stringContaining('1 sample of Core A') },
    },
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
