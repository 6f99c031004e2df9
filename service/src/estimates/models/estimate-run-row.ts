import type { EstimateRequest } from '@siltlight/common/wire/estimates';
import { Column, DataType } from 'sequelize-typescript';
import { JsonColumn, Row, StoredIn } from '../../database/row';

@StoredIn('estimate_runs')
export class EstimateRunRow extends Row {
  @Column(DataType.INTEGER)
  declare runNumber: number;

  @Column(DataType.TEXT)
  declare title: string;

  @Column(DataType.TEXT)
  declare sliceSlug: string;

  @JsonColumn
  declare request: EstimateRequest;

  @Column(DataType.TEXT)
  declare fieldVersionId: string;

  @Column(DataType.TEXT)
  declare jobId: string | null;

  /** the result; null until it is computed */
  @Column(DataType.TEXT)
  declare versionId: string | null;

  @Column(DataType.TEXT)
  declare createdBy: string;
}
