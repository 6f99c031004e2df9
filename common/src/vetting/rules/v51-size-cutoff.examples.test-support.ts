import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { sizeCutoff } from './v51-size-cutoff';

const answered = (text: string | undefined) => ({ metadata: { ...answers, sizeCutoff: text } });

examplesOf(sizeCutoff, {
  quiet: {
    'the form says bulk': context(rows({})),
    'the form says <10 um': context(rows({}), answered('<10 um')),
    'every row says it': context(rows({ sizeCutoff: '<20 µm' }), answered(undefined)),
  },
  fires: {
    'neither sheet nor form says it': {
      context: context(rows({}), answered(undefined)),
      first: { severity: 'error', sheet: null, field: 'sizeCutoff', remedyKind: 'answer' },
    },
    'a file without a form does not say it': {
      context: context(rows({}), { ...answered(undefined), formOffered: false }),
      first: { severity: 'warning' },
    },
    'a row gives a radius': {
      context: context(rows({ sizeCutoff: 'radius < 5 µm' })),
      first: { severity: 'error', row: 2, field: 'sizeCutoff', remedyKind: 'mend' },
    },
  },
});
