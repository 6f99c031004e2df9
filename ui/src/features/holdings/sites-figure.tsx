import type { DatasetVersionDetail } from '@siltlight/common/wire/datasets';
import { Figure } from '../../shared/figure/figure';
import { useWidth } from '../../shared/figure/use-width';
import { formatAge, formatNumber } from '../../shared/number/format';
import type { DataColumn } from '../../shared/table/column';
import { poleOf, SitesMap } from './sites-map';

type Site = DatasetVersionDetail['sites'][number];
type Props = { sites: readonly Site[]; selected: string; onSelect: (site: string) => void };

const degrees = (value: number, [positive, negative]: [string, string]) =>
  `${formatNumber(Math.abs(value), { decimals: 2 })}° ${value < 0 ? negative : positive}`;

const columns: DataColumn<Site>[] = [
  { id: 'site', header: 'Site', value: (site) => site.site },
  {
    id: 'latitude',
    header: 'Latitude',
    unit: '°N',
    align: 'right',
    value: (site) => site.latitudeDeg,
    cell: (site) => degrees(site.latitudeDeg, ['N', 'S']),
  },
  {
    id: 'longitude',
    header: 'Longitude',
    unit: '°E',
    align: 'right',
    value: (site) => site.longitudeDeg,
    cell: (site) => degrees(site.longitudeDeg, ['E', 'W']),
  },
  { id: 'region', header: 'Region', value: (site) => site.regionName },
  { id: 'samples', header: 'Samples', align: 'right', value: (site) => site.sampleCount },
  { id: 'youngest', header: 'Youngest', unit: 'ka BP', align: 'right', value: (site) => site.youngestKaBp },
  { id: 'oldest', header: 'Oldest', unit: 'ka BP', align: 'right', value: (site) => site.oldestKaBp },
];

/** Map and list of the sites in step; picking one filters the plot and the samples. */
export function SitesFigure({ sites, selected, onSelect }: Props) {
  const [box, width] = useWidth(548);
  const polar = poleOf(sites) !== null;
  const stacked = width < 440 || !polar; // the whole Earth wants the width, a polar cap leaves room beside it
  const mapPx = polar ? Math.min(286, stacked ? width : Math.floor(width * 0.52)) : width;
  const oldest = Math.max(1, ...sites.map((site) => site.oldestKaBp ?? 0));
  return (
    <Figure
      title="Sites"
      sub="sized by samples; reach in ka"
      summary={`${sites.length} sites, the oldest sample at ${formatAge(oldest)} ka before 1950.`}
      table={{ columns, rows: sites, rowKey: (site) => site.site }}
    >
      <div ref={box} className={stacked ? 'sites stacked' : 'sites'}>
        <SitesMap sites={sites} selected={selected} widthPx={mapPx} onSelect={onSelect} />
        <div className="sites-list" tabIndex={0} role="region" aria-label="List of sites">
          <table className="sl-table" aria-label="Sites and their reach">
            <thead>
              <tr>
                <th>Site</th>
                <th className="right">Samples</th>
                <th>
                  <span className="reach-axis">
                    <span>0</span>
                    <span>{formatAge(oldest)}</span>
                  </span>
                </th>
              </tr>
            </thead>
            <tbody>
              {sites.map((site) => (
                <SiteRow key={site.site} {...{ site, selected, onSelect, oldest }} />
              ))}
            </tbody>
          </table>
        </div>
      </div>
    </Figure>
  );
}

const REACH_PX = 84;

function SiteRow({
  site,
  selected,
  onSelect,
  oldest,
}: Omit<Props, 'sites'> & { site: Site; oldest: number }) {
  const picked = site.site === selected;
  const x = (ageKa: number) => (Math.max(0, ageKa) / oldest) * REACH_PX;
  const { youngestKaBp, oldestKaBp } = site;
  return (
    <tr aria-selected={picked}>
      <td>
        <button
          type="button"
          className="site-button"
          aria-pressed={picked}
          title={[
            degrees(site.latitudeDeg, ['N', 'S']),
            degrees(site.longitudeDeg, ['E', 'W']),
            site.regionName,
          ]
            .filter(Boolean)
            .join(', ')}
          onClick={() => onSelect(picked ? '' : site.site)}
        >
          {site.site}
        </button>
      </td>
      <td className="right">{site.sampleCount}</td>
      <td>
        {youngestKaBp !== null && oldestKaBp !== null && (
          <svg
            width={REACH_PX}
            height="10"
            role="img"
            aria-label={`${formatAge(oldestKaBp)} to ${formatAge(youngestKaBp)} ka`}
          >
            <line
              x1={x(youngestKaBp)}
              x2={Math.max(x(oldestKaBp), x(youngestKaBp) + 2)}
              y1="5"
              y2="5"
              className="reach"
            />
          </svg>
        )}
      </td>
    </tr>
  );
}
