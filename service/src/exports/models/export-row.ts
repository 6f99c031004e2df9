import type { ExportFormat } from '@siltlight/common/wire/exports';
import { Column, DataType } from 'sequelize-typescript';
import { Row, StoredIn } from '../../database/row';

@StoredIn('exports')
export class ExportRow extends Row {
  @Column(DataType.TEXT)
  declare format: ExportFormat;

  @Column(DataType.TEXT)
  declare estimateId: string;

  @Column(DataType.TEXT)
  declare title: string;

  @Column(DataType.TEXT)
  declare jobId: string | null;

  @Column(DataType.TEXT)
  declare fileName: string | null;

  @Column(DataType.TEXT)
  declare sha256: string | null;

  @Column(DataType.INTEGER)
  declare bytes: number | null;

  @Column(DataType.TEXT)
  declare createdBy: string;
}
