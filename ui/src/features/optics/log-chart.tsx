import { useWidth } from '../../shared/figure/use-width';
import { linePath, ribbonPath, type LinePoint } from '../../shared/chart/line-path';
import { domainOf, linearScale, logScale, logTicks, niceTicks, tickDecimals } from '../../shared/chart/scale';
import '../../shared/chart/chart.css';
import { formatNumber } from '../../shared/number/format';
import { useColourMode } from '../../shared/theme/colour-mode';
import { seriesColours } from '../../shared/theme/ramps';

export type LogSeries = {
  name: string;
  points: readonly LinePoint[];
  /** place in the palette */
  colour: number;
  filled?: boolean;
  bold?: boolean;
  dash?: string;
  /** A single value, as bulk sets have. */
  mark?: boolean;
};

type Props = {
  series: readonly LogSeries[];
  label: string;
  heightPx: number;
  /** Linear where angles are drawn. */
  linearX?: boolean;
  logY?: boolean;
  xDomain?: [number, number];
  xTicks?: readonly number[];
  yDomain?: [number, number];
  dashedAt?: { x: number; text?: string };
};

const LEFT_PX = 44;
const RIGHT_PX = 12;
const plain = (value: number) => formatNumber(value, { decimals: tickDecimals([value]) });

/** Curves over a logarithmic axis with their key beneath; units stand in the figure's head. */
export function LogChart({ series, label, heightPx, linearX, logY, xTicks, dashedAt, ...props }: Props) {
  const [ref, width] = useWidth(400);
  const { mode } = useColourMode();
  const points = series.flatMap((one) => one.points).filter((point) => !logY || point.y > 0);
  if (points.length === 0) return <div ref={ref} style={{ height: heightPx }} className="optics-waiting" />;
  const top = dashedAt?.text ? 20 : 8;
  const bottom = heightPx - 22;
  const xs = points.map((point) => point.x);
  const xDomain = props.xDomain ?? [Math.min(...xs), Math.max(...xs)];
  const x = (linearX ? linearScale : logScale)(xDomain, [LEFT_PX, width - RIGHT_PX]);
  const ys = points.flatMap((point) => [point.y, point.low ?? point.y, point.high ?? point.y]);
  const positive = ys.filter((one) => one > 0);
  const y = logY
    ? logScale(props.yDomain ?? [Math.min(...positive) / 1.3, Math.max(...positive) * 1.3], [bottom, top])
    : linearScale(props.yDomain ?? domainOf(ys, true), [bottom, top]);
  const yTicks = logY ? logTicks(y.domain) : niceTicks(y.domain, Math.max(3, Math.round(heightPx / 60)));
  const xMarks = xTicks ?? (linearX ? niceTicks(x.domain, 6) : logTicks(x.domain));
  const colourOf = (one: LogSeries) => seriesColours[mode][one.colour % seriesColours[mode].length]!;
  return (
    <div ref={ref}>
      <svg width={width} height={heightPx} role="img" aria-label={label}>
        {yTicks.map((tick) => (
          <g key={tick}>
            <line
              x1={LEFT_PX}
              x2={width - RIGHT_PX}
              y1={y(tick)}
              y2={y(tick)}
              className={tick === 0 ? 'zero-line' : 'grid-line'}
            />
            <text x={LEFT_PX - 8} y={y(tick) + 4} textAnchor="end" className="tick">
              {logY ? plain(tick) : formatNumber(tick, { decimals: tickDecimals(yTicks) })}
            </text>
          </g>
        ))}
        {xMarks.map((tick) => (
          <text key={tick} x={x(tick)} y={bottom + 16} textAnchor="middle" className="tick">
            {plain(tick)}
          </text>
        ))}
        {dashedAt && dashedAt.x >= xDomain[0] && dashedAt.x <= xDomain[1] && (
          <g>
            <line x1={x(dashedAt.x)} x2={x(dashedAt.x)} y1={top} y2={bottom} className="optics-dashed" />
            {dashedAt.text && (
              <text
                x={x(dashedAt.x)}
                y={12}
                textAnchor={x(dashedAt.x) > width - 90 ? 'end' : 'middle'}
                className="tick"
              >
                {dashedAt.text}
              </text>
            )}
          </g>
        )}
        {series.map((one) => (
          <g key={one.name} style={{ color: colourOf(one) }}>
            <path d={ribbonPath(one.points, x, y)} className="ribbon" fill="currentColor" />
            {one.filled && one.points.length > 1 && (
              <path
                d={`${linePath(one.points, x, y)}L${x(one.points.at(-1)!.x)} ${bottom}L${x(one.points[0]!.x)} ${bottom}Z`}
                fill="currentColor"
                opacity={0.12}
              />
            )}
            {one.mark ? (
              one.points.map((point) => (
                <circle key={point.x} cx={x(point.x)} cy={y(point.y)} r={3.2} fill="currentColor" />
              ))
            ) : (
              <path
                d={linePath(one.points, x, y)}
                className="line"
                stroke="currentColor"
                style={{ strokeWidth: one.bold ? 2.4 : 1.4 }}
                strokeDasharray={one.dash}
              />
            )}
          </g>
        ))}
      </svg>
      {series.length > 1 && (
        <ul className="optics-key" aria-label="Key">
          {series.map((one) => (
            <li key={one.name}>
              <span style={{ background: colourOf(one) }} aria-hidden />
              {one.name}
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}
