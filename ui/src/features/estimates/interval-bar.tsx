import type { Interval } from '@siltlight/common/wire/shared';
import { linearScale } from '../../shared/chart/scale';

const WIDTH_PX = 84;

/** A number's interval as a small bar; the table beside it says the same in digits. */
export function IntervalBar({ of, domain }: { of: Interval; domain: [number, number] }) {
  const x = linearScale(domain, [4, WIDTH_PX - 4]);
  return (
    <svg width={WIDTH_PX} height="14" className="interval-bar" aria-hidden="true">
      <line x1={x(0)} x2={x(0)} y1="0" y2="14" className="zero-line" />
      {of.low !== null && of.high !== null && (
        <line x1={x(of.low)} x2={x(of.high)} y1="7" y2="7" className="rung-90" />
      )}
      <circle cx={x(of.value)} cy="7" r="3" className="rung-mid" />
    </svg>
  );
}
