import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { fluxLoess } from './v35-flux-loess';

const flux = (fluxGM2Yr: number) =>
  context(rows({ fluxGM2Yr }), { metadata: { ...answers, archive: 'loess' } });

examplesOf(fluxLoess, {
  quiet: { 'loess gains 250': flux(250), 'the row is of ice': context(rows({ fluxGM2Yr: 1e5 })) },
  fires: {
    'loess gains 3000': { context: flux(3000), first: { severity: 'warning', remedyKind: 'waive' } },
    'loess gains 50000': { context: flux(50000), first: { severity: 'error', row: 2, remedyKind: 'mend' } },
  },
});
