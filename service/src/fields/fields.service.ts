import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { FieldDetail, fieldRequest } from '@siltlight/common/wire/slices';
import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import type { Person } from '../auth/policy';
import { WriteQueue } from '../database/write-queue';
import { DATASET } from '../datasets/dataset-content';
import { DatasetDependants } from '../datasets/dataset-dependants';
import { DatasetsService } from '../datasets/datasets.service';
import { SamplesService } from '../datasets/samples.service';
import { notFound, problem, type Problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import { SlicesService, type SliceVersion } from '../slices/slices.service';
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
      await this.requireInForce(content, transaction);
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
    const slice = await this.slice(request.sliceSlug);
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
      [...new Set(request.datasetVersionIds)].map((versionId, index) => this.usable(versionId, index)),
    );
    const samples = await this.samples.ofVersions(datasetVersions.map(({ versionId }) => versionId));
    const title =
      request.title ??
      `${slice.content.name} over ${reference.content.name}, ${datasetVersions.length} datasets`;
    return { title, slice, reference, datasetVersions, samples, sizeCutoff: request.sizeCutoff };
  }

  private async slice(slug: string): Promise<SliceVersion> {
    const slice = await this.slices.find(slug);
    if (slice) return slice;
    throw refused('no-such-slice', 'There is no such slice', `No slice has the address ${slug}.`, {
      pointer: '/sliceSlug',
      field: 'sliceSlug',
      value: slug,
    });
  }

  private async usable(versionId: string, index: number) {
    const place = { pointer: `/datasetVersionIds/${index}`, field: 'datasetVersionIds', value: versionId };
    const [summary] = await this.versions.list(DATASET, { ids: [versionId] });
    if (!summary) {
      throw refused(
        'dataset-version-unusable',
        'A dataset version cannot be used',
        'There is no such dataset version.',
        place,
      );
    }
    if (summary.state !== 'published') {
      throw refused(
        'dataset-version-unusable',
        'A dataset version cannot be used',
        `${summary.object.title}, version ${summary.number}, is ${summary.state}; take the one in force.`,
        place,
      );
    }
    const { checksum, content } = await this.datasets.byVersionId(versionId);
    return { versionId, checksum, invented: content.invented };
  }

  /** A dataset version may have been superseded while the field was computed: then nobody would mark it as stale. */
  private async requireInForce({ datasetVersions }: FieldContent, transaction: Transaction): Promise<void> {
    const ids = datasetVersions.map(({ versionId }) => versionId);
    const inForce = await this.versions.list(DATASET, { ids, states: ['published'] }, transaction);
    if (inForce.length === ids.length) return;
    throw problem(
      409,
      'dataset-changed-meanwhile',
      'A dataset version was replaced meanwhile',
      'One of the dataset versions was superseded or withdrawn while the field was computed. Pick the version in force and build again.',
    );
  }
}

function refused(
  code: string,
  title: string,
  message: string,
  place: { pointer: string; field: string; value: string },
): Problem {
  return problem(422, code, title, message, [{ ...place, message }]);
}
