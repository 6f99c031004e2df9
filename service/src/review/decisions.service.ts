import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { decisionRequest } from '@siltlight/common/wire/submissions';
import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type { Person } from '../auth/policy';
import { nowIso } from '../database/row';
import { type DatasetContent, sampleOf } from '../datasets/dataset-content';
import type { DatasetVersion } from '../datasets/datasets.service';
import { DatasetPublishing } from '../datasets/dataset-publishing.service';
import { problem } from '../http/problem';
import { OutboxService } from '../notifications/outbox.service';
import { Evaluations } from '../submissions/evaluation.service';
import { numberText, type SubmissionRow } from '../submissions/models/submission-row';
import { DecisionRow } from '../submissions/models/working-rows';
import { type Editing, SubmissionChanges } from '../submissions/submission-changes.service';
import { PeopleService } from '../users/people.service';
import { requireReviewer, Review } from './review.service';

export type Decision = z.infer<typeof decisionRequest>;

const OUTCOME = { approve: 'approved', return: 'returned', decline: 'declined' } as const;

/** Approve, return, decline: one decision, one ledger row, one mail, and for an approval one dataset version. */
@Injectable()
export class Decisions {
  constructor(
    @InjectModel(DecisionRow) private readonly decisions: typeof DecisionRow,
    private readonly review: Review,
    private readonly changes: SubmissionChanges,
    private readonly evaluations: Evaluations,
    private readonly publishing: DatasetPublishing,
    private readonly people: PeopleService,
    private readonly outbox: OutboxService,
  ) {}

  decide(editing: Editing, decision: Decision): Promise<SubmissionRow> {
    const outcome = OUTCOME[decision.decision];
    let dataset: DatasetVersion | null = null;
    const change = {
      ...editing,
      step: decision.decision,
      verb: `${decision.decision}-submission`,
      summary: () => (decision.reason ? `${outcome}: ${decision.reason}` : outcome),
      after: () => ({ ...decision, ...(dataset ? { dataset: markOf(dataset) } : {}) }),
    };
    return this.changes.run(change, async (submission, transaction) => {
      await this.review.requireFourEyes(submission, editing.by, transaction);
      requireReviewer(submission, editing.by);
      if (decision.decision === 'approve') {
        dataset = await this.publish(submission, decision, editing.by, transaction);
      }
      await submission.update(
        {
          state: outcome,
          reviewerId: editing.by.id,
          decidedAt: nowIso(),
          datasetVersionId: dataset?.id ?? null,
        },
        { transaction },
      );
      await this.decisions.create(
        {
          submissionId: submission.id,
          personId: editing.by.id,
          decision: decision.decision,
          reason: decision.reason ?? null,
        },
        { transaction },
      );
      const madeOf = dataset
        ? [`It is version ${dataset.number} of "${dataset.object.title}", checksum ${dataset.checksum}.`]
        : [];
      await this.tell(
        submission,
        outcome,
        [...(decision.reason ? [decision.reason] : []), ...madeOf],
        editing.by,
        transaction,
      );
    });
  }

  private async publish(
    submission: SubmissionRow,
    { grade, datasetSlug }: Decision,
    by: Person,
    transaction: Transaction,
  ) {
    const { rows } = await this.evaluations.of(submission);
    requireSettled(submission);
    const { metadata } = submission;
    const contributor = await this.people.mark(submission.contributorId, transaction);
    const content: DatasetContent = {
      kind: submission.kind,
      title: submission.title,
      invented: submission.invented,
      metadata,
      grade: grade ?? null,
      file: { fileName: submission.fileName, sha256: submission.fileSha256, bytes: submission.fileBytes },
      submission: { id: submission.id, number: numberText(submission.number) },
      contributor: { id: contributor.id, name: contributor.name },
      samples: rows.flatMap((row) => sampleOf(row, metadata) ?? []),
    };
    return this.publishing.publish(content, by, { datasetSlug }, transaction);
  }

  private tell(
    submission: SubmissionRow,
    outcome: string,
    lines: string[],
    by: Person,
    transaction: Transaction,
  ): Promise<void> {
    return this.outbox.queue(
      {
        toPersonId: submission.contributorId,
        mailKind: `submission-${outcome}`,
        subject: `${numberText(submission.number)} ${outcome}: ${submission.title}`,
        lines: [`${by.name} has ${outcome} "${submission.title}".`, ...lines],
        linkPath: `/intake/${submission.id}`,
      },
      transaction,
    );
  }
}

const markOf = ({ id, number, checksum, object }: DatasetVersion) => ({
  slug: object.slug,
  versionId: id,
  number,
  checksum,
});

function requireSettled({ counts, number }: SubmissionRow): void {
  if (counts.errors === 0 && counts.openWarnings === 0) return;
  throw problem(
    422,
    'findings-stand',
    'Findings stand in the way',
    `${numberText(number)} has ${counts.errors} errors and ${counts.openWarnings} open warnings. Errors must be mended by the contributor; waive each warning with a reason, or return the submission.`,
  );
}
