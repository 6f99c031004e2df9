import { examplesOf } from './examples.test-support';
import { answers, context, rows, withColumn } from './rows.test-support';
import { uncertainty } from './v54-uncertainty';

const unsaid = { metadata: { ...answers, uncertaintyMeaning: undefined } };

examplesOf(uncertainty, {
  quiet: {
    'every value has its error and the form its meaning': context(rows({}, {})),
    'the heading states the meaning': withColumn(context(rows({}), unsaid), 'fluxSigmaGM2Yr', {
      heading: '± 1σ',
    }),
  },
  fires: {
    'one value of two has no error': {
      context: context(rows({}, { fluxSigmaGM2Yr: null })),
      first: { severity: 'warning', row: null, field: 'fluxSigmaGM2Yr', remedyKind: 'waive' },
    },
    'no value has an error': { context: context(rows({ fluxSigmaGM2Yr: null })), first: { column: null } },
    'an error is zero': {
      context: context(rows({ fluxSigmaGM2Yr: 0 })),
      first: { row: 2, field: 'fluxSigmaGM2Yr', remedyKind: 'mend' },
    },
    'the meaning is stated nowhere': {
      context: withColumn(context(rows({}), unsaid), 'fluxSigmaGM2Yr', { heading: 'error' }),
      first: { sheet: null, field: 'uncertaintyMeaning', remedyKind: 'answer' },
    },
  },
});
