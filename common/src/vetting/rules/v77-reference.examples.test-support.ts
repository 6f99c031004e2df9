import { examplesOf } from './examples.test-support';
import { answers, context, rows } from './rows.test-support';
import { reference } from './v77-reference';

const given = (publicationDoi: string | undefined, publicationCitation?: string) =>
  context(rows({}), { metadata: { ...answers, publicationDoi, publicationCitation } });

examplesOf(reference, {
  quiet: {
    'a DOI is given': given('10.1038/nature06763'),
    'a full citation is given': given(undefined, 'Lambert et al. 2008, Nature 452, 616-619'),
    'nothing is given, which another rule says': given(undefined),
  },
  fires: {
    'the DOI is an address, with its mend': {
      context: given('https://doi.org/10.1038/nature06763'),
      first: { severity: 'warning', field: 'publicationDoi', proposal: '10.1038/nature06763' },
    },
    'the citation is a name': {
      context: given(undefined, 'Lambert 2008'),
      first: { severity: 'warning', field: 'publicationCitation', remedyKind: 'answer' },
    },
  },
});
