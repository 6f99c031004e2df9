import type { Role } from '@siltlight/common/wire/people';
import { Column, DataType, Model, PrimaryKey } from 'sequelize-typescript';
import { StoredIn } from '../../database/row';

@StoredIn('person_roles')
export class PersonRoleRow extends Model {
  @PrimaryKey
  @Column(DataType.TEXT)
  declare personId: string;

  @PrimaryKey
  @Column(DataType.TEXT)
  declare role: Role;
}
