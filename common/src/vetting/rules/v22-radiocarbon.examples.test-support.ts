import { examplesOf } from './examples.test-support';
import { answers, context, rows, withColumn } from './rows.test-support';
import { radiocarbon } from './v22-radiocarbon';

const with14C = (ageModel: string, archive: 'marine' | 'loess' = 'loess') =>
  context(rows({}), { metadata: { ...answers, archive, ageModel } });

examplesOf(radiocarbon, {
  quiet: {
    'no radiocarbon is spoken of': context(rows({})),
    'the curve is named': with14C('12 radiocarbon dates, IntCal20'),
    'curve and reservoir age are named at sea': with14C('14C, Marine20, ΔR = 100 ± 50 yr', 'marine'),
  },
  fires: {
    'the curve is not named': { context: with14C('12 radiocarbon dates'), first: { severity: 'warning' } },
    'the reservoir age is not named at sea': {
      context: with14C('14C, Marine20', 'marine'),
      first: { severity: 'warning', field: 'ageModel', remedyKind: 'answer' },
    },
    'a column holds uncalibrated years': {
      context: withColumn(context(rows({})), 'ageKaBp', { heading: '14C age', unit: 'yr BP' }),
      first: { severity: 'warning', field: 'ageKaBp' },
    },
  },
});
