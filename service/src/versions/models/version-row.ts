import type { VersionState } from '@siltlight/common/wire/shared';
import { BelongsTo, Column, DataType } from 'sequelize-typescript';
import { Row, StoredIn } from '../../database/row';
import { ObjectRow } from './object-row';

@StoredIn('versions')
export class VersionRow extends Row {
  @Column(DataType.TEXT)
  declare objectId: string;

  @BelongsTo(() => ObjectRow, 'objectId')
  declare object: ObjectRow;

  @Column(DataType.INTEGER)
  declare number: number;

  @Column(DataType.TEXT)
  declare state: VersionState;

  /** canonical JSON; parse with JSON.parse */
  @Column(DataType.TEXT)
  declare content: string;

  @Column(DataType.TEXT)
  declare checksum: string;

  @Column(DataType.TEXT)
  declare note: string | null;

  @Column(DataType.TEXT)
  declare createdBy: string;

  @Column(DataType.TEXT)
  declare publishedBy: string | null;

  @Column(DataType.TEXT)
  declare publishedAt: string | null;

  @Column(DataType.TEXT)
  declare withdrawnReason: string | null;

  @Column(DataType.TEXT)
  declare supersededByVersionId: string | null;

  @Column(DataType.TEXT)
  declare staleSince: string | null;

  @Column(DataType.TEXT)
  declare staleReason: string | null;
}
