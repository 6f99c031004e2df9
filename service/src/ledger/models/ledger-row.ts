import { Column, DataType, Model, PrimaryKey } from 'sequelize-typescript';
import { StoredIn } from '../../database/row';

@StoredIn('ledger')
export class LedgerRow extends Model {
  @PrimaryKey
  @Column(DataType.INTEGER)
  declare position: number;

  @Column(DataType.TEXT)
  declare at: string;

  @Column(DataType.TEXT)
  declare actorId: string | null;

  @Column(DataType.TEXT)
  declare verb: string;

  @Column(DataType.TEXT)
  declare objectKind: string;

  @Column(DataType.TEXT)
  declare objectId: string;

  @Column(DataType.TEXT)
  declare objectTitle: string | null;

  @Column(DataType.TEXT)
  declare summary: string;

  /** canonical JSON */
  @Column(DataType.TEXT)
  declare before: string | null;

  /** canonical JSON */
  @Column(DataType.TEXT)
  declare after: string | null;

  @Column(DataType.TEXT)
  declare previousHash: string;

  @Column(DataType.TEXT)
  declare hash: string;
}
