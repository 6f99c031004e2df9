import type { Archive } from '../archive';
import type { VettingContext } from '../context';
import { fitsSurface, landShare, nearIceSheet, onGlobe } from '../land';
import { placeOf } from '../place';
import type { Rule, RuleHit } from '../rule';
import { archiveOf, type Site, sitesOf } from '../samples';

/**
 * Marine cores lie at sea; loess, peat, lake and ice on land; ice on Greenland or Antarctica.
 *
 * Limits of the check: present-day land in cells of 2°, so a coastal cell fits both and a small island may be
 * missed; land ice is told by the AR6 regions GIC, EAN and WAN alone, so an ice core of a mountain glacier or a
 * small cap is asked about too, and bare ground inside the three is not. Shelves exposed at the Last Glacial
 * Maximum count as sea: a loess site there is waived with that reason.
 */
export const archiveSurface: Rule = {
  id: 'V12',
  slug: 'archive-surface',
  title: 'Archive and surface do not fit',
  severity: 'warning',
  stage: 'submission',
  needs: ['latitudeDeg', 'longitudeDeg', 'archive'],
  source:
    'common practice, no source; land share from Natural Earth 1:50 million, 2° cells; ice sheets by AR6 regions (Iturbide et al. 2020, doi:10.5194/essd-12-2959-2020)',
  why: 'A core on the wrong surface has a wrong position or a wrong archive, and would be averaged into the wrong region.',

  *check(context) {
    const share = landShare();
    for (const site of sitesOf(context)) {
      const { latitudeDeg, longitudeDeg, rows } = site;
      const archive = archiveOf(context, rows[0]!);
      if (archive === null || !onGlobe(latitudeDeg, longitudeDeg)) continue;
      if (!fitsSurface(archive, share(latitudeDeg, longitudeDeg))) yield wrongSurface(context, site, archive);
      else if (archive === 'ice' && !nearIceSheet(latitudeDeg, longitudeDeg)) yield noIceSheet(context, site);
    }
  },
};

function wrongSurface(context: VettingContext, site: Site, archive: Archive): RuleHit {
  const { name, latitudeDeg, longitudeDeg, rows } = site;
  return {
    ...placeOf(context, rows[0]!, 'latitudeDeg'),
    message: `${name} is a ${archive} archive, but ${latitudeDeg}°, ${longitudeDeg}° lies in a 2° cell that is all ${archive === 'marine' ? 'land' : 'sea'} today.`,
    remedy: 'Type the right coordinates or archive, or waive it (a small island, a shelf exposed then).',
    remedyKind: 'waive',
  };
}

function noIceSheet(context: VettingContext, { name, latitudeDeg, longitudeDeg, rows }: Site): RuleHit {
  return {
    ...placeOf(context, rows[0]!, 'latitudeDeg'),
    subject: 'ice-sheet',
    message: `${name} is an ice core, but ${latitudeDeg}°, ${longitudeDeg}° lies neither on Greenland nor in Antarctica; smaller glaciers are not known here.`,
    remedy: 'Type the right coordinates or archive, or waive it with the name of the glacier or ice cap.',
    remedyKind: 'waive',
  };
}
