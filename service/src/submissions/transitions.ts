import type { SubmissionState } from '@siltlight/common/wire/submissions';
import { problem } from '../http/problem';
import { numberText, type SubmissionRow } from './models/submission-row';

export type Step =
  | 'edit'
  | 'submit'
  | 'withdraw'
  | 'answer'
  | 'claim'
  | 'release'
  | 'examine'
  | 'approve'
  | 'return'
  | 'decline';

/** From which states a step may be taken, and where it leads (a step without a target stays). */
export const STEPS: Record<Step, { from: readonly SubmissionState[]; to?: SubmissionState }> = {
  edit: { from: ['draft', 'returned'] },
  submit: { from: ['draft', 'returned'], to: 'submitted' },
  withdraw: { from: ['draft', 'submitted', 'returned'], to: 'withdrawn' },
  answer: { from: ['submitted', 'in-review', 'returned'] },
  claim: { from: ['submitted'], to: 'in-review' },
  release: { from: ['in-review'], to: 'submitted' },
  examine: { from: ['submitted', 'in-review'] },
  approve: { from: ['submitted', 'in-review'], to: 'approved' },
  return: { from: ['submitted', 'in-review'], to: 'returned' },
  decline: { from: ['submitted', 'in-review'], to: 'declined' },
};

/** @throws Problem 409 that says in which state the submission is and in which the step could be taken */
export function requireStep(submission: SubmissionRow, step: Step): void {
  const { from } = STEPS[step];
  if (from.includes(submission.state)) return;
  throw problem(
    409,
    'wrong-state',
    `The submission is ${submission.state}`,
    `${numberText(submission.number)} is ${submission.state}; to ${step} it, it must be ${from.join(' or ')}. Reload to see what happened.`,
  );
}
