import type { ColumnHeading } from './column-headings';
import type { Uncertainty } from './heading';

/** What one column may be. Several columns may claim one field; the best claim is chosen later. */
export interface Claim {
  heading: ColumnHeading;
  field: string | null;
  confidence: number;
  reason: string;
  /** of a mass flux: dust, or the tracer */
  quantity?: string;
  uncertainty?: Uncertainty;
}

/** A column that is not imported, and why. */
export const unclaimed = (heading: ColumnHeading, reason: string, confidence = 0): Claim => ({
  heading,
  field: null,
  confidence,
  reason,
});
