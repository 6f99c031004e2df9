import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Transaction } from 'sequelize';
import type { Person } from '../auth/policy';
import { notFound, problem } from '../http/problem';
import { OutboxService } from '../notifications/outbox.service';
import { type Draft, Evaluations } from '../submissions/evaluation.service';
import { numberText, type SubmissionRow } from '../submissions/models/submission-row';
import { QueryRow, ReplyRow, WaiverRow } from '../submissions/models/working-rows';
import { SubmissionAccess } from '../submissions/submission-access.service';
import { type Editing, SubmissionChanges } from '../submissions/submission-changes.service';

/** What stewards do before they decide: take, let go, waive warnings, ask. */
@Injectable()
export class Review {
  constructor(
    @InjectModel(WaiverRow) private readonly waivers: typeof WaiverRow,
    @InjectModel(QueryRow) private readonly queries: typeof QueryRow,
    @InjectModel(ReplyRow) private readonly replies: typeof ReplyRow,
    private readonly access: SubmissionAccess,
    private readonly evaluations: Evaluations,
    private readonly changes: SubmissionChanges,
    private readonly outbox: OutboxService,
  ) {}

  claim(editing: Editing): Promise<SubmissionRow> {
    const change = {
      ...editing,
      step: 'claim' as const,
      verb: 'claim-submission',
      summary: () => `taken for review by ${editing.by.name}`,
    };
    return this.changes.run(change, async (submission, transaction) => {
      await this.requireFourEyes(submission, editing.by, transaction);
      await submission.update({ state: 'in-review', reviewerId: editing.by.id }, { transaction });
    });
  }

  /** Any steward may: a submission must not be stuck with somebody who is away. That person is told. */
  release(editing: Editing): Promise<SubmissionRow> {
    const change = {
      ...editing,
      step: 'release' as const,
      verb: 'release-submission',
      summary: () => 'put back into the queue',
    };
    return this.changes.run(change, async (submission, transaction) => {
      const { reviewerId } = submission;
      await submission.update({ state: 'submitted', reviewerId: null }, { transaction });
      if (reviewerId !== null && reviewerId !== editing.by.id) {
        await this.tellReviewer(submission, reviewerId, editing.by, transaction);
      }
    });
  }

  waive(editing: Editing, findingKeys: string[], reason: string): Promise<SubmissionRow> {
    const change = {
      ...editing,
      step: 'examine' as const,
      verb: 'waive-warnings',
      summary: () => `${findingKeys.length} warnings waived: ${reason}`,
      after: () => ({ findingKeys, reason }),
      amend: async (draft: Draft, submission: SubmissionRow) => {
        await this.requireFourEyes(submission, editing.by);
        requireReviewer(submission, editing.by);
        await this.requireWarnings(submission, findingKeys);
        return { ...draft, waivedKeys: new Set([...draft.waivedKeys, ...findingKeys]) };
      },
    };
    return this.changes.run(change, async (submission, transaction) => {
      for (const findingKey of findingKeys) {
        const where = { submissionId: submission.id, findingKey };
        await this.waivers.findOrCreate({
          where,
          defaults: { personId: editing.by.id, reason },
          transaction,
        });
      }
    });
  }

  ask(
    editing: Editing,
    query: { sheet: string; row: number; column: string; text: string },
  ): Promise<SubmissionRow> {
    const place = `${query.sheet}!${query.column}${query.row}`;
    const change = {
      ...editing,
      step: 'examine' as const,
      verb: 'pin-query',
      summary: () => `query pinned to ${place}`,
      after: () => query,
    };
    return this.changes.run(change, async (submission, transaction) => {
      await this.requireFourEyes(submission, editing.by, transaction);
      requireReviewer(submission, editing.by);
      await this.queries.create(
        { ...query, submissionId: submission.id, personId: editing.by.id },
        { transaction },
      );
    });
  }

  /** Contributor and steward both answer; the other side is told by mail. */
  reply(editing: Editing, queryId: string, text: string): Promise<SubmissionRow> {
    const change = {
      ...editing,
      step: 'answer' as const,
      verb: 'answer-query',
      summary: () => 'a query answered',
      after: () => ({ queryId }),
    };
    return this.changes.run(change, async (submission, transaction) => {
      const query = await this.queries.findOne({
        where: { id: queryId, submissionId: submission.id },
        transaction,
      });
      if (!query) throw notFound('Query', queryId);
      await this.replies.create(
        { submissionId: submission.id, personId: editing.by.id, queryId, text },
        { transaction },
      );
      const other = editing.by.id === submission.contributorId ? query.personId : submission.contributorId;
      if (other === editing.by.id) return;
      await this.outbox.queue(
        {
          toPersonId: other,
          mailKind: 'query-answered',
          subject: `${numberText(submission.number)}: a query was answered`,
          lines: [
            `On ${query.sheet}!${query.column}${query.row}: ${query.text}`,
            `${editing.by.name}: ${text}`,
          ],
          linkPath: `/intake/${submission.id}`,
        },
        transaction,
      );
    });
  }

  /** @throws Problem 403 for whoever contributed or corrected the submission */
  async requireFourEyes(submission: SubmissionRow, by: Person, transaction?: Transaction): Promise<void> {
    if (!(await this.access.hasHandIn(submission, by, transaction))) return;
    throw problem(
      403,
      'four-eyes',
      'Another steward decides on this one',
      `You contributed to ${numberText(submission.number)}; whoever contributed or corrected a submission does not vet it.`,
    );
  }

  private tellReviewer(
    submission: SubmissionRow,
    reviewerId: string,
    by: Person,
    transaction: Transaction,
  ): Promise<void> {
    return this.outbox.queue(
      {
        toPersonId: reviewerId,
        mailKind: 'submission-released',
        subject: `${numberText(submission.number)} is back in the queue`,
        lines: [`${by.name} put "${submission.title}" back into the queue; you had it in review.`],
        linkPath: `/intake/${submission.id}`,
      },
      transaction,
    );
  }

  private async requireWarnings(submission: SubmissionRow, keys: string[]): Promise<void> {
    const { findings } = await this.evaluations.of(submission);
    const byKey = new Map(findings.map((finding) => [finding.key, finding]));
    keys.forEach((key, index) => {
      const finding = byKey.get(key);
      if (finding?.severity === 'warning') return;
      const message = finding
        ? `${finding.code} is ${finding.severity === 'error' ? 'an error' : 'a note'}: only warnings can be waived.`
        : 'There is no such finding any more.';
      throw problem(422, 'not-waivable', 'This finding cannot be waived', message, [
        { pointer: `/findingKeys/${index}`, field: 'findingKeys', value: key, message },
      ]);
    });
  }
}

/** Once somebody has taken a submission, the others leave it to them. */
export function requireReviewer(submission: SubmissionRow, by: Person): void {
  if (submission.reviewerId === null || submission.reviewerId === by.id) return;
  throw problem(
    409,
    'in-review-with-another',
    'Another steward has it in review',
    `${numberText(submission.number)} was taken by somebody else meanwhile. Reload to see what happened.`,
  );
}
