import { Column, DataType } from 'sequelize-typescript';
import { Row, StoredIn } from '../../database/row';

@StoredIn('objects')
export class ObjectRow extends Row {
  @Column(DataType.TEXT)
  declare kind: string;

  @Column(DataType.TEXT)
  declare slug: string;

  @Column(DataType.TEXT)
  declare title: string;

  @Column(DataType.TEXT)
  declare ownerId: string;
}
