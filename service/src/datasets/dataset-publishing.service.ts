import { Injectable } from '@nestjs/common';
import type { Transaction } from 'sequelize';
import type { Person } from '../auth/policy';
import { problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import type { Version } from '../versions/version';
import { VersionsService } from '../versions/versions.service';
import { DATASET, type DatasetContent } from './dataset-content';
import { DatasetDependants } from './dataset-dependants';
import { SamplesService } from './samples.service';

/** Makes dataset versions and withdraws them, inside the caller's write. */
@Injectable()
export class DatasetPublishing {
  constructor(
    private readonly versions: VersionsService,
    private readonly samples: SamplesService,
    private readonly dependants: DatasetDependants,
    private readonly ledger: LedgerService,
  ) {}

  /**
   * Publishes vetted content as version 1 of a new dataset, or as the next version of the named one; what rests on
   * the version before it becomes stale. The caller's act, an approval, writes the ledger row of both.
   */
  async publish(
    content: DatasetContent,
    by: Person,
    target: { datasetSlug?: string | undefined },
    transaction: Transaction,
  ): Promise<Version<DatasetContent>> {
    if (content.samples.length === 0) {
      throw problem(
        422,
        'no-usable-row',
        'There is no row to publish',
        'No row has a site, a position, an age and a flux. Correct the mapping or mend the rows first.',
      );
    }
    const draft = await this.draft(content, target.datasetSlug, transaction);
    const before = await this.versions.latestPublished(draft.objectId, transaction);
    await this.samples.store(draft.id, content.samples, transaction);
    const published = await this.versions.publish<DatasetContent>(draft.id, by.id, transaction);
    if (before) {
      const reason = `${content.title}: version ${before.number} was superseded by version ${published.number}`;
      await this.dependants.markStale(before.id, reason, transaction);
    }
    return published;
  }

  async withdraw(versionId: string, by: Person, reason: string, transaction: Transaction): Promise<void> {
    const summary = await this.versions.withdraw(versionId, by.id, reason, transaction);
    const { title } = summary.object;
    await this.dependants.markStale(
      versionId,
      `${title}: version ${summary.number} was withdrawn: ${reason}`,
      transaction,
    );
    await this.ledger.record(
      {
        actorId: by.id,
        verb: 'withdraw-dataset',
        objectKind: DATASET,
        objectId: summary.objectId,
        objectTitle: title,
        summary: `Version ${summary.number} of ${title} withdrawn: ${reason}`,
      },
      transaction,
    );
  }

  private async draft(content: DatasetContent, datasetSlug: string | undefined, transaction: Transaction) {
    const createdBy = content.contributor.id;
    if (datasetSlug === undefined) {
      const given = { kind: DATASET, title: content.title, ownerId: createdBy, content };
      return (await this.versions.createObject(given, transaction)).version;
    }
    const object = await this.versions.objectBySlug(DATASET, datasetSlug, transaction);
    if (!object) {
      throw problem(
        422,
        'no-such-dataset',
        'There is no such dataset',
        `No dataset has the address ${datasetSlug}. Leave it empty to make a new one.`,
        [
          {
            pointer: '/datasetSlug',
            field: 'datasetSlug',
            value: datasetSlug,
            message: 'No dataset has this address.',
          },
        ],
      );
    }
    return this.versions.createVersion(object.id, { content, createdBy }, transaction);
  }
}
