import { decimalsForInterval, formatNumber } from './format';
import { Unit } from './unit';

type Props = {
  value?: number;
  low: number;
  high: number;
  unit?: string;
  /** What the interval means: it is never shown without. */
  meaning?: string;
  signed?: boolean;
  decimals?: number;
};

/** Value, unit and interval with as many decimals as the interval supports: −0.42 W m⁻² (5–95 %: −0.81 to −0.12). */
export function Interval({ value, low, high, unit, meaning = '5–95 %', signed = true, decimals }: Props) {
  const places = decimals ?? decimalsForInterval(low, high);
  const text = (v: number) => formatNumber(v, { decimals: places, signed });
  if (value === undefined) {
    return (
      <span className="sl-unit">
        {text(low)} to {text(high)}
      </span>
    );
  }
  return (
    <span>
      <b>{text(value)}</b>
      {unit && (
        <>
          {'\u00a0'}
          <Unit of={unit} />
        </>
      )}{' '}
      <span className="sl-unit sl-muted">
        ({meaning}: {text(low)} to {text(high)})
      </span>
    </span>
  );
}
