import { useWidth } from '../figure/use-width';
import { formatNumber } from '../number/format';
import { useColourMode } from '../theme/colour-mode';
import { seriesColours } from '../theme/ramps';
import { domainOf, linearScale, logScale, logTicks, niceTicks, tickDecimals } from './scale';
import { linePath, partLabels, ribbonPath, type LinePoint } from './line-path';
import './chart.css';

export type LineSeries = {
  name: string;
  points: readonly LinePoint[];
  /** Points only, as samples are; else a line, with a ribbon where the points carry low and high. */
  marks?: boolean;
  dash?: string;
  colour?: string;
};

type Props = {
  series: readonly LineSeries[];
  /** What the figure shows, in words. */
  label: string;
  logY?: boolean;
  /** Oldest at the right, as ages are drawn here. */
  bands?: readonly { from: number; to: number; name: string }[];
  xTicks?: readonly { at: number; text: string }[];
  xDomain?: [number, number];
  xTitle?: string;
  heightPx?: number;
  signedY?: boolean;
};

const LEFT_PX = 46;
const TOP_PX = 8;

/** Lines and samples over age, month or size; the unit stands in the figure's head. */
export function LineChart({
  series,
  label,
  logY,
  bands = [],
  xTicks,
  xDomain,
  xTitle,
  heightPx = 184,
  signedY,
}: Props) {
  const [ref, width] = useWidth(306);
  const { mode } = useColourMode();
  const points = series.flatMap((one) => one.points).filter((point) => !logY || point.y > 0);
  if (points.length === 0) return <p className="sl-13 sl-muted">No values to draw.</p>;
  const bottom = heightPx - (xTitle ? 36 : 22);
  const right = width - (series.length > 1 ? 64 : 12);
  const ys = points
    .flatMap((point) => [point.y, point.low ?? point.y, point.high ?? point.y])
    .filter((y) => !logY || y > 0);
  const x = linearScale(xDomain ?? domainOf(points.map((point) => point.x)), [LEFT_PX, right]);
  const y = logY
    ? logScale([Math.min(...ys) / 1.3, Math.max(...ys) * 1.3], [bottom, TOP_PX])
    : linearScale(domainOf(ys, true), [bottom, TOP_PX]);
  const yTicks = logY ? logTicks(y.domain) : niceTicks(y.domain, 4);
  const xMarks =
    xTicks ??
    niceTicks(x.domain, Math.max(3, Math.floor(width / 90))).map((at) => ({
      at,
      text: formatNumber(at, { decimals: tickDecimals([at]) }),
    }));
  const colours = series.map(
    (one, at) => one.colour ?? seriesColours[mode][at % seriesColours[mode].length]!,
  );
  const labels = partLabels(
    series.map((one) => y(one.points.at(-1)?.y ?? 0)),
    14,
  );
  return (
    <div ref={ref}>
      <svg width={width} height={heightPx} role="img" aria-label={label}>
        {bands.map((band) => (
          <rect
            key={band.name}
            x={Math.min(x(band.from), x(band.to))}
            width={Math.abs(x(band.to) - x(band.from))}
            y={TOP_PX}
            height={bottom - TOP_PX}
            className="slice-band"
          >
            <title>{band.name}</title>
          </rect>
        ))}
        {yTicks.map((tick) => (
          <g key={tick}>
            <line
              x1={LEFT_PX}
              x2={right}
              y1={y(tick)}
              y2={y(tick)}
              className={tick === 0 ? 'zero-line' : 'grid-line'}
            />
            <text x={LEFT_PX - 8} y={y(tick) + 4} textAnchor="end" className="tick">
              {formatNumber(tick, { decimals: tickDecimals(logY ? [tick] : yTicks), signed: signedY })}
            </text>
          </g>
        ))}
        {xMarks.map((mark) => (
          <text key={mark.at} x={x(mark.at)} y={bottom + 16} textAnchor="middle" className="tick">
            {mark.text}
          </text>
        ))}
        {xTitle && (
          <text x={(LEFT_PX + right) / 2} y={heightPx - 4} textAnchor="middle" className="tick">
            {xTitle}
          </text>
        )}
        {series.map((one, at) => (
          <g key={one.name}>
            <path d={ribbonPath(one.points, x, y)} className="ribbon" style={{ fill: colours[at] }} />
            {one.marks ? (
              one.points
                .filter((point) => !logY || point.y > 0)
                .map((point, index) => (
                  <circle key={index} cx={x(point.x)} cy={y(point.y)} r={2.2} style={{ fill: colours[at] }} />
                ))
            ) : (
              <path
                d={linePath(one.points, x, y)}
                className="line"
                style={{ stroke: colours[at] }}
                strokeDasharray={one.dash}
              />
            )}
            {series.length > 1 && (
              <text
                x={right + 6}
                y={labels[at]! + 4}
                className="line-label"
                style={{ fill: 'var(--slInk2)' }}
              >
                {one.name}
              </text>
            )}
          </g>
        ))}
      </svg>
    </div>
  );
}
