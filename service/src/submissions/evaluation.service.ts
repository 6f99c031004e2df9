import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { datasetKind } from '@siltlight/common/dataset/kinds';
import type { SampleRow } from '@siltlight/common/dataset/sample-row';
import type { RawWorkbook } from '@siltlight/common/sheet/grid';
import type { Correction, Mapping } from '@siltlight/common/sheet/mapping';
import { normaliseWorkbook } from '@siltlight/common/sheet/normalise';
import type { SubmissionMetadata, VettingContext } from '@siltlight/common/vetting/context';
import type { Finding } from '@siltlight/common/vetting/rule';
import { vet } from '@siltlight/common/vetting/vet';
import type { DatasetKindId } from '@siltlight/common/wire/submissions';
import { sampleOf } from '../datasets/dataset-content';
import { HeldSites } from '../datasets/held-sites.service';
import { ParsedWorkbooks } from '../workers/parsed-workbooks.service';
import type { Counts, SubmissionRow } from './models/submission-row';
import { CorrectionRow, LeftOutRow, WaiverRow } from './models/working-rows';

export interface Evaluation {
  workbook: RawWorkbook;
  rows: SampleRow[];
  findings: Finding[];
  counts: Counts;
}

export interface Draft {
  workbook: RawWorkbook;
  kind: DatasetKindId;
  mapping: Mapping;
  metadata: SubmissionMetadata;
  corrections: (Correction & { id: string })[];
  leftOut: { sheet: string; row: number; reason: string }[];
  waivedKeys: ReadonlySet<string>;
  /** false: a file that is only checked, without a form */
  formOffered: boolean;
}

const KEPT = 6;

/** Canonical rows and findings of a submission, computed from the file and what people did to it; never stored. */
@Injectable()
export class Evaluations {
  private readonly recent = new Map<string, Evaluation>();

  constructor(
    @InjectModel(CorrectionRow) private readonly corrections: typeof CorrectionRow,
    @InjectModel(LeftOutRow) private readonly leftOut: typeof LeftOutRow,
    @InjectModel(WaiverRow) private readonly waivers: typeof WaiverRow,
    private readonly workbooks: ParsedWorkbooks,
    private readonly held: HeldSites,
  ) {}

  /** The same revision gives the same evaluation. */
  async of(submission: SubmissionRow): Promise<Evaluation> {
    const key = `${submission.id} ${submission.revision}`;
    const known = this.recent.get(key);
    if (known) return known;
    const evaluation = await this.evaluate(await this.draftOf(submission));
    this.keep(submission, evaluation);
    return evaluation;
  }

  /** An evaluation that was made before its revision was written. */
  keep({ id, revision }: SubmissionRow, evaluation: Evaluation): void {
    this.recent.set(`${id} ${revision}`, evaluation);
    const oldest = this.recent.keys().next().value;
    if (this.recent.size > KEPT && oldest !== undefined) this.recent.delete(oldest);
  }

  /** A new revision with the same data: a hand-over, a query. */
  carryOver(submission: SubmissionRow): void {
    const before = this.recent.get(`${submission.id} ${submission.revision - 1}`);
    if (before) this.keep(submission, before);
  }

  /** Everything that the findings of the present revision rest on. */
  async draftOf(submission: SubmissionRow): Promise<Draft> {
    const inOrder = { where: { submissionId: submission.id }, order: [['id', 'ASC']] as [string, string][] };
    const [corrections, leftOut, waivers] = await Promise.all([
      this.corrections.findAll({ ...inOrder, where: { submissionId: submission.id, undoneAt: null } }),
      this.leftOut.findAll(inOrder),
      this.waivers.findAll(inOrder),
    ]);
    return {
      workbook: await this.workbooks.load({ sha256: submission.fileSha256, fileName: submission.fileName }),
      kind: submission.kind,
      mapping: submission.mapping,
      metadata: submission.metadata,
      corrections: corrections.map(({ id, sheet, row, column, text }) => ({ id, sheet, row, column, text })),
      leftOut: leftOut.map(({ sheet, row, reason }) => ({ sheet, row, reason })),
      waivedKeys: new Set(waivers.map(({ findingKey }) => findingKey)),
      formOffered: true,
    };
  }

  async evaluate(draft: Draft): Promise<Evaluation> {
    const { workbook, kind, mapping, metadata, corrections } = draft;
    const { rows, missingCodes } = normaliseWorkbook(workbook, datasetKind(kind), mapping, corrections, {
      ageDatum: metadata.ageDatum,
    });
    const reasons = new Map(draft.leftOut.map(({ sheet, row, reason }) => [`${sheet}\0${row}`, reason]));
    const marked = rows.map((row) => {
      const reason = reasons.get(`${row.sheet}\0${row.row}`);
      return reason === undefined ? row : { ...row, leftOut: reason };
    });
    const held = await this.held.all();
    const context: VettingContext = {
      workbook,
      mapping,
      rows: marked,
      metadata,
      formOffered: draft.formOffered,
      kind,
      heldSites: held.sites,
      heldSamples: held.samples,
      limits: {},
      missingCodes,
    };
    const findings = vet(context);
    return { workbook, rows: marked, findings, counts: countsOf(marked, findings, draft) };
  }
}

function countsOf(rows: SampleRow[], findings: Finding[], { metadata, waivedKeys }: Draft): Counts {
  const number = (severity: Finding['severity']) =>
    findings.filter((finding) => finding.severity === severity).length;
  return {
    rows: rows.length,
    usableRows: rows.filter((row) => sampleOf(row, metadata) !== null).length,
    leftOut: rows.filter(({ leftOut }) => leftOut !== undefined).length,
    errors: number('error'),
    warnings: number('warning'),
    openWarnings: findings.filter(({ severity, key }) => severity === 'warning' && !waivedKeys.has(key))
      .length,
    notes: number('note'),
  };
}
