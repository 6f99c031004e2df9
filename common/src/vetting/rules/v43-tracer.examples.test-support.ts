import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { tracer } from './v43-tracer';

const fromTracer = (method: string) =>
  context(rows({}), { metadata: { ...answers, dustDefinition: 'from-tracer', method } });

examplesOf(tracer, {
  quiet: { 'dust was weighed': context(rows({})), 'the factor is named': fromTracer('Ca, factor 5') },
  fires: {
    'a column is of nssCa': {
      context: context(rows({ quantity: 'nssCa' }, { quantity: 'nssCa' })),
      first: { severity: 'warning', row: null, field: 'fluxGM2Yr', remedyKind: 'waive' },
    },
    'dust comes from a tracer by a factor not named': {
      context: fromTracer('ion chromatography of calcium'),
      first: { severity: 'warning', field: 'method', remedyKind: 'answer' },
    },
  },
});
