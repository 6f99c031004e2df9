import { Column, DataType } from 'sequelize-typescript';
import { Row, StoredIn } from '../../database/row';

export type OneTimePurpose = 'invitation' | 'password-reset' | 'first-administrator';

@StoredIn('one_time_tokens')
export class OneTimeTokenRow extends Row {
  @Column(DataType.TEXT)
  declare kind: OneTimePurpose;

  /** null for the first administrator, who is nobody yet */
  @Column(DataType.TEXT)
  declare personId: string | null;

  @Column(DataType.TEXT)
  declare tokenHash: string;

  @Column(DataType.TEXT)
  declare expiresAt: string;

  @Column(DataType.TEXT)
  declare usedAt: string | null;
}
