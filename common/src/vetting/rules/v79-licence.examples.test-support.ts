import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { licence } from './v79-licence';

const under = (text: string | undefined, formOffered = true) =>
  context(rows({}), { metadata: { ...answers, licence: text }, formOffered });

examplesOf(licence, {
  quiet: {
    'an SPDX identifier is given': under('CC-BY-NC-4.0'),
    'another SPDX identifier is given': under('etalab-2.0'),
    'permission is said in words': under('free for any use, naming the authors'),
  },
  fires: {
    'none is given': {
      context: under(undefined),
      first: { severity: 'error', sheet: null, field: 'licence', remedyKind: 'answer' },
    },
    'none is given with a file without a form': {
      context: under(undefined, false),
      first: { severity: 'warning' },
    },
    'a word is given that is no licence': { context: under('open'), first: { severity: 'error' } },
  },
});
