import { formatForcing, formatNumber } from '../number/format';
import { useColourMode } from '../theme/colour-mode';
import { forcingColour } from '../theme/ramps';
import { useWidth } from '../figure/use-width';
import { domainOf, linearScale, niceTicks, tickDecimals } from './scale';
import './chart.css';

type Props = {
  /** Equally likely outcomes [W m⁻²], one dot each. */
  outcomes: readonly number[];
  low: number;
  median: number;
  high: number;
  limitWm2: number;
  heightPx?: number;
  label?: string;
};

const DOT_PX = 8.4;
const GAP_PX = 0.6;
const PAD_PX = 14;

/** Places the dots in columns over the axis; a dot moves sideways by at most half its width. */
export function dotPlaces(outcomes: readonly number[], x: (value: number) => number, basePx: number) {
  const columns = new Map<number, number>();
  const step = DOT_PX + GAP_PX;
  return [...outcomes]
    .sort((a, b) => a - b)
    .map((value) => {
      const column = Math.round((x(value) - x(0)) / step);
      const level = columns.get(column) ?? 0;
      columns.set(column, level + 1);
      return { value, cx: x(0) + column * step, cy: basePx - 5 - DOT_PX / 2 - level * step };
    });
}

/** A headline's uncertainty as a count of equally likely outcomes over a linear axis. */
export function QuantileDots({ outcomes, low, median, high, limitWm2, heightPx = 128, label }: Props) {
  const [ref, width] = useWidth(360);
  const { mode } = useColourMode();
  const base = heightPx - 34;
  const x = linearScale(domainOf([...outcomes, low, high], true), [PAD_PX, width - PAD_PX]);
  const ticks = niceTicks(x.domain, Math.max(3, Math.floor(width / 64)));
  const below = outcomes.filter((value) => value < 0).length;
  const words = `${outcomes.length} equally likely outcomes, ${below} below zero; median ${formatForcing(median)}, 5 to 95 % from ${formatForcing(low)} to ${formatForcing(high)} watts per square metre`;
  return (
    <div ref={ref}>
      <svg
        width={width}
        height={heightPx}
        viewBox={`0 0 ${width} ${heightPx}`}
        role="img"
        aria-label={label ?? words}
      >
        <line x1={x(0)} x2={x(0)} y1={8} y2={base + 4} className="zero-line" />
        {dotPlaces(outcomes, x, base).map((dot, at) => (
          <circle
            key={at}
            cx={dot.cx}
            cy={dot.cy}
            r={DOT_PX / 2 - 0.3}
            style={{ fill: forcingColour(dot.value, limitWm2, mode) }}
            className="qd-dot"
          />
        ))}
        <line x1={PAD_PX} x2={width - PAD_PX} y1={base} y2={base} className="axis-line" />
        <line x1={x(low)} x2={x(high)} y1={base} y2={base} className="qd-range" />
        <path d={`M${x(median)} ${base - 5}l4.5 8h-9z`} className="qd-median" />
        {ticks.map((tick) => (
          <text key={tick} x={x(tick)} y={base + 19} textAnchor="middle" className="tick">
            {formatNumber(tick, { decimals: tickDecimals(ticks), signed: true })}
          </text>
        ))}
      </svg>
    </div>
  );
}
