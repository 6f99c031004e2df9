import { expect } from 'vitest';
import type { HeldSample } from '../context';
import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { heldDuplicates } from './v56-held-duplicates';

const held: HeldSample = {
  site: 'EDC',
  latitudeDeg: -75.1,
  longitudeDeg: 123.35,
  datasetTitle: 'Antarctic ice',
  quantity: 'dust',
  sizeCutoff: null,
  ageKaBp: 21.2,
  fluxGM2Yr: 0.0101,
};
const against = (changes: Partial<HeldSample>, ...own: Parameters<typeof rows>) =>
  context(rows(...own), { heldSamples: [{ ...held, ...changes }] });

examplesOf(heldDuplicates, {
  quiet: {
    'nothing of Holdings is at hand': context(rows({})),
    'the held value is far away': against({ latitudeDeg: -75.3 }, {}),
    'the held value is of another time': against({ ageKaBp: 24 }, {}),
    'the held value differs by a tenth': against({ fluxGM2Yr: 0.011 }, {}),
    'the held value is of another size': against({ sizeCutoff: '<10 µm' }, {}),
  },
  fires: {
    'two samples are held under another name': {
      context: against({}, {}, { ageKaBp: 21.3 }),
      first: {
        severity: 'warning',
        row: 2,
        message: expect.stringContaining('2 values of Core A already as "EDC"'),
      },
    },
    'the two lie on both sides of the date line': {
      context: against({ longitudeDeg: -179.99 }, { longitudeDeg: 179.99 }),
      first: { row: 2, remedyKind: 'leave-out' },
    },
  },
});
