import type { Person } from '../auth/policy';
import { problem } from '../http/problem';
import type { SubmissionRow } from './models/submission-row';

/** A steward sees a submission, but only its contributor changes it. */
export function requireOwn(submission: SubmissionRow, by: Person): void {
  if (submission.contributorId === by.id) return;
  throw problem(
    403,
    'not-yours',
    'This submission is not yours',
    'Only its contributor changes it. Pin a query to the cell, or return it with a reason.',
  );
}
