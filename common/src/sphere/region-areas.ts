import { readChoice, refuseUnused } from '../physical/check-fields';
import { EARTH_RADIUS_M } from '../physical/constants';
import type { Caution } from '../physical/domain-error';
import { planarPolygonAreaSr } from './polygon-area';
import { ar6Regions, REGION_SETS } from './region-set';

export interface RegionAreas {
  regions: { code: string; name: string; areaKm2: number; shareOfSphere: number }[];
  method: { name: string; source: string };
  cautions: Caution[];
}

/**
 * Areas of a region set's polygons as published, each on its own.
 *
 * @throws DomainError for a region set that is missing or not at hand, and for a field that is not used
 * Checked against: reference/checks/general/ar6_region_areas.csv.
 */
export function calculateRegionAreas(request: { regionSet: string }): RegionAreas {
  refuseUnused(request, ['regionSet']);
  readChoice(request, 'regionSet', REGION_SETS);
  const regions = ar6Regions().map(({ code, name, parts }) => {
    const areaSr = parts.reduce((sum, ring) => sum + planarPolygonAreaSr(ring), 0);
    return {
      code,
      name,
      areaKm2: areaSr * (EARTH_RADIUS_M / 1000) ** 2,
      shareOfSphere: areaSr / (4 * Math.PI),
    };
  });
  return {
    regions,
    method: {
      name: 'Exact area between straight longitude–latitude edges on a sphere of 6371.007181 km',
      source: 'IPCC AR6 reference regions version 4, Iturbide et al. (2020), doi:10.5194/essd-12-2959-2020',
    },
    cautions: [
      {
        code: 'regions-overlap',
        message:
          'The published polygons overlap slightly in nine pairs and leave small gaps, so these areas add up to ' +
          '1.00007 of the sphere. Results per region use a partition instead: the first region in table order.',
      },
    ],
  };
}
