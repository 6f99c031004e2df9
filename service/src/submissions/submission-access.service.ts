import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Transaction } from 'sequelize';
import type { Person } from '../auth/policy';
import { notFound } from '../http/problem';
import { changedMeanwhile, expectedVersion } from '../http/expected-version';
import { SubmissionRow } from './models/submission-row';
import { CorrectionRow } from './models/working-rows';
import { requireStep, type Step } from './transitions';

/** Who may see and touch a submission. */
@Injectable()
export class SubmissionAccess {
  constructor(
    @InjectModel(SubmissionRow) private readonly submissions: typeof SubmissionRow,
    @InjectModel(CorrectionRow) private readonly corrections: typeof CorrectionRow,
  ) {}

  /** A contributor sees their own; stewards see all that has been handed in. What is not seen does not exist. */
  async visible(id: string, reader: Person, transaction?: Transaction): Promise<SubmissionRow> {
    const row = await this.submissions.findByPk(id, transaction ? { transaction } : {});
    const own = row?.contributorId === reader.id;
    const handedIn = (row?.submittedAt ?? null) !== null;
    if (!row || !(own || (handedIn && reader.roles.includes('steward')))) throw notFound('Submission', id);
    return row;
  }

  /**
   * The submission as it is before a change: visible, at the revision that the caller has seen, in a state
   * that allows the step.
   *
   * @throws Problem 404, 428, 412, 409
   */
  async forStep(
    { id, ifMatch, by, step }: { id: string; ifMatch: string | undefined; by: Person; step: Step },
    transaction?: Transaction,
  ): Promise<SubmissionRow> {
    const row = await this.visible(id, by, transaction);
    const expected = expectedVersion(ifMatch, undefined);
    if (expected !== row.revision) throw changedMeanwhile();
    requireStep(row, step);
    return row;
  }

  /** Four eyes: whoever contributed or corrected a submission does not decide on it. */
  async hasHandIn(submission: SubmissionRow, person: Person, transaction?: Transaction): Promise<boolean> {
    if (submission.contributorId === person.id) return true;
    const where = { submissionId: submission.id, personId: person.id };
    return (await this.corrections.count({ where, ...(transaction ? { transaction } : {}) })) > 0;
  }
}
