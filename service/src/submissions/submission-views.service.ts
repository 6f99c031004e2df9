import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { PersonMark } from '@siltlight/common/wire/shared';
import type { FindingView, SubmissionDetail, SubmissionSummary } from '@siltlight/common/wire/submissions';
import { Op } from 'sequelize';
import type { Person } from '../auth/policy';
import { DatasetsService } from '../datasets/datasets.service';
import { PeopleService } from '../users/people.service';
import { Evaluations } from './evaluation.service';
import { missingMetadata } from './missing-metadata';
import { numberText, SubmissionRow } from './models/submission-row';
import { CorrectionRow, DecisionRow, LeftOutRow, QueryRow, ReplyRow, WaiverRow } from './models/working-rows';
import { SubmissionAccess } from './submission-access.service';
import { STEPS, type Step } from './transitions';

/** Submissions as people read them. */
@Injectable()
export class SubmissionViews {
  constructor(
    @InjectModel(SubmissionRow) private readonly submissions: typeof SubmissionRow,
    @InjectModel(CorrectionRow) private readonly corrections: typeof CorrectionRow,
    @InjectModel(LeftOutRow) private readonly leftOut: typeof LeftOutRow,
    @InjectModel(WaiverRow) private readonly waivers: typeof WaiverRow,
    @InjectModel(QueryRow) private readonly queries: typeof QueryRow,
    @InjectModel(ReplyRow) private readonly replies: typeof ReplyRow,
    @InjectModel(DecisionRow) private readonly decisions: typeof DecisionRow,
    private readonly access: SubmissionAccess,
    private readonly evaluations: Evaluations,
    private readonly datasets: DatasetsService,
    private readonly people: PeopleService,
  ) {}

  async summary(row: SubmissionRow): Promise<SubmissionSummary> {
    return {
      id: row.id,
      number: numberText(row.number),
      title: row.title,
      kind: row.kind,
      state: row.state,
      contributor: await this.people.mark(row.contributorId),
      reviewer: row.reviewerId === null ? null : await this.people.mark(row.reviewerId),
      fileName: row.fileName,
      counts: row.counts,
      invented: row.invented,
      createdAt: row.createdAt,
      submittedAt: row.submittedAt ?? null,
      decidedAt: row.decidedAt ?? null,
    };
  }

  async detail(row: SubmissionRow, reader: Person): Promise<SubmissionDetail> {
    const { rows } = await this.evaluations.of(row);
    const missing = missingMetadata(row.metadata, rows);
    return {
      ...(await this.summary(row)),
      revision: row.revision,
      fileSha256: row.fileSha256,
      fileBytes: row.fileBytes,
      sameFileAs: await this.sameFile(row, reader),
      workbook: row.workbook,
      mapping: row.mapping,
      metadata: row.metadata,
      missingMetadata: missing,
      queries: await this.queriesOf(row.id),
      corrections: await this.correctionsOf(row.id),
      leftOut: (await this.leftOut.findAll(of(row.id))).map(({ sheet, row: number, reason }) => ({
        sheet,
        row: number,
        reason,
      })),
      decisions: await this.decisionsOf(row.id),
      dataset: await this.datasetOf(row),
      rights: await this.rights(row, reader, missing),
    };
  }

  /** Findings with their waivers. */
  async findings(row: SubmissionRow): Promise<FindingView[]> {
    const [{ findings }, waivers] = await Promise.all([
      this.evaluations.of(row),
      this.waivers.findAll(of(row.id)),
    ]);
    const marks = await this.marks(waivers.map(({ personId }) => personId));
    const byKey = new Map(waivers.map((waiver) => [waiver.findingKey, waiver]));
    return findings.map((finding) => {
      const waiver = byKey.get(finding.key);
      if (!waiver) return finding;
      const { reason, createdAt: at, personId } = waiver;
      return { ...finding, waived: { by: marks.get(personId)!, reason, at } };
    });
  }

  private async rights(
    row: SubmissionRow,
    reader: Person,
    missing: string[],
  ): Promise<SubmissionDetail['rights']> {
    const own = row.contributorId === reader.id;
    const steward = reader.roles.includes('steward');
    const hasHand = steward && (await this.access.hasHandIn(row, reader));
    const may = (step: Step) => STEPS[step].from.includes(row.state);
    const otherReviewer = row.reviewerId !== null && row.reviewerId !== reader.id;
    return {
      mayEdit: own && may('edit'),
      maySubmit:
        own && may('submit') && missing.length === 0 && row.counts.errors === 0 && row.counts.usableRows > 0,
      mayClaim: steward && !hasHand && may('claim'),
      mayDecide: steward && !hasHand && !otherReviewer && may('approve'),
      whyNot: await this.whyNot(row, { own, steward, hasHand, otherReviewer, missing }),
    };
  }

  private async whyNot(
    row: SubmissionRow,
    given: { own: boolean; steward: boolean; hasHand: boolean; otherReviewer: boolean; missing: string[] },
  ): Promise<string | null> {
    const { own, steward, hasHand, otherReviewer, missing } = given;
    if (own && STEPS.submit.from.includes(row.state)) {
      if (row.counts.errors > 0)
        return `${row.counts.errors} errors stand: mend them, answer in the form, or leave the rows out.`;
      if (missing.length > 0) return `The form still wants: ${missing.join(', ')}.`;
      return row.counts.usableRows === 0 ? 'No row has a site, a position, an age and a flux.' : null;
    }
    if (!steward || !STEPS.approve.from.includes(row.state)) return null;
    if (hasHand)
      return own ? 'Yours: another steward decides.' : 'You corrected it: another steward decides.';
    return otherReviewer ? `In review with ${(await this.people.mark(row.reviewerId!)).name}.` : null;
  }

  private async sameFile(row: SubmissionRow, reader: Person): Promise<SubmissionDetail['sameFileAs']> {
    const where = { fileSha256: row.fileSha256, number: { [Op.lt]: row.number }, contributorId: reader.id };
    const earlier = await this.submissions.findOne({ where, order: [['number', 'DESC']] });
    return earlier && { id: earlier.id, number: numberText(earlier.number) };
  }

  private async queriesOf(submissionId: string): Promise<SubmissionDetail['queries']> {
    const [queries, replies] = await Promise.all([
      this.queries.findAll(of(submissionId)),
      this.replies.findAll(of(submissionId)),
    ]);
    const marks = await this.marks([...queries, ...replies].map(({ personId }) => personId));
    return queries.map(({ id, sheet, row, column, text, personId, createdAt: at }) => ({
      id,
      sheet,
      row,
      column,
      text,
      at,
      by: marks.get(personId)!,
      replies: replies
        .filter(({ queryId }) => queryId === id)
        .map((reply) => ({ by: marks.get(reply.personId)!, text: reply.text, at: reply.createdAt })),
    }));
  }

  private async correctionsOf(submissionId: string): Promise<SubmissionDetail['corrections']> {
    const rows = await this.corrections.findAll({
      ...of(submissionId),
      where: { submissionId, undoneAt: null },
    });
    const marks = await this.marks(rows.map(({ personId }) => personId));
    return rows.map(({ id, sheet, row, column, rawText, text, personId, createdAt: at }) => ({
      id,
      sheet,
      row,
      column,
      rawText,
      text,
      at,
      by: marks.get(personId)!,
    }));
  }

  private async decisionsOf(submissionId: string): Promise<SubmissionDetail['decisions']> {
    const rows = await this.decisions.findAll(of(submissionId));
    const marks = await this.marks(rows.map(({ personId }) => personId));
    return rows.map(({ decision, reason, personId, createdAt: at }) => ({
      decision,
      reason: reason ?? null,
      at,
      by: marks.get(personId)!,
    }));
  }

  private async datasetOf({ datasetVersionId }: SubmissionRow): Promise<SubmissionDetail['dataset']> {
    if (!datasetVersionId) return null;
    const { object, number } = await this.datasets.byVersionId(datasetVersionId);
    return { slug: object.slug, title: object.title, versionNumber: number };
  }

  private async marks(personIds: string[]): Promise<Map<string, PersonMark>> {
    const ids = [...new Set(personIds)];
    return new Map(await Promise.all(ids.map(async (id) => [id, await this.people.mark(id)] as const)));
  }
}

const of = (submissionId: string) => ({
  where: { submissionId },
  order: [['id', 'ASC']] as [string, string][],
});
