import * as fs from 'node:fs/promises';
import * as path from 'node:path';
import { randomUUID } from 'node:crypto';
import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { SubmissionMetadata } from '@siltlight/common/vetting/context';
import type { Person } from '../auth/policy';
import { Settings } from '../config/settings';
import { SeedRegistry } from '../database/seed-registry';
import { Decisions } from '../review/decisions.service';
import { Review } from '../review/review.service';
import { Handover } from '../submissions/handover.service';
import type { SubmissionRow } from '../submissions/models/submission-row';
import { SubmissionAccess } from '../submissions/submission-access.service';
import { SubmissionViews } from '../submissions/submission-views.service';
import { Uploads } from '../submissions/uploads.service';
import { personOf, PeopleService } from '../users/people.service';
import { demoSheetText } from './demo-sheet-text';
import { type DemoSheet, demoSheets, queuedSheet, returnedSheet } from './demo-sites';
import { DemoEstimates } from './demo-estimates';

/** After the people, who act here. */
const ORDER = 20;

/** The invented scenario, made by the same acts that people do: upload, hand in, vet, build, run, sign off. */
@Injectable()
export class DemoScenario implements OnModuleInit {
  constructor(
    private readonly seeds: SeedRegistry,
    private readonly people: PeopleService,
    private readonly uploads: Uploads,
    private readonly handover: Handover,
    private readonly review: Review,
    private readonly decisions: Decisions,
    private readonly access: SubmissionAccess,
    private readonly views: SubmissionViews,
    private readonly estimates: DemoEstimates,
    private readonly settings: Settings,
  ) {}

  onModuleInit(): void {
    this.seeds.register({ name: 'demo-holdings', order: ORDER, run: () => this.holdings() });
    this.seeds.register({ name: 'demo-estimates', order: ORDER + 1, run: () => this.published() });
    this.seeds.register({ name: 'demo-queue', order: ORDER + 2, run: () => this.queue() });
  }

  private async holdings(): Promise<void> {
    const [contributor, steward] = await Promise.all([this.person('scientist2'), this.person('steward')]);
    for (const sheet of demoSheets) {
      const submission = await this.handIn(sheet, contributor);
      await this.approve(submission, steward);
    }
  }

  private async published(): Promise<void> {
    await this.estimates.make(await this.person('scientist2'), await this.person('scientist'));
  }

  /** Work for the first look: one that waits, and one that came back with a query. */
  private async queue(): Promise<void> {
    const [contributor, steward] = await Promise.all([this.person('scientist2'), this.person('steward')]);
    await this.handIn(queuedSheet, contributor);
    const submission = await this.handIn(returnedSheet, await this.person('scientist'));
    let row = await this.review.claim(this.editing(submission, steward));
    const sheet = row.workbook.sheets[0]!.name;
    row = await this.review.ask(this.editing(row, steward), {
      sheet,
      row: 5,
      column: 'F',
      text: 'Is this the mean of the bin, or a single sample?',
    });
    await this.decisions.decide(this.editing(row, steward), {
      decision: 'return',
      reason: 'Please answer the query on F5 and say which balance was used.',
    });
  }

  private async handIn(sheet: DemoSheet, by: Person): Promise<SubmissionRow> {
    const file = path.join(this.settings.temporaryDir, randomUUID());
    await fs.writeFile(file, demoSheetText(sheet));
    const given = {
      kind: 'dust-flux' as const,
      title: sheet.title,
      invented: true,
      metadata: metadataOf(sheet, by),
    };
    const submission = await this.uploads.take({ path: file, fileName: sheet.fileName }, given, by);
    return this.handover.submit(this.editing(submission, by));
  }

  private async approve(submission: SubmissionRow, by: Person): Promise<void> {
    let row = await this.review.claim(this.editing(submission, by));
    const findings = await this.views.findings(row);
    const warnings = findings.filter(({ severity }) => severity === 'warning').map(({ key }) => key);
    if (warnings.length > 0) {
      row = await this.review.waive(this.editing(row, by), warnings, 'Invented data of the demo scenario.');
    }
    await this.decisions.decide(this.editing(row, by), { decision: 'approve', grade: 'measured' });
  }

  private editing({ id, revision }: SubmissionRow, by: Person) {
    return { id, ifMatch: `"${revision}"`, by };
  }

  private async person(name: string): Promise<Person> {
    const row = await this.people.byEmail(`${name}@siltlight.example`);
    if (!row) throw new Error(`The demo person ${name} is missing.`);
    return personOf(row);
  }
}

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
