import { Button } from '@fluentui/react-components';
import { Dismiss20Regular } from '@fluentui/react-icons';
import type { EstimateRegionResult } from '@siltlight/common/wire/estimates';
import type { FieldSite } from '@siltlight/common/wire/slices';
import { useEffect, useRef, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { ExplainedCautions } from '../../shared/feedback/explained-cautions';
import { Amount } from '../../shared/number/amount';
import { counted, formatNumber, formatPercent } from '../../shared/number/format';
import { Unit } from '../../shared/number/unit';

type Props = {
  region: EstimateRegionResult;
  /** Null while the field is on its way. */
  sites: FieldSite[] | null;
  /** Address of the page with the samples behind a site. */
  traceOf: (site: FieldSite) => string;
  statusText: string;
  onClose: () => void;
};

/** One region: its numbers, and the sites they rest on, each a link to its samples. */
export function RegionPanel({ region, sites, traceOf, statusText, onClose }: Props) {
  const panel = useRef<HTMLElement>(null);
  useEffect(() => {
    panel.current?.scrollIntoView?.({ block: 'nearest' });
  }, [region.code]);
  return (
    <section ref={panel} className="region-panel" aria-label={`Region ${region.name}`}>
      <header>
        <h2>{region.name}</h2>
        <span className="sl-small sl-muted">
          {formatPercent(region.areaShare, 1)} of the Earth, {statusText}
        </span>
        <span className="sl-grow" />
        <Button
          size="small"
          appearance="subtle"
          className="sl-noprint"
          icon={<Dismiss20Regular />}
          aria-label={`Close ${region.name}`}
          onClick={onClose}
        />
      </header>
      <div className="region-panel-body">
        <RegionNumbers region={region} />
        <div>
          <RegionSites {...{ region, sites, traceOf }} />
          <ExplainedCautions of={region.cautions} label={`Cautions for ${region.name}`} />
        </div>
      </div>
    </section>
  );
}

function RegionNumbers({ region }: { region: EstimateRegionResult }) {
  const depth = (value: number) => formatNumber(value, { figures: 2 });
  const lines: [ReactNode, ReactNode][] = [
    ['Net forcing', <Amount key="net" of={region.forcing.netWm2} unit="W m-2" />],
    ['Shortwave', <Amount key="sw" of={region.forcing.shortwaveWm2} unit="W m-2" />],
    ['Longwave', <Amount key="lw" of={region.forcing.longwaveWm2} unit="W m-2" />],
    [
      'Direct effect of the slice (another kind)',
      <Amount key="de" of={region.directEffect.netWm2} unit="W m-2" />,
    ],
  ];
  return (
    <dl className="region-numbers">
      {lines.map(([name, value], at) => (
        <div key={at}>
          <dt>{name}</dt>
          <dd>{value}</dd>
        </div>
      ))}
      <div>
        <dt>Optical depth, slice and reference</dt>
        <dd>
          {depth(region.opticalDepthSlice)} and {depth(region.opticalDepthReference)}
        </dd>
      </div>
      <div>
        <dt>Surface albedo, cloud</dt>
        <dd>
          {formatNumber(region.surfaceAlbedo, { decimals: 2 })},{' '}
          {formatNumber(region.cloudFraction, { decimals: 2 })}
        </dd>
      </div>
    </dl>
  );
}

function RegionSites({ region, sites, traceOf }: Pick<Props, 'region' | 'sites' | 'traceOf'>) {
  if (sites === null) return <p className="sl-13 sl-muted">Sites are on their way.</p>;
  if (sites.length === 0) {
    return <p className="sl-13">No site of its own: the global ratio of the records stands in.</p>;
  }
  const used = sites.filter((site) => site.unusedReason === null);
  return (
    <>
      <h3>
        {counted(used.length, 'site')} behind this number{' '}
        <span className="sl-muted">
          fluxes in <Unit of="g m-2 yr-1" />
        </span>
      </h3>
      <ul className="region-sites" aria-label={`Sites of ${region.name}`}>
        {sites.map((site) => (
          <li key={`${site.versionId} ${site.site}`}>
            <Link to={traceOf(site)}>{site.site}</Link>
            <span className="sl-muted">{siteText(site)}</span>
          </li>
        ))}
      </ul>
    </>
  );
}

function siteText(site: FieldSite): string {
  const flux = (value: number | null) => (value === null ? 'none' : formatNumber(value, { figures: 3 }));
  const fluxes = `${flux(site.sliceFluxGM2Yr)} against ${flux(site.referenceFluxGM2Yr)}`;
  if (site.unusedReason !== null) return `not used: ${site.unusedReason}; ${fluxes}`;
  return `${fluxes}, ratio ${site.ratio === null ? 'none' : formatNumber(site.ratio, { figures: 2 })}, ${counted(site.sliceSamples + site.referenceSamples, 'sample')}`;
}
