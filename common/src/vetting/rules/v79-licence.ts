import { filePlace } from '../place';
import type { Rule } from '../rule';
import { asked } from '../wording';

/** SPDX identifiers of licences used for data; others in their form are taken too. */
const SPDX =
  /^(CC0-1\.0|CC-BY(-(SA|NC|ND|NC-SA|NC-ND))?-[1-4]\.0|ODbL-1\.0|ODC-By-1\.0|PDDL-1\.0|MIT|Apache-2\.0|[A-Za-z][A-Za-z0-9.+]*(-[A-Za-z0-9.+]+)*-\d+(\.\d+)*)$/;

/** A licence by its SPDX identifier, or permission said in words. Without one nothing is released. */
export const licence: Rule = {
  id: 'V79',
  slug: 'licence',
  title: 'Licence not stated',
  severity: 'error',
  stage: 'submission',
  needs: ['licence'],
  source: 'SPDX License List, from memory',
  why: 'Without a licence nobody may reuse the data, and a release takes the strictest licence of its parts.',
  kinds: 'all',

  *check(context) {
    const text = context.metadata.licence?.trim() ?? '';
    if (text === '') {
      yield {
        ...filePlace('licence'),
        ...asked(context, 'The licence', 'choose an SPDX licence such as CC-BY-4.0.'),
      };
    } else if (!SPDX.test(text) && text.split(/\s+/).length < 4) {
      yield {
        ...filePlace('licence'),
        message: `The licence "${text.slice(0, 60)}" is neither an SPDX identifier nor a statement in words.`,
        remedy:
          'Answer in the form with an SPDX identifier such as CC-BY-4.0, or say in a sentence who may reuse the data.',
        remedyKind: 'answer',
      };
    }
  },
};
