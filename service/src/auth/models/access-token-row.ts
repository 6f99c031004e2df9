import type { Scope } from '@siltlight/common/wire/auth';
import { Column, DataType } from 'sequelize-typescript';
import { JsonColumn, Row, StoredIn } from '../../database/row';

@StoredIn('access_tokens')
export class AccessTokenRow extends Row {
  @Column(DataType.TEXT)
  declare personId: string;

  @Column(DataType.TEXT)
  declare name: string;

  @JsonColumn
  declare scopes: Scope[];

  @Column(DataType.TEXT)
  declare tokenHash: string;

  @Column(DataType.TEXT)
  declare expiresAt: string;

  @Column(DataType.TEXT)
  declare lastUsedAt: string | null;

  @Column(DataType.TEXT)
  declare revokedAt: string | null;
}
