import { fitsSurface, landShare, onGlobe } from '../land';
import { placeOf } from '../place';
import type { Rule } from '../rule';
import { archiveOf, sitesOf } from '../samples';

/**
 * Marine cores lie at sea; loess, peat, lake and ice on land.
 *
 * Limits of the check: present-day land in cells of 2°, so a coastal cell fits both, a small island may be
 * missed (waive it), and land ice is not told from bare land. Shelves exposed at the Last Glacial Maximum
 * count as sea: a loess site there is waived with that reason.
 */
export const archiveSurface: Rule = {
  id: 'V12',
  slug: 'archive-surface',
  title: 'Archive and surface do not fit',
  severity: 'warning',
  stage: 'submission',
  needs: ['latitudeDeg', 'longitudeDeg', 'archive'],
  source: 'common practice, no source; land share from Natural Earth 1:50 million, 2° cells',
  why: 'A core on the wrong surface has a wrong position or a wrong archive, and would be averaged into the wrong region.',

  *check(context) {
    const share = landShare();
    for (const { name, latitudeDeg, longitudeDeg, rows } of sitesOf(context)) {
      const archive = archiveOf(context, rows[0]!);
      if (archive === null || !onGlobe(latitudeDeg, longitudeDeg)) continue;
      if (fitsSurface(archive, share(latitudeDeg, longitudeDeg))) continue;
      yield {
        ...placeOf(context, rows[0]!, 'latitudeDeg'),
        message: `${name} is a ${archive} archive, but ${latitudeDeg}°, ${longitudeDeg}° lies in a 2° cell that is all ${archive === 'marine' ? 'land' : 'sea'} today.`,
        remedy: 'Type the right coordinates or archive, or waive it (a small island, a shelf exposed then).',
        remedyKind: 'waive',
      };
    }
  },
};
