import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { orcid } from './v78-orcid';

const by = (id: string | undefined) =>
  context(rows({}), { metadata: { ...answers, creators: [{ name: 'J. Carberry', orcid: id }] } });

examplesOf(orcid, {
  quiet: {
    // the two iDs that ORCID itself prints as examples, from memory
    'the iD is valid': by('0000-0002-1825-0097'),
    'its check digit is X': by('0000-0002-1694-233X'),
    'it is given as an address': by('https://orcid.org/0000-0002-1825-0097'),
    'none is given': by(undefined),
  },
  fires: {
    'two digits are exchanged': {
      context: by('0000-0002-1825-0079'),
      first: { severity: 'warning', field: 'creators', remedyKind: 'answer' },
    },
    'it is no iD at all': { context: by('carberry'), first: { severity: 'warning' } },
  },
});
