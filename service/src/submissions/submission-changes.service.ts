import { Injectable } from '@nestjs/common';
import type { Transaction } from 'sequelize';
import type { Person } from '../auth/policy';
import { WriteQueue } from '../database/write-queue';
import { LedgerService } from '../ledger/ledger.service';
import { Evaluations } from './evaluation.service';
import { numberText, type SubmissionRow } from './models/submission-row';
import { SubmissionAccess } from './submission-access.service';
import type { Step } from './transitions';

export interface Change {
  id: string;
  ifMatch: string | undefined;
  by: Person;
  step: Step;
  verb: string;
  /** one sentence for the ledger, after the work */
  summary: (submission: SubmissionRow) => string;
  after?: unknown;
}

/**
 * Every change of a submission goes through here: seen revision, allowed step, the work, the counts made anew,
 * the revision raised, one ledger row; all of it or nothing.
 */
@Injectable()
export class SubmissionChanges {
  constructor(
    private readonly access: SubmissionAccess,
    private readonly evaluations: Evaluations,
    private readonly ledger: LedgerService,
    private readonly writes: WriteQueue,
  ) {}

  run(
    change: Change,
    work: (submission: SubmissionRow, transaction: Transaction) => Promise<void>,
  ): Promise<SubmissionRow> {
    return this.writes.run(async (transaction) => {
      const submission = await this.access.forStep(change, transaction);
      await work(submission, transaction);
      const { counts } = await this.evaluations.evaluate(
        await this.evaluations.draftOf(submission, transaction),
      );
      await submission.update({ counts, revision: submission.revision + 1 }, { transaction });
      await this.ledger.record(
        {
          actorId: change.by.id,
          verb: change.verb,
          objectKind: 'submission',
          objectId: submission.id,
          objectTitle: submission.title,
          summary: `${numberText(submission.number)}: ${change.summary(submission)}`,
          after: change.after,
        },
        transaction,
      );
      return submission;
    });
  }
}
