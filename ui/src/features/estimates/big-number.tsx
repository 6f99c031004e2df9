import type { Interval } from '@siltlight/common/wire/shared';
import { decimalsOf, rangeText } from '../../shared/number/amount';
import { formatNumber } from '../../shared/number/format';
import { ForcingUnit } from '../../shared/number/unit';

/** The number a page is about, with its unit and interval. */
export function BigNumber({ of }: { of: Interval }) {
  const range = rangeText(of);
  return (
    <p className="big">
      <span className="big-value">{formatNumber(of.value, { decimals: decimalsOf(of), signed: true })}</span>{' '}
      <ForcingUnit />{' '}
      <span className="big-range">{range ? `5–95 %: ${range}` : 'nothing varied: no interval'}</span>
    </p>
  );
}
