import { filePlace } from '../place';
import type { Rule } from '../rule';

const DOI = /^10\.\d{4,9}\/\S+$/;
/** A citation holds at least a year and room for authors and title. */
const isFullCitation = (text: string): boolean => text.length >= 30 && /\b(1[6-9]|20)\d\d\b/.test(text);

/** The DOI has the form of one; without a DOI the citation is full. Whether it resolves is not asked of the network. */
export const reference: Rule = {
  id: 'V77',
  slug: 'reference',
  title: 'Reference is not in the form of a DOI or full citation',
  severity: 'warning',
  stage: 'submission',
  needs: ['publicationDoi', 'publicationCitation'],
  source: 'form of a DOI: ISO 26324 and the DOI Handbook, from memory',
  why: 'The reference is what a reader follows from a number back to its paper.',
  kinds: 'all',

  *check({ metadata }) {
    const doi = metadata.publicationDoi?.trim() ?? '';
    const citation = metadata.publicationCitation?.trim() ?? '';
    if (doi !== '' && !DOI.test(doi)) {
      const bare = /10\.\d{4,9}\/\S+/.exec(doi)?.[0];
      yield {
        ...filePlace('publicationDoi'),
        message: `The DOI "${doi.slice(0, 100)}" does not have the form 10.1234/abc.`,
        remedy: bare
          ? `Answer in the form: ${bare}.`
          : 'Answer in the form with the DOI alone, or with the full citation.',
        remedyKind: 'answer',
        ...(bare ? { proposal: bare } : {}),
      };
    } else if (doi === '' && citation !== '' && !isFullCitation(citation)) {
      yield {
        ...filePlace('publicationCitation'),
        message: `The citation "${citation.slice(0, 100)}" lacks authors, year or title.`,
        remedy: 'Answer in the form with authors, year, title, journal, volume and pages, or with the DOI.',
        remedyKind: 'answer',
      };
    }
  },
};
