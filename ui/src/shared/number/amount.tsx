import type { Interval } from '@siltlight/common/wire/shared';
import { decimalsForInterval, formatNumber } from './format';
import { Unit } from './unit';

/** Decimals for an amount: as many as its interval supports, else as many as are usual for its kind. */
export const decimalsOf = ({ low, high }: Interval, fallback = 2) =>
  low === null || high === null ? fallback : Math.min(4, Math.max(fallback, decimalsForInterval(low, high)));

/** "−0.81 to −0.12", or null where nothing was varied. */
export function rangeText(amount: Interval, signed = true, fallback = 2): string | null {
  if (amount.low === null || amount.high === null) return null;
  const decimals = decimalsOf(amount, fallback);
  const text = (value: number) => formatNumber(value, { decimals, signed });
  return `${text(amount.low)} to ${text(amount.high)}`;
}

type Props = {
  of: Interval | null;
  unit?: string;
  signed?: boolean;
  /** Decimals where no interval says how many. */
  fallback?: number;
  /** In a table whose heading says what the interval is. */
  bare?: boolean;
};

/** An amount with its 5–95 % interval. */
export function Amount({ of, unit, signed = true, fallback = 2, bare }: Props) {
  if (of === null) return <span className="sl-muted">–</span>;
  const range = rangeText(of, signed, fallback);
  return (
    <span>
      <b>{formatNumber(of.value, { decimals: decimalsOf(of, fallback), signed })}</b>
      {unit && (
        <>
          {'\u00a0'}
          <Unit of={unit} />
        </>
      )}
      {range && (
        <>
          {' '}
          <span className="sl-unit sl-muted">{bare ? range : `(5–95 %: ${range})`}</span>
        </>
      )}
    </span>
  );
}
