import { Column, DataType, HasMany } from 'sequelize-typescript';
import { Row, StoredIn } from '../../database/row';
import { PersonRoleRow } from './person-role-row';

@StoredIn('people')
export class PersonRow extends Row {
  @Column(DataType.TEXT)
  declare name: string;

  @Column(DataType.TEXT)
  declare initials: string;

  /** lower case */
  @Column(DataType.TEXT)
  declare email: string;

  @Column(DataType.TEXT)
  declare orcid: string | null;

  /** null: invited, has not chosen a password yet */
  @Column(DataType.TEXT)
  declare passwordHash: string | null;

  @Column(DataType.TEXT)
  declare disabledAt: string | null;

  /** every session carries the number it was made under; raising it ends them all */
  @Column({ type: DataType.INTEGER, defaultValue: 1 })
  declare tokenVersion: number;

  @Column({ type: DataType.INTEGER, defaultValue: 1 })
  declare version: number;

  @HasMany(() => PersonRoleRow, 'personId')
  declare roleRows: PersonRoleRow[];
}
