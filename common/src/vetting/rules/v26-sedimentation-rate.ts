import { limitsOf } from '../limits';
import { placeOf } from '../place';
import type { Rule } from '../rule';
import { archiveOf, cores } from '../samples';
import { sedimentationSteps } from '../sedimentation';
import { shown } from '../wording';

const LIMITS = {
  marineMin: 0.1,
  marineMax: 500,
  loessMin: 1,
  loessMax: 2000,
  lakeMin: 1,
  lakeMax: 1000,
  peatMin: 1,
  peatMax: 500,
};

/** Sedimentation rates within what the archive is known for [cm kyr⁻¹]. Ice has its own measure and is not asked. */
export const sedimentationRate: Rule = {
  id: 'V26',
  slug: 'sedimentation-rate',
  title: 'Sedimentation rate unusual for the archive',
  severity: 'warning',
  stage: 'submission',
  needs: ['archive', 'sedimentationRateCmKyr'],
  source: 'common practice, no source',
  why: 'A rate off by 10 or 1000 comes from mixed units of depth or age, and the flux is proportional to it.',
  limits: LIMITS,

  *check(context) {
    for (const core of cores(context)) {
      const archive = archiveOf(context, core[0]!);
      if (archive === null || archive === 'ice' || archive === 'other') continue;
      const limits = limitsOf(context, 'V26', LIMITS, archive);
      const [min, max] = [limits[`${archive}Min`], limits[`${archive}Max`]];
      for (const { row, rateCmKyr, stated } of sedimentationSteps(core)) {
        if (rateCmKyr >= min && rateCmKyr <= max) continue;
        yield {
          ...placeOf(context, row, stated ? 'sedimentationRateCmKyr' : 'depthM'),
          message: `The sedimentation rate ${stated ? 'of' : 'down to'} row ${row.row} is ${shown(rateCmKyr)} cm/kyr; ${min} to ${max} cm/kyr is usual for ${archive}.`,
          remedy: 'Check the units of depth, age and rate, or waive it with a reason.',
          remedyKind: 'waive',
        };
      }
    }
  },
};
