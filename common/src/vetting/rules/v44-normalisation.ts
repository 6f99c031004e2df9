import { marineRows, speaksOfNormalisation } from '../marine';
import { filePlace } from '../place';
import type { Rule } from '../rule';
import { counted } from '../wording';

/** Marine fluxes say whether they are normalised to 230Th; if not, sediment focusing stays in them. */
export const normalisation: Rule = {
  id: 'V44',
  slug: 'normalisation',
  title: '230Th normalisation not stated',
  severity: 'warning',
  stage: 'submission',
  needs: ['archive', 'method'],
  source: 'Francois et al. 2004, Paleoceanography 19, PA1018, from memory',
  why: 'Currents pile up or carry off mud: without normalisation a flux may be several times that from above.',

  *check(context) {
    const rows = marineRows(context);
    if (rows.length === 0 || speaksOfNormalisation(context)) return;
    yield {
      ...filePlace('method'),
      message: `For ${counted(rows.length, 'marine sample')} it is not stated whether fluxes are normalised to 230Th.`,
      remedy: 'Say in the method "230Th-normalised", or "not normalised" so that focusing is flagged.',
      remedyKind: 'answer',
    };
  },
};
