import { filePlace } from '../place';
import type { Rule } from '../rule';
import { countedRows } from '../samples';
import { statements } from '../wording';

const METHOD =
  /laser|coulter|siev|sieb|pipett|settling|sedigraph|microscop|mikroskop|abakus|single.?particle/i;

/** A cut at a diameter names the instrument: laser, Coulter counter, sieve and pipette see different diameters. */
export const sizeMethod: Rule = {
  id: 'V53',
  slug: 'size-method',
  title: 'Method of sizing not named',
  severity: 'note',
  stage: 'submission',
  needs: ['sizeCutoff', 'method'],
  source: 'common practice, no source',
  why: 'An optical, a volume and a settling diameter of one flake of mica differ by up to two times.',

  *check(context) {
    const cutoffs = [context.metadata.sizeCutoff, ...countedRows(context).map((row) => row.sizeCutoff)];
    const cut = cutoffs.find((text) => /\d/.test(text ?? ''));
    if (!cut || METHOD.test(statements(context))) return;
    yield {
      ...filePlace('method'),
      message: `Fluxes are cut at a diameter ("${cut.slice(0, 60)}"), but the method of sizing is not named.`,
      remedy: 'Name it in the method: laser, Coulter counter, sieve, pipette or another.',
      remedyKind: 'none',
    };
  },
};
