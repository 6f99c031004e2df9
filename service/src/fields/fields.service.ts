import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { FieldDetail } from '@siltlight/common/wire/slices';
import type { z } from 'zod';
import type { fieldRequest } from '@siltlight/common/wire/slices';
import type { Person } from '../auth/policy';
import { WriteQueue } from '../database/write-queue';
import { DatasetDependants } from '../datasets/dataset-dependants';
import { DatasetsService } from '../datasets/datasets.service';
import { SamplesService } from '../datasets/samples.service';
import { notFound, problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import { SlicesService } from '../slices/slices.service';
import type { Version } from '../versions/version';
import { VersionsService } from '../versions/versions.service';
import { buildField, type FieldIngredients } from './build-field';
import { FIELD, type FieldContent } from './field-content';
import { FieldViews } from './field-views.service';

type FieldRequest = z.infer<typeof fieldRequest>;

/** Builds, keeps and reads fields. A kept field is published at once: it is a computation, not a judgement. */
@Injectable()
export class FieldsService implements OnModuleInit {
  constructor(
    private readonly versions: VersionsService,
    private readonly slices: SlicesService,
    private readonly datasets: DatasetsService,
    private readonly samples: SamplesService,
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
    const content = buildField(await this.ingredients(request));
    return this.views.preview(content, by);
  }

  async build(request: FieldRequest, by: Person): Promise<FieldDetail> {
    const content = buildField(await this.ingredients(request));
    const version = await this.writes.run(async (transaction) => {
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

  private async ingredients(request: FieldRequest): Promise<FieldIngredients> {
    const slice = await this.slices.bySlug(request.sliceSlug);
    const reference = await this.slices.referenceOf(slice);
    if (!reference) {
      throw problem(
        422,
        'slice-is-the-reference',
        'This slice is itself the reference',
        `${slice.content.name} has no reference slice to form a ratio with. Pick another slice.`,
        [
          {
            pointer: '/sliceSlug',
            field: 'sliceSlug',
            value: request.sliceSlug,
            message: 'Pick a slice that has a reference.',
          },
        ],
      );
    }
    const datasetVersions = await Promise.all(
      request.datasetVersionIds.map((versionId, index) => this.usable(versionId, index)),
    );
    const samples = await this.samples.ofVersions(request.datasetVersionIds);
    const title =
      request.title ??
      `${slice.content.name} over ${reference.content.name}, ${datasetVersions.length} datasets`;
    return { title, slice, reference, datasetVersions, samples, sizeCutoff: request.sizeCutoff };
  }

  private async usable(versionId: string, index: number) {
    const version = await this.datasets.byVersionId(versionId);
    const wrong =
      version.object.kind !== 'dataset'
        ? 'This is not a dataset version.'
        : version.state !== 'published'
          ? `This version is ${version.state}; take the one in force.`
          : null;
    if (wrong) {
      throw problem(
        422,
        'dataset-version-unusable',
        'A dataset version cannot be used',
        `${version.object.title}, version ${version.number}: ${wrong}`,
        [
          {
            pointer: `/datasetVersionIds/${index}`,
            field: 'datasetVersionIds',
            value: versionId,
            message: wrong,
          },
        ],
      );
    }
    return { versionId, checksum: version.checksum, invented: version.content.invented };
  }
}
