import { Column, DataType, Model, PrimaryKey } from 'sequelize-typescript';
import { nowIso, StoredIn } from '../../database/row';

@StoredIn('stored_files')
export class StoredFileRow extends Model {
  @PrimaryKey
  @Column(DataType.TEXT)
  declare sha256: string;

  @Column(DataType.INTEGER)
  declare bytes: number;

  /** as its first owner called it; only shown */
  @Column(DataType.TEXT)
  declare fileName: string;

  @Column(DataType.TEXT)
  declare mediaType: string;

  @Column({ type: DataType.TEXT, defaultValue: nowIso })
  declare createdAt: string;
}
