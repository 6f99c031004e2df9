import { Column, DataType, Model, PrimaryKey } from 'sequelize-typescript';
import { newId, nowIso, StoredIn } from '../../database/row';

@StoredIn('mailbox_messages')
export class MailboxRow extends Model {
  @PrimaryKey
  @Column({ type: DataType.TEXT, defaultValue: newId })
  declare id: string;

  @Column(DataType.TEXT)
  declare messageId: string;

  @Column(DataType.TEXT)
  declare fromAddress: string;

  /** lower case */
  @Column(DataType.TEXT)
  declare toAddress: string;

  @Column(DataType.TEXT)
  declare subject: string;

  @Column(DataType.TEXT)
  declare text: string;

  @Column(DataType.TEXT)
  declare raw: string;

  @Column({ type: DataType.TEXT, defaultValue: nowIso })
  declare receivedAt: string;
}
