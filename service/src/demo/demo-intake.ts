import * as fs from 'node:fs/promises';
import * as path from 'node:path';
import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import type { SubmissionMetadata } from '@siltlight/common/vetting/context';
import type { Person } from '../auth/policy';
import { Settings } from '../config/settings';
import { Decisions } from '../review/decisions.service';
import { Review } from '../review/review.service';
import { Handover } from '../submissions/handover.service';
import type { SubmissionRow } from '../submissions/models/submission-row';
import { SubmissionAccess } from '../submissions/submission-access.service';
import { SubmissionViews } from '../submissions/submission-views.service';
import { SubmissionsService } from '../submissions/submissions.service';
import { Uploads } from '../submissions/uploads.service';
import { demoSheetText } from './demo-sheet-text';
import type { DemoSheet } from './demo-sites';

const MOST = 200;

/** The acts of contributors and stewards on an invented sheet. Each goes on from where an earlier start broke off. */
@Injectable()
export class DemoIntake {
  constructor(
    private readonly uploads: Uploads,
    private readonly handover: Handover,
    private readonly submissions: SubmissionsService,
    private readonly access: SubmissionAccess,
    private readonly views: SubmissionViews,
    private readonly review: Review,
    private readonly decisions: Decisions,
    private readonly settings: Settings,
  ) {}

  async handIn(sheet: DemoSheet, by: Person): Promise<SubmissionRow> {
    const submission = (await this.found(sheet, by)) ?? (await this.upload(sheet, by));
    return submission.state === 'draft' ? this.handover.submit(editing(submission, by)) : submission;
  }

  async approve(submission: SubmissionRow, by: Person): Promise<void> {
    let row = await this.claimed(submission, by);
    if (row.state !== 'in-review') return;
    const findings = await this.views.findings(row);
    const warnings = findings.filter(({ severity }) => severity === 'warning').map(({ key }) => key);
    if (warnings.length > 0) {
      row = await this.review.waive(editing(row, by), warnings, 'Invented data of the demo scenario.');
    }
    await this.decisions.decide(editing(row, by), { decision: 'approve', grade: 'measured' });
  }

  async returnWithQuery(submission: SubmissionRow, by: Person): Promise<void> {
    let row = await this.claimed(submission, by);
    if (row.state !== 'in-review') return;
    const sheet = row.workbook.sheets[0]!.name;
    const text = 'Is this the mean of the bin, or a single sample?';
    row = await this.review.ask(editing(row, by), { sheet, row: 5, column: 'F', text });
    await this.decisions.decide(editing(row, by), {
      decision: 'return',
      reason: 'Please answer the query on F5 and say which balance was used.',
    });
  }

  private claimed(submission: SubmissionRow, by: Person): Promise<SubmissionRow> {
    return submission.state === 'submitted'
      ? this.review.claim(editing(submission, by))
      : Promise.resolve(submission);
  }

  private async found(sheet: DemoSheet, by: Person): Promise<SubmissionRow | null> {
    const { items } = await this.submissions.list({ mine: 'true', limit: MOST }, by);
    const same = items.find(({ title, invented }) => invented && title === sheet.title);
    return same ? this.access.visible(same.id, by) : null;
  }

  private async upload(sheet: DemoSheet, by: Person): Promise<SubmissionRow> {
    const file = path.join(this.settings.temporaryDir, randomUUID());
    await fs.writeFile(file, demoSheetText(sheet));
    const given = {
      kind: 'dust-flux' as const,
      title: sheet.title,
      invented: true,
      metadata: metadataOf(sheet, by),
    };
    return this.uploads.take({ path: file, fileName: sheet.fileName }, given, by);
  }
}

const editing = ({ id, revision }: SubmissionRow, by: Person) => ({ id, ifMatch: `"${revision}"`, by });

function metadataOf(sheet: DemoSheet, by: Person): SubmissionMetadata {
  return {
    title: sheet.title,
    creators: [{ name: by.name }],
    licence: 'CC0-1.0',
    publicationCitation: 'Invented for the demo scenario; there is no publication.',
    archive: sheet.archive,
    method: 'invented',
    sizeCutoff: 'bulk',
    dustDefinition: 'eolian',
    ageDatum: 'BP1950',
    ageModel: 'invented age model, calibrated with an invented curve',
    uncertaintyMeaning: 'standard-error',
    densityBasis: 'measured',
    note: 'Every number is made up.',
  };
}
