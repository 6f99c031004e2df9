import { Injectable } from '@nestjs/common';
import type { ChangeMe, PersonView } from '@siltlight/common/wire/people';
import { WriteQueue } from '../database/write-queue';
import { LedgerService } from '../ledger/ledger.service';
import { changedMeanwhile } from '../http/expected-version';
import { initialsOf } from '../users/initials';
import { PeopleService, viewOf } from '../users/people.service';
import type { Person } from './policy';

@Injectable()
export class MeService {
  constructor(
    private readonly people: PeopleService,
    private readonly writes: WriteQueue,
    private readonly ledger: LedgerService,
  ) {}

  async view(person: Person): Promise<PersonView> {
    return viewOf((await this.people.byId(person.id))!);
  }

  change(person: Person, wanted: ChangeMe, expected: number): Promise<PersonView> {
    return this.writes.run(async (transaction) => {
      const row = (await this.people.byId(person.id, transaction))!;
      if (row.version !== expected) throw changedMeanwhile();
      const before = { name: row.name, orcid: row.orcid ?? null };
      const after = {
        name: wanted.name ?? before.name,
        orcid: wanted.orcid === undefined ? before.orcid : wanted.orcid,
      };
      const initials = after.name === before.name ? row.initials : initialsOf(after.name);
      await row.update({ ...after, initials, version: row.version + 1 }, { transaction });
      const object = { objectKind: 'person', objectId: row.id, objectTitle: row.name };
      const summary = 'Changed the own name or ORCID iD';
      await this.ledger.record(
        { actorId: person.id, verb: 'change-profile', ...object, summary, before, after },
        transaction,
      );
      return viewOf(row);
    });
  }
}
