import type { VettingContext } from './context';
import type { RuleHit, Severity } from './rule';

/** A number as a message shows it: four significant figures, powers of ten only far from one. */
export function shown(value: number): string {
  if (value === 0) return '0';
  const size = Math.abs(value);
  return size >= 1e6 || size < 1e-4 ? value.toExponential(2) : String(Number(value.toPrecision(4)));
}

/** Count and noun: "1 row", "12 rows". */
export const counted = (count: number, noun: string): string => `${count} ${noun}${count === 1 ? '' : 's'}`;

/** The first few of a list, then how many more. */
export function firstFew(items: readonly (string | number)[], most = 5): string {
  const rest = items.length - most;
  return items.slice(0, most).join(', ') + (rest > 0 ? ` and ${rest} more` : '');
}

/**
 * A question the metadata form asks. Where a form is offered an unanswered question blocks;
 * for a file checked without one it can only be pointed out.
 */
export function asked(
  context: VettingContext,
  what: string,
  question: string,
): Pick<RuleHit, 'severity' | 'message' | 'remedy' | 'remedyKind'> {
  const severity: Severity = context.formOffered ? 'error' : 'warning';
  return {
    severity,
    message: `${what} is stated neither in the sheet nor in the form.`,
    remedy: `Answer in the form: ${question}`,
    remedyKind: 'answer',
  };
}

/** All free text a submission says about its samples, for rules that look for a statement. */
export function statements(context: VettingContext): string {
  const { metadata } = context;
  return [
    metadata.method,
    metadata.ageModel,
    metadata.dustDefinition,
    metadata.densityBasis,
    metadata.sizeCutoff,
    metadata.note,
  ]
    .filter((text) => text !== undefined)
    .join(' \n ');
}
