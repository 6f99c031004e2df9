import { Injectable } from '@nestjs/common';
import type { NewOpticalSet, OpticalSetDetail, OpticalSetDraft } from '@siltlight/common/wire/optics';
import type { Transaction } from 'sequelize';
import type { Person } from '../auth/policy';
import { WriteQueue } from '../database/write-queue';
import { changedMeanwhile } from '../http/expected-version';
import { notFound, problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import type { VersionSummary } from '../versions/version';
import { VersionsService } from '../versions/versions.service';
import { contentOf, OPTICAL_SET } from './optical-set-content';
import { OpticalSetViews } from './optical-set-views.service';

/** Sets in the making: their author's alone until published, and unchangeable from then on. */
@Injectable()
export class OpticalSetDrafts {
  constructor(
    private readonly versions: VersionsService,
    private readonly views: OpticalSetViews,
    private readonly ledger: LedgerService,
    private readonly writes: WriteQueue,
  ) {}

  async create({ title, ...draft }: NewOpticalSet, by: Person): Promise<OpticalSetDetail> {
    const content = contentOf(draft);
    const id = await this.writes.run(async (transaction) => {
      const given = { kind: OPTICAL_SET, title, ownerId: by.id, content };
      const { version } = await this.versions.createObject(given, transaction);
      await this.record('draft-optical-set', `Draft of ${title} begun`, version, by, transaction);
      return version.id;
    });
    return this.views.detail(id, by);
  }

  /** A further version of one's own set. */
  async addVersion(slug: string, draft: OpticalSetDraft, by: Person): Promise<OpticalSetDetail> {
    const object = await this.views.objectSeen(slug, by);
    if (object.ownerId !== by.id) throw notTheAuthor(object.title);
    const content = contentOf(draft);
    const id = await this.writes.run(async (transaction) => {
      const drafts = await this.versions.list(OPTICAL_SET, { slug, states: ['draft'] }, transaction);
      if (drafts.length > 0) throw draftExists(drafts[0]!);
      const version = await this.versions.createVersion(
        object.id,
        { content, createdBy: by.id },
        transaction,
      );
      const summary = `Draft of version ${version.number} of ${object.title} begun`;
      await this.record('draft-optical-set', summary, version, by, transaction);
      return version.id;
    });
    return this.views.detail(id, by);
  }

  /** @param expectedChecksum of the draft that was changed */
  async save(
    versionId: string,
    draft: OpticalSetDraft,
    expectedChecksum: string,
    by: Person,
  ): Promise<OpticalSetDetail> {
    await this.own(versionId, by);
    const content = contentOf(draft);
    await this.writes.run(async (transaction) => {
      const { checksum } = await this.own(versionId, by, transaction);
      if (checksum !== expectedChecksum) throw changedMeanwhile();
      await this.versions.saveDraft(versionId, content, transaction);
    });
    return this.views.detail(versionId, by);
  }

  async publish(versionId: string, by: Person): Promise<OpticalSetDetail> {
    await this.writes.run(async (transaction) => {
      await this.own(versionId, by, transaction);
      const version = await this.versions.publish(versionId, by.id, transaction);
      const summary = `Version ${version.number} of ${version.object.title} published`;
      await this.record('publish-optical-set', summary, version, by, transaction);
    });
    return this.views.detail(versionId, by);
  }

  /** @throws Problem 404 for a draft of somebody else, 403 for what they published, 409 for one's own published one */
  private async own(versionId: string, by: Person, transaction?: Transaction): Promise<VersionSummary> {
    const version = await this.versions.get(versionId, transaction);
    const { object, state, number } = version;
    const isAuthor = object.ownerId === by.id;
    if (object.kind !== OPTICAL_SET || (!isAuthor && state === 'draft')) {
      throw notFound('Version', versionId);
    }
    if (!isAuthor) throw notTheAuthor(object.title);
    if (state !== 'draft') {
      throw problem(
        409,
        'wrong-state',
        'The version is no longer a draft',
        `Version ${number} of ${object.title} is ${state} and cannot be changed. Begin a new version instead.`,
      );
    }
    return version;
  }

  private record(
    verb: string,
    summary: string,
    version: VersionSummary,
    by: Person,
    transaction: Transaction,
  ) {
    return this.ledger.record(
      {
        actorId: by.id,
        verb,
        objectKind: OPTICAL_SET,
        objectId: version.objectId,
        objectTitle: version.object.title,
        summary,
        after: { versionId: version.id, checksum: version.checksum },
      },
      transaction,
    );
  }
}

const notTheAuthor = (title: string) =>
  problem(
    403,
    'not-the-author',
    'Only its author may do that',
    `${title} belongs to somebody else. Save what you changed as a set of your own.`,
  );

const draftExists = ({ number }: VersionSummary) =>
  problem(
    409,
    'draft-exists',
    'A draft is there already',
    `Version ${number} is your draft: go on with that one, or publish it first.`,
  );
