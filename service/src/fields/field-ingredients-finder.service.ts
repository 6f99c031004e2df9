import { Injectable } from '@nestjs/common';
import type { fieldRequest } from '@siltlight/common/wire/slices';
import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import { DATASET } from '../datasets/dataset-content';
import { DatasetsService } from '../datasets/datasets.service';
import { SamplesService } from '../datasets/samples.service';
import { problem, type Problem } from '../http/problem';
import { SlicesService, type SliceVersion } from '../slices/slices.service';
import { VersionsService } from '../versions/versions.service';
import type { FieldIngredients } from './build-field';
import type { FieldContent } from './field-content';

export type FieldRequest = z.infer<typeof fieldRequest>;

/** Finds what a request for a field names, or refuses it with a pointer to what cannot be used. */
@Injectable()
export class FieldIngredientsFinder {
  constructor(
    private readonly versions: VersionsService,
    private readonly slices: SlicesService,
    private readonly datasets: DatasetsService,
    private readonly samples: SamplesService,
  ) {}

  async gather(request: FieldRequest): Promise<FieldIngredients> {
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
      [...new Set(request.datasetVersionIds)].map((versionId) =>
        this.usable(versionId, request.datasetVersionIds.indexOf(versionId)),
      ),
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
  async requireInForce({ datasetVersions }: FieldContent, transaction: Transaction): Promise<void> {
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
