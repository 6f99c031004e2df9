import type { TracedValue } from '../dataset/sample-row';

/** Which rule answers for a cell without a usable value. */
export type ProblemKind = 'unit' | 'error-cell' | 'date' | 'outside-range' | 'unreadable';

/**
 * Sorts the normaliser's problem codes by the rule that reports them, so that one fault is said once:
 * unit → V06, error cell → V02, date → V02, outside the range of its kind → the range rule, all else → V03.
 */
export function problemKind(traced: TracedValue | undefined): ProblemKind | null {
  const code = traced?.problem?.code;
  if (code === undefined) return null;
  if (/unit|convertible/.test(code)) return 'unit';
  if (/error/.test(code)) return 'error-cell';
  if (/date/.test(code)) return 'date';
  if (/range/.test(code)) return 'outside-range';
  return 'unreadable';
}

/** The text a person would see in the cell now: the mend when there is one. */
export const presentText = (traced: TracedValue): string => traced.mended ?? traced.raw;

/** A code such as −999 or NaN that stands for "no value": text is there, but neither a value nor a problem. */
export const isMissingCode = (traced: TracedValue): boolean =>
  traced.value === null && traced.problem === undefined && presentText(traced).trim() !== '';

/** True when the normaliser read a number and refused it as impossible for its field. */
export const isRefused = (traced: TracedValue | undefined): traced is TracedValue =>
  problemKind(traced) === 'outside-range';

/** True for a refused number below zero, whatever its unit. */
export const isRefusedNegative = (traced: TracedValue | undefined): boolean =>
  isRefused(traced) && /^[-−–]/.test(presentText(traced).trim());

/** Fields whose impossible values a rule of their own reports (V09, V13, V29, V42); V03 keeps to the others. */
export const RANGE_RULE_FIELDS: ReadonlySet<string> = new Set([
  'latitudeDeg',
  'longitudeDeg',
  'elevationM',
  'waterDepthM',
  'densityGCm3',
  'dustFraction',
]);
