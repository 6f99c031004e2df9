import type { SliceContent } from '@siltlight/common/wire/slices';
import { formatAge, formatAgeSpan } from '../../shared/number/format';

type Times = Pick<SliceContent, 'windowYoungKa' | 'windowOldKa' | 'orbitalAgeKa' | 'kind'>;

export const windowText = (slice: Times) => formatAgeSpan(slice.windowYoungKa, slice.windowOldKa);

export function orbitalAgeText({ orbitalAgeKa }: Pick<Times, 'orbitalAgeKa'>): string {
  if (orbitalAgeKa >= 1000) return `${formatAge(orbitalAgeKa / 1000)} Ma`;
  // 1850 CE is 0.1 ka before 1950: such young ages are better known by their year.
  if (Math.abs(orbitalAgeKa) < 0.5) return `${Math.round(1950 - orbitalAgeKa * 1000)} CE`;
  return `${formatAge(orbitalAgeKa)} ka`;
}

/** Two times that are often taken for one: which samples count, and how the sun stood. */
export function timesInWords(slice: Times): string {
  const evidence =
    slice.kind === 'scenario'
      ? `A scenario of ${windowText(slice)} before 1950: no record reaches into it.`
      : `Records count by their samples from ${windowText(slice)} before 1950.`;
  return `${evidence} Orbit and gases are those of ${orbitalAgeText(slice)}: a single time, apart from that window.`;
}
