import { Injectable } from '@nestjs/common';
import type { FieldDetail, FieldSite } from '@siltlight/common/wire/slices';
import type { Person } from '../auth/policy';
import { DatasetsService } from '../datasets/datasets.service';
import { PeopleService } from '../users/people.service';
import { checksumOf } from '../versions/canonical';
import type { Version } from '../versions/version';
import type { FieldContent, FieldSiteContent } from './field-content';

type Origin = {
  slug: string;
  title: string;
  number: number;
  checksum: string;
  state: FieldDetail['datasetVersions'][number]['state'];
};

/** Fields as people read them. */
@Injectable()
export class FieldViews {
  constructor(
    private readonly datasets: DatasetsService,
    private readonly people: PeopleService,
  ) {}

  async detail(version: Version<FieldContent>): Promise<FieldDetail> {
    return {
      ...(await this.body(version.content)),
      versionId: version.id,
      state: version.state,
      checksum: version.checksum,
      stale: version.staleSince !== null,
      staleReason: version.staleReason,
      createdBy: await this.people.mark(version.createdBy),
      createdAt: version.createdAt,
    };
  }

  /** A field that is not kept: no address, no state of its own. */
  async preview(content: FieldContent, { id, name, initials }: Person): Promise<FieldDetail> {
    return {
      ...(await this.body(content)),
      versionId: '',
      state: 'draft',
      checksum: checksumOf(content),
      stale: false,
      staleReason: null,
      createdBy: { id, name, initials },
      createdAt: '',
    };
  }

  private async body(content: FieldContent) {
    const origins = new Map<string, Origin>();
    for (const { versionId } of content.datasetVersions) {
      const { object, number, checksum, state } = await this.datasets.byVersionId(versionId);
      origins.set(versionId, { slug: object.slug, title: object.title, number, checksum, state });
    }
    const { global } = content;
    return {
      title: content.title,
      way: content.way,
      sliceSlug: content.slice.slug,
      sliceName: content.slice.name,
      sliceVersionId: content.slice.versionId,
      referenceSlug: content.reference.slug,
      referenceName: content.reference.name,
      referenceVersionId: content.reference.versionId,
      sizeCutoff: content.sizeCutoff,
      baseField: { title: content.baseField.title, source: content.baseField.source },
      datasetVersions: [...origins].map(([versionId, origin]) => ({ versionId, ...origin })),
      regions: content.regions.map(
        ({ code, name, siteCount, ratio, low, high, lnRatioSe, status, hatched, ...depths }) => ({
          code,
          name,
          siteCount,
          ratio: { value: ratio, low, high },
          lnRatioSe,
          status,
          hatched,
          opticalDepthSlice: depths.opticalDepthSlice,
          opticalDepthReference: depths.opticalDepthReference,
        }),
      ),
      sites: content.sites.map((site) => siteView(site, origins.get(site.versionId)!)),
      diagnostics: {
        ...content.diagnostics,
        globalRatio: { value: global.ratio, low: global.low, high: global.high },
      },
      globalOpticalDepthSlice: content.globalOpticalDepthSlice,
      globalOpticalDepthReference: content.globalOpticalDepthReference,
      cautions: content.cautions,
      invented: content.invented,
    };
  }
}

function siteView(site: FieldSiteContent, origin: Origin): FieldSite {
  const { slice, reference } = site;
  return {
    site: site.site,
    datasetSlug: origin.slug,
    datasetTitle: origin.title,
    versionId: site.versionId,
    latitudeDeg: site.latitudeDeg,
    longitudeDeg: site.longitudeDeg,
    regionCode: site.regionCode,
    sliceFluxGM2Yr: slice?.meanFluxGM2Yr ?? null,
    sliceSigmaGM2Yr: slice?.sigmaGM2Yr ?? null,
    sliceSamples: slice?.samples.length ?? 0,
    sliceCoverage: slice?.coverage ?? 0,
    referenceFluxGM2Yr: reference?.meanFluxGM2Yr ?? null,
    referenceSigmaGM2Yr: reference?.sigmaGM2Yr ?? null,
    referenceSamples: reference?.samples.length ?? 0,
    ratio: site.ratio,
    lnRatioSe: site.lnRatioSe,
    unusedReason: site.unusedReason,
  };
}
