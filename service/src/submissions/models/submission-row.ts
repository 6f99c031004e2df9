import type { Mapping } from '@siltlight/common/sheet/mapping';
import type { SubmissionMetadata } from '@siltlight/common/vetting/context';
import type { DatasetKindId, SubmissionDetail, SubmissionState } from '@siltlight/common/wire/submissions';
import { Column, DataType } from 'sequelize-typescript';
import { FlagColumn, JsonColumn, Row, StoredIn } from '../../database/row';

export type Counts = SubmissionDetail['counts'];
export type WorkbookSummary = SubmissionDetail['workbook'];

@StoredIn('submissions')
export class SubmissionRow extends Row {
  @Column(DataType.INTEGER)
  declare number: number;

  @Column(DataType.TEXT)
  declare title: string;

  @Column(DataType.TEXT)
  declare kind: DatasetKindId;

  @Column(DataType.TEXT)
  declare state: SubmissionState;

  @Column(DataType.TEXT)
  declare contributorId: string;

  @Column(DataType.TEXT)
  declare reviewerId: string | null;

  @FlagColumn
  declare invented: boolean;

  @Column(DataType.TEXT)
  declare fileName: string;

  @Column({ type: DataType.TEXT, field: 'file_sha256' })
  declare fileSha256: string;

  @Column(DataType.INTEGER)
  declare fileBytes: number;

  @JsonColumn
  declare workbook: WorkbookSummary;

  @JsonColumn
  declare mapping: Mapping;

  @JsonColumn
  declare metadata: SubmissionMetadata;

  @JsonColumn
  declare counts: Counts;

  /** grows with every change; If-Match holds it */
  @Column(DataType.INTEGER)
  declare revision: number;

  @Column(DataType.TEXT)
  declare datasetVersionId: string | null;

  @Column(DataType.TEXT)
  declare submittedAt: string | null;

  @Column(DataType.TEXT)
  declare decidedAt: string | null;
}

/** "S-0142" */
export const numberText = (number: number): string => `S-${String(number).padStart(4, '0')}`;
