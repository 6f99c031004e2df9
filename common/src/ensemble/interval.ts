import { sortedQuantile } from '../statistics/quantile';

/** A number with its 5 to 95 % interval over the members. */
export interface Interval {
  /** from the central inputs: not the median of the members */
  value: number;
  low: number;
  high: number;
}

/** @param members values of all members; they are sorted in place */
export function intervalOf(value: number, members: Float64Array): Interval {
  members.sort();
  return { value, low: sortedQuantile(members, 0.05), high: sortedQuantile(members, 0.95) };
}
