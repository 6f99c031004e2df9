import { Injectable } from '@nestjs/common';
import type { ChangePerson, PersonView, Role } from '@siltlight/common/wire/people';
import type { Page } from '@siltlight/common/wire/shared';
import type { Transaction } from 'sequelize';
import { AccessTokensService } from '../auth/access-tokens.service';
import type { Person } from '../auth/policy';
import { SessionsService } from '../auth/sessions.service';
import { WriteQueue } from '../database/write-queue';
import { nowIso } from '../database/row';
import { pageOf } from '../http/paging';
import { notFound, problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import { changedMeanwhile } from '../http/expected-version';
import type { PersonRow } from './models/person-row';
import { PeopleService, rolesOf, stateOf, viewOf } from './people.service';

@Injectable()
export class AdministrationService {
  constructor(
    private readonly people: PeopleService,
    private readonly sessions: SessionsService,
    private readonly tokens: AccessTokensService,
    private readonly writes: WriteQueue,
    private readonly ledger: LedgerService,
  ) {}

  list(query: { limit: number; cursor?: string | undefined }): Promise<Page<PersonView>> {
    return pageOf(query, {
      fetch: (count, after) => this.people.page(count, after),
      count: () => this.people.count(),
      keyOf: (row) => row.id,
      toItem: viewOf,
    });
  }

  async view(id: string): Promise<PersonView> {
    const row = await this.people.byId(id);
    if (!row) throw notFound('Person', id);
    return viewOf(row);
  }

  /** Roles count from the next call on, since they are read at each; disabling ends sessions and tokens, too. */
  change(by: Person, id: string, wanted: ChangePerson, expected: number): Promise<PersonView> {
    return this.writes.run(async (transaction) => {
      const row = await this.people.byId(id, transaction);
      if (!row) throw notFound('Person', id);
      if (row.version !== expected) throw changedMeanwhile();
      const before = { roles: rolesOf(row), disabled: row.disabledAt !== null };
      const after = { roles: wanted.roles ?? before.roles, disabled: wanted.disabled ?? before.disabled };
      await this.requireAdministratorLeft(row, after, transaction);
      await this.apply(row, before, after, transaction);
      const object = { objectKind: 'person', objectId: row.id, objectTitle: row.name };
      const summary = summaryOf(before, after);
      await this.ledger.record(
        { actorId: by.id, verb: 'change-person', ...object, summary, before, after },
        transaction,
      );
      return viewOf((await this.people.byId(id, transaction))!);
    });
  }

  private async apply(
    row: PersonRow,
    before: Access,
    after: Access,
    transaction: Transaction,
  ): Promise<void> {
    await this.people.giveRoles(row.id, after.roles, transaction);
    const closing = after.disabled && !before.disabled;
    const disabledAt = after.disabled ? (row.disabledAt ?? nowIso()) : null;
    const tokenVersion = row.tokenVersion + (closing ? 1 : 0);
    await row.update({ disabledAt, tokenVersion, version: row.version + 1 }, { transaction });
    if (!closing) return;
    await this.sessions.endAll(row.id, 'disabled', transaction);
    await this.tokens.revokeAll(row.id, transaction);
  }

  private async requireAdministratorLeft(
    row: PersonRow,
    after: Access,
    transaction: Transaction,
  ): Promise<void> {
    const isOne = stateOf(row) === 'active' && rolesOf(row).includes('administrator');
    const staysOne = !after.disabled && after.roles.includes('administrator');
    if (!isOne || staysOne || (await this.people.otherAdministrators(row.id, transaction)) > 0) return;
    const detail = `${row.name} is the last administrator. Make somebody else administrator first.`;
    throw problem(409, 'last-administrator', 'The last administrator must stay', detail);
  }
}

interface Access {
  roles: Role[];
  disabled: boolean;
}

function summaryOf(before: Access, after: Access): string {
  const roles = `roles ${after.roles.join(', ') || 'none'}`;
  if (before.disabled === after.disabled) return `Gave the ${roles}`;
  return after.disabled ? `Disabled the account; ${roles}` : `Enabled the account; ${roles}`;
}
