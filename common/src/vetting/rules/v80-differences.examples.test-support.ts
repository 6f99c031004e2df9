import { expect } from 'vitest';
import { examplesOf } from './examples.test-support';
import { context, row, rows } from './rows.test-support';
import { differences } from './v80-differences';

const earlier = rows({ ageKaBp: 20, depthM: 3 }, { ageKaBp: 21, depthM: 4 });

examplesOf(differences, {
  quiet: {
    'there was no upload before': context(rows({})),
    'nothing changed but the order': context([...earlier].reverse(), { earlierRows: earlier }),
  },
  fires: {
    'a flux changed and a row went, summed up first': {
      context: context(rows({ ageKaBp: 20, depthM: 3, fluxGM2Yr: 0.02 }), { earlierRows: earlier }),
      hits: 3,
      first: { severity: 'note', sheet: null, remedyKind: 'none' },
    },
    'an age changed, which leaves the row the same sample': {
      context: context(rows({ ageKaBp: 20.5, depthM: 3 }, { ageKaBp: 21, depthM: 4 }), {
        earlierRows: earlier,
      }),
      hits: 2,
      first: { message: expect.stringContaining('1 cell changed, 0 rows came and 0 rows went') },
    },
    'a remark was added, a field that is no number': {
      context: context([row({ remark: 'tephra' })], { earlierRows: [row()] }),
      hits: 2,
      first: { message: expect.stringContaining('1 cell changed') },
    },
    'a row came': {
      context: context(rows({}, { ageKaBp: 22 }), { earlierRows: [row()] }),
      hits: 2,
      first: { message: expect.stringContaining('1 row came') },
    },
  },
});
