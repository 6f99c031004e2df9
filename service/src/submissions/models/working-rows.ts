import { Column, DataType } from 'sequelize-typescript';
import { JsonColumn, Row, StoredIn } from '../../database/row';
import type { ColumnProposal } from '@siltlight/common/sheet/mapping';

/** What one person did to a submission. */
abstract class ActRow extends Row {
  @Column(DataType.TEXT)
  declare submissionId: string;

  @Column(DataType.TEXT)
  declare personId: string;
}

abstract class CellActRow extends ActRow {
  @Column(DataType.TEXT)
  declare sheet: string;

  @Column(DataType.INTEGER)
  declare row: number;

  @Column(DataType.TEXT)
  declare column: string;
}

@StoredIn('submission_corrections')
export class CorrectionRow extends CellActRow {
  @Column(DataType.TEXT)
  declare rawText: string;

  @Column(DataType.TEXT)
  declare text: string;

  @Column(DataType.TEXT)
  declare undoneAt: string | null;
}

@StoredIn('submission_left_out')
export class LeftOutRow extends ActRow {
  @Column(DataType.TEXT)
  declare sheet: string;

  @Column(DataType.INTEGER)
  declare row: number;

  @Column(DataType.TEXT)
  declare reason: string;
}

@StoredIn('submission_waivers')
export class WaiverRow extends ActRow {
  @Column(DataType.TEXT)
  declare findingKey: string;

  @Column(DataType.TEXT)
  declare reason: string;
}

@StoredIn('submission_queries')
export class QueryRow extends CellActRow {
  @Column(DataType.TEXT)
  declare text: string;
}

@StoredIn('submission_replies')
export class ReplyRow extends ActRow {
  @Column(DataType.TEXT)
  declare queryId: string;

  @Column(DataType.TEXT)
  declare text: string;
}

@StoredIn('submission_decisions')
export class DecisionRow extends ActRow {
  @Column(DataType.TEXT)
  declare decision: 'approve' | 'return' | 'decline';

  @Column(DataType.TEXT)
  declare reason: string | null;
}

@StoredIn('remembered_mappings')
export class RememberedMappingRow extends Row {
  @Column(DataType.TEXT)
  declare contributorId: string;

  @Column(DataType.TEXT)
  declare pattern: string;

  @JsonColumn
  declare columns: Pick<ColumnProposal, 'heading' | 'field' | 'unit'>[];
}
