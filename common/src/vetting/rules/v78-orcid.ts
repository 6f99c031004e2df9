import { filePlace } from '../place';
import type { Rule } from '../rule';

/** ORCID iDs have 16 digits and a check digit that fits. */
export const orcid: Rule = {
  id: 'V78',
  slug: 'orcid',
  title: 'ORCID iD is not valid',
  severity: 'warning',
  stage: 'submission',
  needs: ['creators'],
  source: 'ORCID, structure of the identifier; check digit by ISO 7064 MOD 11-2',
  why: 'A mistyped iD credits nobody, or somebody else.',
  kinds: 'all',

  *check({ metadata }) {
    for (const { name, orcid: written } of metadata.creators ?? []) {
      const text = written?.trim() ?? '';
      if (text === '' || isValidOrcid(text)) continue;
      yield {
        ...filePlace('creators'),
        subject: name,
        message: `The ORCID iD "${text.slice(0, 60)}" of ${name} is not valid.`,
        remedy: 'Answer in the form with the iD as shown on the ORCID page, e.g. 0000-0002-1825-0097.',
        remedyKind: 'answer',
      };
    }
  },
};

/**
 * Whether a text is an ORCID iD, with or without its address.
 * ISO 7064 MOD 11-2: total = (total + digit) · 2 over 15 digits; check = (12 − total mod 11) mod 11, 10 written X.
 */
export function isValidOrcid(text: string): boolean {
  const parts = /^(?:https?:\/\/orcid\.org\/)?(\d{4})-(\d{4})-(\d{4})-(\d{3})([\dX])$/.exec(text);
  if (!parts) return false;
  const total = [...parts.slice(1, 5).join('')].reduce((sum, digit) => (sum + Number(digit)) * 2, 0);
  const check = (12 - (total % 11)) % 11;
  return parts[5] === (check === 10 ? 'X' : String(check));
}
