import { fitsSurface, landShare, onGlobe } from '../land';
import { placeOf } from '../place';
import type { Rule } from '../rule';
import { archiveOf, sitesOf } from '../samples';

/** For a site on the wrong surface: would swapping the coordinates, or turning a sign, put it right? */
export const swappedCoordinates: Rule = {
  id: 'V11',
  slug: 'swapped-coordinates',
  title: 'Swapped coordinates or a lost sign',
  severity: 'warning',
  stage: 'submission',
  needs: ['latitudeDeg', 'longitudeDeg', 'archive'],
  source: 'common practice, no source; land share from Natural Earth 1:50 million, 2° cells',
  why: 'Swapped columns and lost minus signs are the usual reason for a marine core on land; the hint saves the search.',

  *check(context) {
    const share = landShare();
    for (const { name, latitudeDeg: lat, longitudeDeg: lon, rows } of sitesOf(context)) {
      const archive = archiveOf(context, rows[0]!);
      if (archive === null || !onGlobe(lat, lon) || fitsSurface(archive, share(lat, lon))) continue;
      const repairs: [string, number, number][] = [
        ['turning the sign of the longitude', lat, -lon],
        ['turning the sign of the latitude', -lat, lon],
        ['swapping latitude and longitude', lon, lat],
      ];
      const found = repairs.find(([, la, lo]) => onGlobe(la, lo) && fitsSurface(archive, share(la, lo)));
      if (!found) continue;
      yield {
        ...placeOf(context, rows[0]!, 'latitudeDeg'),
        message: `${name} (${archive}) at ${lat}°, ${lon}° lies on the wrong surface; ${found[0]} would put it right, at ${found[1]}°, ${found[2]}°.`,
        remedy: 'Compare with the publication and type the right coordinates, or waive it if they are right.',
        remedyKind: 'mend',
      };
    }
  },
};
