import type { EstimateResult, ForcingTriple } from '@siltlight/common/wire/estimates';
import type { Interval } from '@siltlight/common/wire/shared';
import { decimalsOf } from '../../shared/number/amount';
import { formatNumber } from '../../shared/number/format';
import { sliceWithArticle, sliceWithin } from '../../shared/page/slice-name';

const holdsZero = ({ low, high }: Interval) => low !== null && high !== null && low <= 0 && high >= 0;

/** The result in one sentence; a sign that the interval does not settle is said to be open. */
export function headlineOf({ label, global }: EstimateResult): string {
  const net = global.forcing.netWm2;
  const start = `Against ${sliceWithin(label.referenceName)}, the dust of ${sliceWithArticle(label.sliceName)}`;
  if (Number(net.value.toFixed(decimalsOf(net))) === 0)
    return `${start} leaves the planet’s balance as it was.`;
  const verb = net.value < 0 ? 'cools' : 'warms';
  return holdsZero(net)
    ? `${start} more likely ${verb} the planet than not; the interval holds zero.`
    : `${start} ${verb} the planet.`;
}

const signed = (amount: Interval) =>
  formatNumber(amount.value, { decimals: decimalsOf(amount), signed: true });

/** What kind of number it is: two numbers with different labels are not to be compared. */
export function labelLine({ label, global }: EstimateResult): string {
  const { shortwaveWm2, longwaveWm2 } = global.forcing;
  return `Direct forcing, ${label.level}, ${label.sky}, net (SW ${signed(shortwaveWm2)}, LW ${signed(longwaveWm2)}), ${label.processes}, ${label.kind}`;
}

export type Part = 'sw' | 'lw' | 'net';
export const partTitles: Record<Part, string> = { sw: 'SW', lw: 'LW', net: 'Net' };
export const partNames: Record<Part, string> = { sw: 'Shortwave', lw: 'Longwave', net: 'Net' };

export const partOf = (triple: ForcingTriple, part: Part): Interval =>
  part === 'sw' ? triple.shortwaveWm2 : part === 'lw' ? triple.longwaveWm2 : triple.netWm2;

/** Limit of the colours of the dots: the largest outcome, so that each sign has its full range. */
export const largestOf = (values: readonly number[]) => Math.max(0.01, ...values.map(Math.abs));
