import { Injectable } from '@nestjs/common';
import { citationOf } from '../datasets/citation';
import { DatasetsService } from '../datasets/datasets.service';
import type { LoadedRun } from '../estimates/estimate-views.service';
import { SlicesService } from '../slices/slices.service';
import type { CitedDataset, ExportSubject } from './export-subject';

/** Gathers all that a file says about an estimate, the datasets to cite included. */
@Injectable()
export class ExportSubjects {
  constructor(
    private readonly slices: SlicesService,
    private readonly datasets: DatasetsService,
  ) {}

  async of({ run, version, state }: LoadedRun): Promise<ExportSubject> {
    const { content, checksum } = version!;
    const slice = await this.slices.get(content.pins.slice.versionId);
    const datasets = content.pins.datasetVersions.map(({ versionId }) => this.cited(versionId));
    return {
      runNumber: run.runNumber,
      state,
      checksum,
      slice: slice.content,
      content,
      datasets: await Promise.all(datasets),
    };
  }

  private async cited(versionId: string): Promise<CitedDataset> {
    const version = await this.datasets.byVersionId(versionId);
    const { number, checksum, object, content } = version;
    return {
      slug: object.slug,
      number,
      checksum,
      citation: citationOf(content, version),
      licence: content.metadata.licence ?? null,
    };
  }
}
