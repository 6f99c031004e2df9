import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { dustDefinition } from './v41-dust-definition';

const silent = { metadata: { ...answers, dustDefinition: undefined } };

examplesOf(dustDefinition, {
  quiet: {
    'the form says it': context(rows({})),
    'the rows are of a tracer, which is not called dust': context(rows({ quantity: 'nssCa' }), silent),
  },
  fires: {
    'nothing is said': {
      context: context(rows({}), silent),
      first: { severity: 'error', sheet: null, field: 'dustDefinition', remedyKind: 'answer' },
    },
    'a file is checked without a form': {
      context: context(rows({}), { ...silent, formOffered: false }),
      first: { severity: 'warning', remedyKind: 'answer' },
    },
  },
});
