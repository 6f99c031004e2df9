import { Column, DataType } from 'sequelize-typescript';
import { Row, StoredIn } from '../../database/row';

@StoredIn('outbox')
export class OutboxRow extends Row {
  @Column(DataType.TEXT)
  declare toPersonId: string;

  @Column(DataType.TEXT)
  declare toName: string;

  @Column(DataType.TEXT)
  declare toAddress: string;

  @Column(DataType.TEXT)
  declare mailKind: string;

  @Column(DataType.TEXT)
  declare subject: string;

  @Column(DataType.TEXT)
  declare body: string;

  /** made once, so that a mail sent twice is recognisable */
  @Column(DataType.TEXT)
  declare messageId: string;

  @Column(DataType.TEXT)
  declare state: 'waiting' | 'sent' | 'failed';

  @Column({ type: DataType.INTEGER, defaultValue: 0 })
  declare attempts: number;

  @Column(DataType.TEXT)
  declare nextAttemptAt: string;

  @Column(DataType.TEXT)
  declare lastError: string | null;

  @Column(DataType.TEXT)
  declare sentAt: string | null;
}
