import { Injectable } from '@nestjs/common';
import type { ColumnSlice, SliceDetail } from '@siltlight/common/wire/slices';
import type { Person } from '../auth/policy';
import { DatasetsService } from '../datasets/datasets.service';
import { SamplesService } from '../datasets/samples.service';
import { commonestSizeCutoff, siteWindows } from '../fields/site-windows';
import { FieldsService } from '../fields/fields.service';
import { SlicesService, type SliceVersion } from '../slices/slices.service';
import { PeopleService } from '../users/people.service';
import { EstimateLists } from './estimate-lists.service';
import { EstimateViews } from './estimate-views.service';

/** The slices with what has been built and computed in them: the strata column, and the page of a slice. */
@Injectable()
export class Strata {
  constructor(
    private readonly slices: SlicesService,
    private readonly lists: EstimateLists,
    private readonly views: EstimateViews,
    private readonly fields: FieldsService,
    private readonly datasets: DatasetsService,
    private readonly samples: SamplesService,
    private readonly people: PeopleService,
  ) {}

  async column(reader: Person): Promise<ColumnSlice[]> {
    const [slices, latest] = await Promise.all([this.slices.list(), this.lists.latestPublished(reader)]);
    return slices.map((slice) => {
      const { slug, name, label, windowYoungKa, windowOldKa, kind } = slice.content;
      const version = latest.get(slug)?.version;
      return {
        slug,
        name,
        label,
        youngKa: windowYoungKa,
        oldKa: windowOldKa,
        parentSlug: stageAround(slice, slices)?.content.slug ?? null,
        kind,
        latestNetWm2: version?.content.result.global.forcing.netWm2.value ?? null,
        stale: (version?.staleSince ?? null) !== null,
      };
    });
  }

  async detail(slug: string, reader: Person): Promise<SliceDetail> {
    const slice = await this.slices.bySlug(slug);
    const reference = await this.slices.referenceOf(slice);
    const [fields, estimates] = await Promise.all([
      this.fields.ofSlice(slug),
      this.views.newest({ sliceSlug: slug }, reader),
    ]);
    return {
      versionId: slice.id,
      versionNumber: slice.number,
      state: slice.state,
      checksum: slice.checksum,
      content: slice.content,
      reference: reference?.content ?? null,
      records: await this.records(slice),
      fields: await Promise.all(
        fields.map(async ({ id, content, staleSince, createdAt, createdBy }) => ({
          versionId: id,
          title: content.title,
          way: content.way,
          siteCount: content.diagnostics.usedSites,
          stale: staleSince !== null,
          createdAt,
          createdBy: await this.people.mark(createdBy),
        })),
      ),
      estimates: estimates.map(({ run, version, state }) => ({
        id: run.id,
        title: `${run.title}, run ${run.runNumber}`,
        state,
        netWm2: version?.content.result.global.forcing.netWm2 ?? null,
        stale: (version?.staleSince ?? null) !== null,
        createdAt: run.createdAt,
      })),
    };
  }

  /** Records of Holdings that have samples in the window, with how much of it they cover. */
  private async records({ content }: SliceVersion): Promise<SliceDetail['records']> {
    const published = await this.datasets.list();
    const origins = new Map(published.map((dataset) => [dataset.latest.versionId, dataset]));
    const samples = await this.samples.ofVersions([...origins.keys()]);
    const regions = new Map(
      samples.map(({ versionId, site, regionCode }) => [`${versionId} ${site}`, regionCode]),
    );
    const cutoffs = new Set(samples.map(({ sizeCutoff }) => sizeCutoff));
    const windows = [...cutoffs].flatMap((cutoff) => {
      const fraction = samples.filter(({ sizeCutoff }) => sizeCutoff === cutoff);
      return siteWindows(fraction, content, content, commonestSizeCutoff(fraction));
    });
    return windows.flatMap(({ key, site, versionId, latitudeDeg, longitudeDeg, slice }) => {
      const origin = origins.get(versionId)!;
      if (!slice) return [];
      return [
        {
          datasetSlug: origin.slug,
          datasetTitle: origin.title,
          versionId,
          versionNumber: origin.latest.number,
          site,
          latitudeDeg,
          longitudeDeg,
          regionCode: regions.get(key) ?? null,
          sampleCount: slice.samples.length,
          coverage: slice.coverage,
          meanFluxGM2Yr: slice.meanFluxGM2Yr,
        },
      ];
    });
  }
}

/** The Stage that a slice lies in; a slice that lies in none, or is one, stands in the first lane. */
function stageAround(slice: SliceVersion, all: readonly SliceVersion[]): SliceVersion | undefined {
  if (slice.content.stage) return undefined;
  const { windowYoungKa, windowOldKa } = slice.content;
  const length = ({ content }: SliceVersion) => content.windowOldKa - content.windowYoungKa;
  return all
    .filter(
      ({ content }) =>
        content.stage && content.windowYoungKa <= windowYoungKa && content.windowOldKa >= windowOldKa,
    )
    .sort((a, b) => length(a) - length(b))[0];
}
