import { useWidth } from '../figure/use-width';
import { decimalsForInterval, formatNumber } from '../number/format';
import { domainOf, linearScale, niceTicks, tickDecimals, type Scale } from './scale';
import './chart.css';

export type Rung = {
  label: string;
  value: number;
  /** 90 % interval. */
  low?: number | null;
  high?: number | null;
  /** 50 % interval. */
  innerLow?: number;
  innerHigh?: number;
  first?: boolean;
  /** Another kind of quantity: greyed, with an open mark. */
  other?: boolean;
};

type Props = {
  rungs: readonly Rung[];
  unitInWords: string;
  labelPx?: number;
  rowPx?: number;
  showValues?: boolean;
};

const FOOT_PX = 24;

/** Intervals of 50 and 90 % under one another on one axis, with zero drawn. */
export function IntervalLadder({ rungs, unitInWords, labelPx = 124, rowPx = 24, showValues = true }: Props) {
  const [ref, width] = useWidth(306);
  const bottom = rungs.length * rowPx;
  const ends = rungs.flatMap((rung) => [rung.value, rung.low ?? rung.value, rung.high ?? rung.value]);
  const x = linearScale(domainOf(ends, true), [labelPx + 8, width - (showValues ? 56 : 10)]);
  const ticks = niceTicks(x.domain, Math.max(2, Math.floor((width - labelPx) / 80)));
  return (
    <div ref={ref}>
      <svg
        width={width}
        height={bottom + FOOT_PX}
        role="img"
        aria-label={inWords(rungs, unitInWords)}
        className="ladder"
      >
        {ticks.map((tick) => (
          <g key={tick}>
            <line
              x1={x(tick)}
              x2={x(tick)}
              y1={2}
              y2={bottom}
              className={tick === 0 ? 'zero-line' : 'grid-line'}
            />
            <text x={x(tick)} y={bottom + 16} textAnchor="middle" className="tick">
              {formatNumber(tick, { decimals: tickDecimals(ticks) })}
            </text>
          </g>
        ))}
        {rungs.map((rung, at) => (
          <RungLine
            key={rung.label}
            rung={rung}
            x={x}
            y={at * rowPx + rowPx / 2}
            right={showValues ? width : null}
          />
        ))}
      </svg>
    </div>
  );
}

const RungLine = ({ rung, x, y, right }: { rung: Rung; x: Scale; y: number; right: number | null }) => (
  <g className={rung.other ? 'other' : undefined}>
    <text x={0} y={y + 4} className={rung.first ? 'rung first' : rung.other ? 'rung other' : 'rung'}>
      {rung.label}
    </text>
    {hasInterval(rung) && <line x1={x(rung.low)} x2={x(rung.high)} y1={y} y2={y} className="rung-90" />}
    {rung.innerLow !== undefined && rung.innerHigh !== undefined && (
      <line x1={x(rung.innerLow)} x2={x(rung.innerHigh)} y1={y} y2={y} className="rung-50" />
    )}
    <circle cx={x(rung.value)} cy={y} r={4} className={rung.other ? 'rung-mid hollow' : 'rung-mid'} />
    {right !== null && (
      <text x={right} y={y + 4} textAnchor="end" className="rung">
        {valueText(rung)}
      </text>
    )}
  </g>
);

const hasInterval = (rung: Rung): rung is Rung & { low: number; high: number } =>
  typeof rung.low === 'number' && typeof rung.high === 'number';

const valueText = (rung: Rung) =>
  formatNumber(rung.value, {
    // Two at least, as the numbers beside it have, unless they are large.
    decimals: hasInterval(rung)
      ? Math.max(Math.abs(rung.value) < 10 ? 2 : 0, decimalsForInterval(rung.low, rung.high))
      : 2,
    signed: true,
  });

const inWords = (rungs: readonly Rung[], unit: string) =>
  rungs
    .map((rung) => {
      const range = hasInterval(rung)
        ? `, 90 % from ${formatNumber(rung.low, { figures: 2 })} to ${formatNumber(rung.high, { figures: 2 })}`
        : '';
      return `${rung.label}: ${valueText(rung)}${range}`;
    })
    .join('; ') + ` ${unit}`;
