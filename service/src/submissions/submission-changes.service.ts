import { Injectable } from '@nestjs/common';
import type { Transaction } from 'sequelize';
import type { Person } from '../auth/policy';
import { WriteQueue } from '../database/write-queue';
import { LedgerService } from '../ledger/ledger.service';
import { type Draft, type Evaluation, Evaluations } from './evaluation.service';
import { numberText, type SubmissionRow } from './models/submission-row';
import { SubmissionAccess } from './submission-access.service';
import type { Step } from './transitions';

/** Who changes what, and the revision that they have seen. */
export interface Editing {
  id: string;
  ifMatch: string | undefined;
  by: Person;
}

export interface Change extends Editing {
  step: Step;
  verb: string;
  /** one sentence for the ledger, after the work */
  summary: (submission: SubmissionRow) => string;
  /** for the ledger, after the work */
  after?: () => unknown;
  /** what the change makes of the draft, or its refusal; absent where findings and counts stay as they are */
  amend?: (draft: Draft, submission: SubmissionRow) => Draft | Promise<Draft>;
}

/**
 * Every change of a submission goes through here: seen revision, allowed step, the work, the revision raised, one
 * ledger row; all of it or nothing. A change of the data is vetted before the write begins, because vetting a long
 * table would hold up every other writer; the revision, asked for again inside, shows that nothing came between.
 */
@Injectable()
export class SubmissionChanges {
  constructor(
    private readonly access: SubmissionAccess,
    private readonly evaluations: Evaluations,
    private readonly ledger: LedgerService,
    private readonly writes: WriteQueue,
  ) {}

  async run(
    change: Change,
    work: (submission: SubmissionRow, transaction: Transaction) => Promise<void>,
  ): Promise<SubmissionRow> {
    const evaluation = await this.vetted(change);
    const changed = await this.writes.run(async (transaction) => {
      const submission = await this.access.forStep(change, transaction);
      await work(submission, transaction);
      const counts = evaluation?.counts ?? submission.counts;
      await submission.update({ counts, revision: submission.revision + 1 }, { transaction });
      await this.ledger.record(
        {
          actorId: change.by.id,
          verb: change.verb,
          objectKind: 'submission',
          objectId: submission.id,
          objectTitle: submission.title,
          summary: `${numberText(submission.number)}: ${change.summary(submission)}`,
          after: change.after?.(),
        },
        transaction,
      );
      return submission;
    });
    if (evaluation) this.evaluations.keep(changed, evaluation);
    else this.evaluations.carryOver(changed);
    return changed;
  }

  private async vetted(change: Change): Promise<Evaluation | undefined> {
    if (!change.amend) return undefined;
    const submission = await this.access.forStep(change);
    const draft = await change.amend(await this.evaluations.draftOf(submission), submission);
    return this.evaluations.evaluate(draft);
  }
}
