import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { fineBelowBulk } from './v52-fine-below-bulk';

const of = (sizeCutoff: string, fluxGM2Yr: number, ageKaBp = 21) => ({ sizeCutoff, fluxGM2Yr, ageKaBp });

examplesOf(fineBelowBulk, {
  quiet: {
    'fine is a part of bulk': context(rows(of('bulk', 200), of('<10 µm', 30), of('<20 um', 60))),
    'the samples are of different ages': context(rows(of('bulk', 20), of('<10 µm', 30, 22))),
  },
  fires: {
    'fine exceeds bulk': {
      context: context(rows(of('bulk', 20), of('<10 µm', 30))),
      first: { severity: 'error', row: 3, field: 'fluxGM2Yr', remedyKind: 'mend' },
    },
  },
});
