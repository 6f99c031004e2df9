import type { DatasetVersionDetail } from '@siltlight/common/wire/datasets';
import { geoAzimuthalEqualArea, geoEqualEarth, geoGraticule, geoPath } from 'd3-geo';
import { useMemo } from 'react';
import { feature } from 'topojson-client';
import type { GeometryCollection, Topology } from 'topojson-specification';
import land110 from 'world-atlas/land-110m.json';
import { counted } from '../../shared/number/format';

type Site = DatasetVersionDetail['sites'][number];

const topology = land110 as unknown as Topology<{ land: GeometryCollection }>;
const land = feature(topology, topology.objects.land);
const POLAR_FROM_DEG = 23;
const POLAR_REACH_DEG = 75;

/** Sites of one polar cap are seen from above their pole, all others on the whole Earth. */
export function poleOf(sites: readonly Pick<Site, 'latitudeDeg'>[]): 'north' | 'south' | null {
  if (sites.length === 0) return null;
  if (sites.every(({ latitudeDeg }) => latitudeDeg < -POLAR_FROM_DEG)) return 'south';
  return sites.every(({ latitudeDeg }) => latitudeDeg > POLAR_FROM_DEG) ? 'north' : null;
}

type Props = { sites: readonly Site[]; selected: string; widthPx: number; onSelect: (site: string) => void };

/** Where the sites lie; few marks, so they are drawn as SVG. The list beside it holds the keyboard. */
export function SitesMap({ sites, selected, widthPx, onSelect }: Props) {
  const pole = poleOf(sites);
  const heightPx = pole ? widthPx : Math.round(widthPx * 0.4867);
  const projection = useMemo(() => {
    const extent: [[number, number], [number, number]] = [
      [2, 2],
      [widthPx - 2, heightPx - 2],
    ];
    const base = pole
      ? geoAzimuthalEqualArea()
          .rotate([0, pole === 'south' ? 90 : -90])
          .clipAngle(POLAR_REACH_DEG)
      : geoEqualEarth();
    return base.fitExtent(extent, { type: 'Sphere' });
  }, [pole, widthPx, heightPx]);
  const path = geoPath(projection);
  const ground = pole ? `seen from the ${pole} pole` : 'on a world map';
  return (
    <svg
      width={widthPx}
      height={heightPx}
      className="sites-map"
      role="img"
      aria-label={`${counted(sites.length, 'site')} ${ground}`}
    >
      <path d={path({ type: 'Sphere' }) ?? ''} className="map-sphere" />
      <path d={path(geoGraticule().step([30, 30])()) ?? ''} className="map-graticule" />
      <path d={path(land) ?? ''} className="map-land" />
      {sites.map((site) => {
        const point = projection([site.longitudeDeg, site.latitudeDeg]);
        return (
          point && (
            <circle
              key={site.site}
              cx={point[0]}
              cy={point[1]}
              r={3.2 + Math.min(7, Math.sqrt(site.sampleCount) * 0.42)}
              className={site.site === selected ? 'map-site picked' : 'map-site'}
              onClick={() => onSelect(site.site === selected ? '' : site.site)}
            >
              <title>
                {site.site}: {counted(site.sampleCount, 'sample')}
              </title>
            </circle>
          )
        );
      })}
    </svg>
  );
}
