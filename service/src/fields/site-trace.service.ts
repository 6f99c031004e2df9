import { Injectable } from '@nestjs/common';
import type { SiteTrace } from '@siltlight/common/wire/slices';
import { DatasetsService } from '../datasets/datasets.service';
import { SamplesService } from '../datasets/samples.service';
import { notFound } from '../http/problem';
import { SlicesService } from '../slices/slices.service';
import type { Version } from '../versions/version';
import type { FieldContent, WindowMean } from './field-content';
import type { StoredSample } from './site-windows';

/** From a site of a field to the samples behind its two fluxes, each with its cell in the file. */
@Injectable()
export class SiteTraces {
  constructor(
    private readonly datasets: DatasetsService,
    private readonly samples: SamplesService,
    private readonly slices: SlicesService,
  ) {}

  async trace(field: Version<FieldContent>, siteName: string, datasetSlug: string): Promise<SiteTrace> {
    for (const site of field.content.sites.filter(({ site: name }) => name === siteName)) {
      const version = await this.datasets.byVersionId(site.versionId);
      if (version.object.slug !== datasetSlug) continue;
      const samples = new Map(
        (await this.samples.ofVersions([site.versionId], siteName)).map((sample) => [sample.id, sample]),
      );
      const { content } = version;
      return {
        site: siteName,
        datasetSlug,
        datasetTitle: content.title,
        versionNumber: version.number,
        checksum: version.checksum,
        submissionId: content.submission.id,
        fileName: content.file.fileName,
        windows: [
          await this.window(field.content.slice.versionId, site.slice, samples),
          await this.window(field.content.reference.versionId, site.reference, samples),
        ],
      };
    }
    throw notFound('Site', siteName);
  }

  private async window(
    sliceVersionId: string,
    mean: WindowMean | null,
    samples: Map<string, StoredSample>,
  ): Promise<SiteTrace['windows'][number]> {
    const { content } = await this.slices.get(sliceVersionId);
    return {
      sliceSlug: content.slug,
      sliceName: content.name,
      youngKa: content.windowYoungKa,
      oldKa: content.windowOldKa,
      meanFluxGM2Yr: mean?.meanFluxGM2Yr ?? null,
      samples: (mean?.samples ?? []).map(({ id, weight }) => sampleTrace(samples.get(id)!, weight)),
    };
  }
}

function sampleTrace(sample: StoredSample, weight: number): SiteTrace['windows'][number]['samples'][number] {
  const { ageKaBp: age, fluxGM2Yr: flux } = sample.cells;
  return {
    sampleId: sample.id,
    sheet: sample.sheet,
    row: sample.row,
    ageCell: age?.cell ?? null,
    ageRaw: age?.raw ?? '',
    ageKaBp: sample.ageKaBp,
    fluxCell: flux?.cell ?? null,
    fluxRaw: flux?.raw ?? '',
    fluxRule: flux?.rule ?? '',
    fluxGM2Yr: sample.fluxGM2Yr,
    weight,
  };
}
