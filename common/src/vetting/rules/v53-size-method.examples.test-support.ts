import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { sizeMethod } from './v53-size-method';

const cut = (method: string) => context(rows({}), { metadata: { ...answers, sizeCutoff: '<10 um', method } });

examplesOf(sizeMethod, {
  quiet: { 'fluxes are bulk': context(rows({})), 'the counter is named': cut('Coulter counter') },
  fires: {
    'nothing is said of the sizing': {
      context: cut('dissolved and weighed'),
      first: { severity: 'note', field: 'method', remedyKind: 'none' },
    },
  },
});
