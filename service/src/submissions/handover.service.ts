import { Injectable } from '@nestjs/common';
import { nowIso } from '../database/row';
import { problem } from '../http/problem';
import { OutboxService } from '../notifications/outbox.service';
import { PeopleService } from '../users/people.service';
import { Evaluations } from './evaluation.service';
import { missingMetadata } from './missing-metadata';
import { numberText, type SubmissionRow } from './models/submission-row';
import { requireOwn } from './require-own';
import { type Editing, SubmissionChanges } from './submission-changes.service';

/** The contributor's hand-overs: to the stewards, and back out of the process. */
@Injectable()
export class Handover {
  constructor(
    private readonly changes: SubmissionChanges,
    private readonly evaluations: Evaluations,
    private readonly outbox: OutboxService,
    private readonly people: PeopleService,
  ) {}

  submit(editing: Editing): Promise<SubmissionRow> {
    const change = { ...editing, step: 'submit' as const, verb: 'submit', summary: () => 'handed in' };
    return this.changes.run(change, async (submission, transaction) => {
      requireOwn(submission, editing.by);
      await this.requireComplete(submission);
      await submission.update(
        { state: 'submitted', submittedAt: nowIso(), reviewerId: null },
        { transaction },
      );
      const stewards = await this.people.withRole('steward', transaction);
      for (const steward of stewards.filter(({ id }) => id !== editing.by.id)) {
        await this.outbox.queue(
          {
            toPersonId: steward.id,
            mailKind: 'submission-handed-in',
            subject: `${numberText(submission.number)} waits for vetting: ${submission.title}`,
            lines: [`${editing.by.name} handed in "${submission.title}" (${submission.fileName}).`],
            linkPath: `/intake/${submission.id}`,
          },
          transaction,
        );
      }
    });
  }

  withdraw(editing: Editing, reason: string): Promise<SubmissionRow> {
    const change = {
      ...editing,
      step: 'withdraw' as const,
      verb: 'withdraw-submission',
      summary: () => `withdrawn: ${reason}`,
    };
    return this.changes.run(change, async (submission, transaction) => {
      requireOwn(submission, editing.by);
      await submission.update({ state: 'withdrawn', decidedAt: nowIso() }, { transaction });
    });
  }

  private async requireComplete(submission: SubmissionRow): Promise<void> {
    const { findings, rows, counts } = await this.evaluations.of(submission);
    const errors = findings
      .filter(({ severity }) => severity === 'error')
      .slice(0, 50)
      .map(({ code, field, message, remedy }) => ({
        pointer: '/findings',
        field: field ?? code,
        message: `${code}: ${message} ${remedy}`,
      }));
    const missing = missingMetadata(submission.metadata, rows).map((field) => ({
      pointer: `/metadata/${field}`,
      field,
      message: 'Wanted before the submission can be handed in.',
    }));
    if (errors.length + missing.length > 0) {
      throw problem(
        422,
        'not-ready',
        'The submission is not ready to be handed in',
        `${counts.errors} errors stand and ${missing.length} answers are missing. Mend them, answer in the form, or leave the rows out with a reason; nothing is lost meanwhile.`,
        [...missing, ...errors],
      );
    }
    if (counts.usableRows === 0) {
      throw problem(
        422,
        'no-usable-row',
        'There is no row to hand in',
        'No row has a site, a position, an age and a flux. Correct the mapping first.',
      );
    }
  }
}
