import { examplesOf } from './examples.test-support';
import { answers, context, rows, withColumn } from './rows.test-support';
import { ageDatum } from './v18-age-datum';

const silent = { ...answers, ageDatum: undefined };
const unanswered = context(rows({}), { metadata: silent });
const headed = (heading: string, unit: string | null, base = unanswered) =>
  withColumn(base, 'ageKaBp', { heading, unit });

examplesOf(ageDatum, {
  quiet: {
    'the unit says ka BP': headed('Age', 'ka BP'),
    'the heading says b2k and the unit yr': headed('Age b2k', 'yr'),
    'the German heading says a v. 1950': headed('Alter (a v. 1950)', 'a v. 1950'),
    'the form says the datum': headed('Age', 'ka', context(rows({}))),
  },
  fires: {
    'a unit has no datum and the form none': {
      context: headed('Age', 'ka'),
      first: { severity: 'error', field: 'ageDatum', remedyKind: 'answer' },
    },
    'a file without a form has no datum': {
      context: { ...headed('Age', 'ka'), formOffered: false },
      first: { severity: 'warning', field: 'ageDatum' },
    },
    'there is no unit of time at all': {
      context: headed('Age', 'm', context(rows({}))),
      first: { severity: 'error', field: 'ageKaBp' },
    },
  },
});
