import type { EstimateDetail, EstimateResult } from '@siltlight/common/wire/estimates';
import type { FieldSite } from '@siltlight/common/wire/slices';
import { useMemo, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { Basis } from './basis';
import { Headline } from './headline';
import { KindsTable } from './kinds-table';
import { PublishedFigure } from './published-figure';
import { RegionMap } from './region-map';
import { RegionPanel } from './region-panel';
import { RegionTable } from './region-table';
import type { Part } from './result-words';
import { VariedTable } from './varied-table';
import { YearFigure } from './year-figure';

type Props = {
  estimate: EstimateDetail;
  result: EstimateResult;
  /** Sites of the field; null while they are on their way. */
  sites: FieldSite[] | null;
  traceOf: (site: FieldSite) => string;
  statusText: (region: EstimateResult['regions'][number]) => string;
};

const isPart = (text: string | null): text is Part => text === 'sw' || text === 'lw' || text === 'net';
const noSites: FieldSite[] = [];

/** The result: headline, map and table in step, and what stands behind and beside it. */
export function EstimateReport({ estimate, result, sites, traceOf, statusText }: Props) {
  const [params, setParams] = useSearchParams();
  const [hovered, setHovered] = useState<string | null>(null);
  const selected = params.get('region');
  const wanted = params.get('part');
  const part: Part = isPart(wanted) ? wanted : 'net';
  const set = (name: string, value: string | null) =>
    setParams(
      (before) => {
        const next = new URLSearchParams(before);
        if (value === null) next.delete(name);
        else next.set(name, value);
        return next;
      },
      { replace: true, preventScrollReset: true },
    );
  const region = result.regions.find((one) => one.code === selected);
  const used = useMemo(() => (sites ?? noSites).filter((site) => site.unusedReason === null), [sites]);
  const mapSites = useMemo(
    () =>
      used.map((site) => ({
        longitudeDeg: site.longitudeDeg,
        latitudeDeg: site.latitudeDeg,
        sampleCount: Math.max(1, site.sliceSamples + site.referenceSamples),
        name: site.site,
      })),
    [used],
  );
  const select = (code: string | null) => set('region', code === selected ? null : code);
  const step = { selected, hovered, onSelect: select, onHover: setHovered };
  return (
    <div className="estimate">
      <Headline result={result} context={estimate.context} />
      <div className="estimate-pair">
        <RegionMap
          {...step}
          regions={result.regions}
          sites={mapSites}
          part={part}
          onPart={(next) => set('part', next === 'net' ? null : next)}
        />
        <RegionTable {...step} result={result} part={part} usedSites={used.length} />
      </div>
      {region && (
        <RegionPanel
          region={region}
          sites={sites && sites.filter((site) => site.regionCode === region.code)}
          traceOf={traceOf}
          statusText={statusText(region)}
          onClose={() => set('region', null)}
        />
      )}
      <div className="estimate-figures">
        <YearFigure monthly={result.monthly} />
        <PublishedFigure result={result} published={estimate.context.published} />
        <KindsTable result={result} />
      </div>
      <div className="estimate-basis">
        <VariedTable varied={result.varied} />
        <Basis estimate={estimate} />
      </div>
    </div>
  );
}
