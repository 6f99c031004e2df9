import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { luminescence } from './v25-luminescence';

const osl = (ageKaBp: number) =>
  context(rows({ ageKaBp }), { metadata: { ...answers, archive: 'loess', ageModel: 'OSL on quartz' } });

examplesOf(luminescence, {
  quiet: { 'quartz ages are young': osl(20), 'no luminescence is spoken of': context(rows({ ageKaBp: 60 })) },
  fires: {
    'a quartz age is 60 ka': {
      context: osl(60),
      first: { severity: 'note', sheet: 'Data', remedyKind: 'none' },
    },
  },
});
