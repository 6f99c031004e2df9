import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { normalisation } from './v44-normalisation';

const marine = (method: string) => context(rows({}), { metadata: { ...answers, archive: 'marine', method } });

examplesOf(normalisation, {
  quiet: {
    'fluxes are normalised': marine('232Th, 230Th-normalised'),
    'they are said not to be': marine('sieved; not normalised'),
    'the archive is ice': context(rows({})),
  },
  fires: {
    'nothing is said': {
      context: marine('sieved and weighed'),
      first: { severity: 'warning', sheet: null, field: 'method', remedyKind: 'answer' },
    },
  },
});
