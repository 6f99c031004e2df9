import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { PersonState, PersonView, Role } from '@siltlight/common/wire/people';
import { ROLES } from '@siltlight/common/wire/people';
import type { PersonMark } from '@siltlight/common/wire/shared';
import { Op, type Transaction } from 'sequelize';
import type { Person } from '../auth/policy';
import { initialsOf } from './initials';
import { PersonRoleRow } from './models/person-role-row';
import { PersonRow } from './models/person-row';

/** The rows of people and their roles, and the forms in which others see them. */
@Injectable()
export class PeopleService {
  constructor(
    @InjectModel(PersonRow) private readonly people: typeof PersonRow,
    @InjectModel(PersonRoleRow) private readonly roles: typeof PersonRoleRow,
  ) {}

  byId(id: string, transaction?: Transaction): Promise<PersonRow | null> {
    return this.people.findByPk(id, { include: PersonRoleRow, ...inside(transaction) });
  }

  byEmail(email: string, transaction?: Transaction): Promise<PersonRow | null> {
    return this.people.findOne({
      where: { email: email.toLowerCase() },
      include: PersonRoleRow,
      ...inside(transaction),
    });
  }

  count(transaction?: Transaction): Promise<number> {
    return this.people.count(inside(transaction));
  }

  /** As others see a person. What came with the product was done by nobody in particular. */
  async mark(id: string, transaction?: Transaction): Promise<PersonMark> {
    const row = await this.people.findByPk(id, inside(transaction));
    if (!row) return { id, name: 'Shipped with the product', initials: '–' };
    return { id: row.id, name: row.name, initials: row.initials };
  }

  /** Everybody who can sign in and holds a role. */
  withRole(role: Role, transaction?: Transaction): Promise<PersonRow[]> {
    return this.people.findAll({
      where: { disabledAt: null, passwordHash: { [Op.ne]: null } },
      include: { model: PersonRoleRow, where: { role }, required: true },
      order: [['id', 'ASC']],
      ...inside(transaction),
    });
  }

  /** In the order of their coming, which is the order of their identifiers. */
  page(limit: number, afterId: string | undefined): Promise<PersonRow[]> {
    const where = afterId === undefined ? {} : { id: { [Op.gt]: afterId } };
    return this.people.findAll({ where, include: PersonRoleRow, order: [['id', 'ASC']], limit });
  }

  async create(
    given: {
      name: string;
      email: string;
      roles: readonly Role[];
      passwordHash: string | null;
      initials?: string;
    },
    transaction: Transaction,
  ): Promise<PersonRow> {
    const { name, email, passwordHash, initials = initialsOf(name) } = given;
    const row = await this.people.create({ name, initials, email, passwordHash }, { transaction });
    await this.giveRoles(row.id, given.roles, transaction);
    return (await this.byId(row.id, transaction))!;
  }

  /** Gives what is new before it takes what is gone, so that no moment lacks a role that stays. */
  async giveRoles(personId: string, wanted: readonly Role[], transaction: Transaction): Promise<void> {
    const held = (await this.roles.findAll({ where: { personId }, transaction })).map((row) => row.role);
    const added = wanted.filter((role) => !held.includes(role));
    await this.roles.bulkCreate(
      added.map((role) => ({ personId, role })),
      { transaction },
    );
    for (const role of held.filter((role) => !wanted.includes(role))) {
      await this.roles.destroy({ where: { personId, role }, transaction });
    }
  }

  /** Administrators who can sign in, other than this one. */
  async otherAdministrators(personId: string, transaction: Transaction): Promise<number> {
    return this.people.count({
      where: { id: { [Op.ne]: personId }, disabledAt: null, passwordHash: { [Op.ne]: null } },
      include: { model: PersonRoleRow, where: { role: 'administrator' }, required: true },
      transaction,
    });
  }
}

export const rolesOf = (row: PersonRow): Role[] =>
  ROLES.filter((role) => row.roleRows.some((held) => held.role === role));

export function stateOf(row: PersonRow): PersonState {
  if (row.disabledAt !== null) return 'disabled';
  return row.passwordHash === null ? 'invited' : 'active';
}

export const personOf = (row: PersonRow): Person => ({
  id: row.id,
  name: row.name,
  initials: row.initials,
  email: row.email,
  roles: rolesOf(row),
});

export const viewOf = (row: PersonRow): PersonView => ({
  ...personOf(row),
  orcid: row.orcid ?? null,
  state: stateOf(row),
  createdAt: row.createdAt,
  version: row.version,
});

const inside = (transaction: Transaction | undefined) => (transaction ? { transaction } : {});
