import { Column, DataType } from 'sequelize-typescript';
import { Row, StoredIn } from '../../database/row';

@StoredIn('sessions')
export class SessionRow extends Row {
  @Column(DataType.TEXT)
  declare personId: string;

  @Column(DataType.TEXT)
  declare browser: string;

  @Column(DataType.TEXT)
  declare address: string;

  @Column(DataType.TEXT)
  declare lastSeenAt: string;

  @Column(DataType.TEXT)
  declare expiresAt: string;

  @Column(DataType.TEXT)
  declare endedAt: string | null;

  @Column(DataType.TEXT)
  declare endedReason: string | null;
}
