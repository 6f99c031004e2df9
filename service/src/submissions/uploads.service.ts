import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { datasetKind } from '@siltlight/common/dataset/kinds';
import type { RawWorkbook } from '@siltlight/common/sheet/grid';
import { proposeWorkbook } from '@siltlight/common/sheet/propose';
import type { SubmissionMetadata } from '@siltlight/common/vetting/context';
import type { DatasetKindId } from '@siltlight/common/wire/submissions';
import { Op, type Transaction } from 'sequelize';
import type { Person } from '../auth/policy';
import { WriteQueue } from '../database/write-queue';
import { FileStore } from '../files/file-store.service';
import { LedgerService } from '../ledger/ledger.service';
import { ParsedWorkbooks } from '../workers/parsed-workbooks.service';
import { readUpload } from '../workers/upload-reader';
import { Evaluations } from './evaluation.service';
import { numberText, SubmissionRow, type WorkbookSummary } from './models/submission-row';
import { RememberedMappings } from './remembered-mappings.service';

export interface UploadedFile {
  path: string;
  fileName: string;
}

const MEDIA_TYPE = 'application/octet-stream';

/** The same file again after this long is meant as another submission; the page then says that it was seen before. */
const SAME_CLICK_MS = 10_000;

/** Takes a file in: read apart from this process, kept byte for byte, understood, vetted. */
@Injectable()
export class Uploads {
  constructor(
    @InjectModel(SubmissionRow) private readonly submissions: typeof SubmissionRow,
    private readonly files: FileStore,
    private readonly workbooks: ParsedWorkbooks,
    private readonly remembered: RememberedMappings,
    private readonly evaluations: Evaluations,
    private readonly ledger: LedgerService,
    private readonly writes: WriteQueue,
  ) {}

  async take(
    file: UploadedFile,
    given: {
      kind: DatasetKindId;
      title?: string | undefined;
      invented?: boolean;
      metadata?: SubmissionMetadata;
    },
    by: Person,
  ): Promise<SubmissionRow> {
    const workbook = await readUpload(file);
    const { sha256, bytes } = await this.files.put(file.path, {
      fileName: file.fileName,
      mediaType: MEDIA_TYPE,
    });
    await this.workbooks.store({ sha256, fileName: file.fileName }, workbook);
    const { kind, invented = false } = given;
    const mapping = await this.remembered.applyTo(proposeWorkbook(workbook, datasetKind(kind)), by.id);
    const title = given.title ?? file.fileName.replace(/\.[^.]+$/, '').replaceAll('_', ' ');
    const metadata: SubmissionMetadata = { title, ...given.metadata };
    const draft = {
      workbook,
      kind,
      mapping,
      metadata,
      corrections: [],
      leftOut: [],
      waivedKeys: new Set<string>(),
      formOffered: true,
    };
    const { counts } = await this.evaluations.evaluate(draft);
    return this.writes.run(async (transaction) => {
      const twin = await this.justSent(
        { contributorId: by.id, fileSha256: sha256, fileName: file.fileName, kind },
        transaction,
      );
      if (twin) return twin;
      const last = await this.submissions.max<number | null, SubmissionRow>('number', { transaction });
      const row = await this.submissions.create(
        {
          number: (last ?? 0) + 1,
          title,
          kind,
          state: 'draft',
          contributorId: by.id,
          reviewerId: null,
          invented,
          fileName: file.fileName,
          fileSha256: sha256,
          fileBytes: bytes,
          workbook: summaryOf(workbook),
          mapping,
          metadata,
          counts,
          revision: 1,
        },
        { transaction },
      );
      await this.ledger.record(
        {
          actorId: by.id,
          verb: 'upload-submission',
          objectKind: 'submission',
          objectId: row.id,
          objectTitle: title,
          summary: `${numberText(row.number)} uploaded: ${file.fileName}`,
          after: { fileSha256: sha256, bytes },
        },
        transaction,
      );
      return row;
    });
  }

  /** A double click sends the same bytes twice within moments: that is one submission. */
  private justSent(
    same: Pick<SubmissionRow, 'contributorId' | 'fileSha256' | 'fileName' | 'kind'>,
    transaction: Transaction,
  ): Promise<SubmissionRow | null> {
    const createdAt = { [Op.gt]: new Date(Date.now() - SAME_CLICK_MS).toISOString() };
    return this.submissions.findOne({
      where: { ...same, state: 'draft', revision: 1, createdAt },
      transaction,
    });
  }
}

function summaryOf({ format, encoding, delimiter, sheets, readNotes }: RawWorkbook): WorkbookSummary {
  return {
    format,
    encoding: encoding ?? null,
    delimiter: delimiter ?? null,
    sheets: sheets.map(({ name, rows, columnCount }) => ({ name, rowCount: rows.length, columnCount })),
    readNotes,
  };
}
