import type { SliceContent } from '@siltlight/common/wire/slices';
import { useMemo } from 'react';
import { linePath } from '../../shared/chart/line-path';
import { linearScale, niceTicks, tickDecimals } from '../../shared/chart/scale';
import '../../shared/chart/chart.css';
import { Figure } from '../../shared/figure/figure';
import { useWidth } from '../../shared/figure/use-width';
import { formatAge, formatNumber } from '../../shared/number/format';
import type { DataColumn } from '../../shared/table/column';
import { useColourMode } from '../../shared/theme/colour-mode';
import { seriesColours } from '../../shared/theme/ramps';
import { ORBIT_SPAN_KA, orbitSeries, precessionOf, type OrbitPoint } from './orbit-series';
import { orbitalAgeText } from './slice-words';

const PANEL_PX = 92;
const PLOT_PX = 60;
const TOP_PX = 22;
const LEFT_PX = 48;

const panels: {
  name: string;
  domain: [number, number];
  of: (point: OrbitPoint) => number;
  colour: number;
}[] = [
  { name: 'eccentricity', domain: [0.01, 0.05], of: (point) => point.eccentricity, colour: 0 },
  { name: 'obliquity, degrees', domain: [22, 25], of: (point) => point.obliquityDeg, colour: 2 },
  { name: 'climatic precession', domain: [-0.05, 0.05], of: (point) => point.precession, colour: 1 },
];

const columns: DataColumn<OrbitPoint>[] = [
  { id: 'age', header: 'Age', unit: 'ka', value: (row) => row.ageKa, align: 'right' },
  { id: 'ecc', header: 'Eccentricity', value: (row) => row.eccentricity, align: 'right' },
  { id: 'obl', header: 'Obliquity', unit: 'degree', value: (row) => row.obliquityDeg, align: 'right' },
  { id: 'pre', header: 'Climatic precession', value: (row) => row.precession, align: 'right' },
];

/** Eccentricity, obliquity and precession of the last 150 ka, with the slice's window and its orbital age marked. */
export function OrbitFigure({ slice }: { slice: SliceContent }) {
  const series = useMemo(() => orbitSeries(), []);
  const inside = slice.orbitalAgeKa <= ORBIT_SPAN_KA;
  const { eccentricity, obliquityDeg, perihelionLongitudeDeg } = slice.orbit;
  const summary = `Eccentricity ${formatNumber(eccentricity, { decimals: 4 })}, obliquity ${formatNumber(obliquityDeg, { decimals: 2 })} degrees, longitude of perihelion ${formatNumber(perihelionLongitudeDeg, { decimals: 1 })} degrees at ${orbitalAgeText(slice)}; climatic precession ${formatNumber(precessionOf(slice.orbit), { decimals: 4 })}.`;
  return (
    <Figure
      title="Orbit"
      sub="three elements, last 150,000 years; axis in ka"
      summary={summary}
      table={{ columns, rows: series, rowKey: (row) => String(row.ageKa) }}
      note={
        <>
          At {orbitalAgeText(slice)}: eccentricity <b>{formatNumber(eccentricity, { decimals: 4 })}</b>,
          obliquity <b>{formatNumber(obliquityDeg, { decimals: 2 })}°</b>, perihelion at{' '}
          <b>{formatNumber(perihelionLongitudeDeg, { decimals: 1 })}°</b> ({slice.orbitSource}). Curves:
          Berger 1978.{!inside && ' This slice is older than the axis.'}
        </>
      }
    >
      <Drawing series={series} slice={slice} label={summary} />
    </Figure>
  );
}

function Drawing({ series, slice, label }: { series: OrbitPoint[]; slice: SliceContent; label: string }) {
  const [ref, width] = useWidth(544);
  const { mode } = useColourMode();
  const x = linearScale([0, ORBIT_SPAN_KA], [LEFT_PX, width - 12]);
  const height = panels.length * PANEL_PX + 12;
  const inSpan = slice.windowYoungKa < ORBIT_SPAN_KA;
  return (
    <div ref={ref}>
      <svg width={width} height={height} role="img" aria-label={label}>
        {panels.map((panel, at) => (
          <g key={panel.name} transform={`translate(0 ${at * PANEL_PX})`}>
            <Panel panel={panel} series={series} x={x} colour={seriesColours[mode][panel.colour]!} />
            {inSpan && (
              <rect
                x={x(slice.windowYoungKa)}
                width={Math.max(2, x(Math.min(ORBIT_SPAN_KA, slice.windowOldKa)) - x(slice.windowYoungKa))}
                y={TOP_PX}
                height={PLOT_PX}
                className="slice-band"
              >
                <title>evidence window</title>
              </rect>
            )}
            {slice.orbitalAgeKa <= ORBIT_SPAN_KA && (
              <line
                x1={x(slice.orbitalAgeKa)}
                x2={x(slice.orbitalAgeKa)}
                y1={TOP_PX}
                y2={TOP_PX + PLOT_PX}
                className="orbit-age"
              />
            )}
            {at === 0 && slice.orbitalAgeKa <= ORBIT_SPAN_KA && (
              <text
                x={x(slice.orbitalAgeKa) + 6}
                y={TOP_PX + 12}
                textAnchor="start"
                className="tick orbit-age-text"
              >
                {orbitalAgeText(slice)}
              </text>
            )}
          </g>
        ))}
        {niceTicks([0, ORBIT_SPAN_KA], 6).map((tick) => (
          <text key={tick} x={x(tick)} y={height - 2} textAnchor="middle" className="tick">
            {formatAge(tick)}
          </text>
        ))}
      </svg>
    </div>
  );
}

type PanelProps = {
  panel: (typeof panels)[number];
  series: OrbitPoint[];
  x: ReturnType<typeof linearScale>;
  colour: string;
};

function Panel({ panel, series, x, colour }: PanelProps) {
  const y = linearScale(panel.domain, [TOP_PX + PLOT_PX, TOP_PX]);
  const ticks = niceTicks(panel.domain, 2);
  return (
    <>
      <text x={LEFT_PX} y={13} className="orbit-name">
        {panel.name}
      </text>
      {ticks.map((tick) => (
        <g key={tick}>
          <line x1={LEFT_PX} x2={x(ORBIT_SPAN_KA)} y1={y(tick)} y2={y(tick)} className="grid-line" />
          <text x={LEFT_PX - 6} y={y(tick) + 4} textAnchor="end" className="tick">
            {formatNumber(tick, { decimals: tickDecimals(ticks) })}
          </text>
        </g>
      ))}
      <path
        d={linePath(
          series.map((point) => ({ x: point.ageKa, y: panel.of(point) })),
          x,
          y,
        )}
        className="line"
        style={{ stroke: colour }}
      />
    </>
  );
}
