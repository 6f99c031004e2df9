import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { FieldDetail } from '@siltlight/common/wire/slices';
import type { Person } from '../auth/policy';
import { WriteQueue } from '../database/write-queue';
import { DatasetDependants } from '../datasets/dataset-dependants';
import { notFound } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import type { Version } from '../versions/version';
import { VersionsService } from '../versions/versions.service';
import { buildField } from './build-field';
import { FIELD, type FieldContent } from './field-content';
import { FieldIngredientsFinder, type FieldRequest } from './field-ingredients-finder.service';
import { FieldViews } from './field-views.service';

/** Builds, keeps and reads fields. A kept field is published at once: it is a computation, not a judgement. */
@Injectable()
export class FieldsService implements OnModuleInit {
  constructor(
    private readonly versions: VersionsService,
    private readonly ingredients: FieldIngredientsFinder,
    private readonly dependants: DatasetDependants,
    private readonly views: FieldViews,
    private readonly ledger: LedgerService,
    private readonly writes: WriteQueue,
  ) {}

  onModuleInit(): void {
    this.dependants.register({
      usedBy: async (versionId) => {
        const using = await this.using(versionId);
        return using.map(({ id, content, staleSince }) => ({
          kind: 'field' as const,
          id,
          title: content.title,
          stale: staleSince !== null,
        }));
      },
      markStale: async (versionId, reason, transaction) => {
        const using = await this.using(versionId);
        await this.versions.markStale(
          using.map(({ id }) => id),
          reason,
          transaction,
        );
      },
    });
  }

  async preview(request: FieldRequest, by: Person): Promise<FieldDetail> {
    const content = buildField(await this.ingredients.gather(request));
    return this.views.preview(content, by);
  }

  async build(request: FieldRequest, by: Person): Promise<FieldDetail> {
    const content = buildField(await this.ingredients.gather(request));
    const version = await this.writes.run(async (transaction) => {
      await this.ingredients.requireInForce(content, transaction);
      const given = { kind: FIELD, title: content.title, ownerId: by.id, content };
      const { version: draft } = await this.versions.createObject(given, transaction);
      const published = await this.versions.publish<FieldContent>(draft.id, by.id, transaction);
      await this.ledger.record(
        {
          actorId: by.id,
          verb: 'build-field',
          objectKind: FIELD,
          objectId: published.objectId,
          objectTitle: content.title,
          summary: `${content.title} built from ${content.diagnostics.usedSites} sites`,
          after: {
            versionId: published.id,
            checksum: published.checksum,
            datasetVersions: content.datasetVersions,
          },
        },
        transaction,
      );
      return published;
    });
    return this.views.detail(version);
  }

  async get(versionId: string): Promise<Version<FieldContent>> {
    const version = await this.versions.get<FieldContent>(versionId);
    if (version.object.kind !== FIELD) throw notFound('Field', versionId);
    return version;
  }

  async detail(versionId: string): Promise<FieldDetail> {
    return this.views.detail(await this.get(versionId));
  }

  /** Newest first. */
  async ofSlice(sliceSlug: string | undefined): Promise<Version<FieldContent>[]> {
    const all = await this.all();
    return all.filter(({ content }) => sliceSlug === undefined || content.slice.slug === sliceSlug).reverse();
  }

  /** Fields that rest on a dataset version. */
  async using(datasetVersionId: string): Promise<Version<FieldContent>[]> {
    const all = await this.all();
    return all.filter(({ content }) =>
      content.datasetVersions.some(({ versionId }) => versionId === datasetVersionId),
    );
  }

  private async all(): Promise<Version<FieldContent>[]> {
    const summaries = await this.versions.list(FIELD, { states: ['published'] });
    return Promise.all(summaries.map(({ id }) => this.versions.get<FieldContent>(id)));
  }
}
