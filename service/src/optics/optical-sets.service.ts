import { Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import type { OpticalSetView } from '@siltlight/common/wire/estimates';
import type { ListedOpticalSet } from '@siltlight/common/wire/optics';
import type { Person } from '../auth/policy';
import { notFound, problem } from '../http/problem';
import { ShippedObjects } from '../versions/shipped-objects';
import type { Version } from '../versions/version';
import { VersionsService } from '../versions/versions.service';
import { OPTICAL_SET, type OpticalSetContent } from './optical-set-content';
import { shippedOpticalSets } from './shipped-optical-sets';

/** Optical sets as estimates take them: published ones, which never change again. */
@Injectable()
export class OpticalSetsService implements OnApplicationBootstrap {
  constructor(
    private readonly versions: VersionsService,
    private readonly shipped: ShippedObjects,
  ) {}

  onApplicationBootstrap(): Promise<void> {
    return this.shipped.ensure(shippedOpticalSets());
  }

  async list(): Promise<ListedOpticalSet[]> {
    const published = await this.versions.list(OPTICAL_SET, { states: ['published'] });
    return Promise.all(published.map(({ id }) => this.listed(id)));
  }

  async draftsOf({ id: ownerId }: Person): Promise<ListedOpticalSet[]> {
    const drafts = await this.versions.list(OPTICAL_SET, { states: ['draft'], ownerId });
    return Promise.all(drafts.map(({ id }) => this.listed(id)));
  }

  /** A version that was published at some time; a draft is nobody's to build on. */
  async get(versionId: string): Promise<OpticalSetView> {
    const version = await this.versions.get<OpticalSetContent>(versionId);
    if (version.object.kind !== OPTICAL_SET) {
      throw problem(
        422,
        'not-an-optical-set',
        'That is not an optical set',
        `Version ${versionId} is of another kind. Pick one of GET /api/v1/optical-sets.`,
      );
    }
    if (version.state === 'draft') throw notFound('Version', versionId);
    return viewOf(version);
  }

  private async listed(versionId: string): Promise<ListedOpticalSet> {
    const version = await this.versions.get<OpticalSetContent>(versionId);
    const { species, basis } = version.content;
    return { ...viewOf(version), state: version.state, species, basisKind: basis.kind };
  }
}

export function viewOf(version: Version<OpticalSetContent>): OpticalSetView {
  const { id, number, checksum, object, content } = version;
  return {
    versionId: id,
    slug: object.slug,
    title: object.title,
    number,
    checksum,
    singleScatteringAlbedo: content.singleScatteringAlbedo,
    asymmetry: content.asymmetry,
    massExtinctionM2PerG: content.massExtinctionM2PerG,
    wavelengthUm: content.wavelengthUm,
    sizeCutoff: content.sizeCutoff,
    source: content.source,
    evidence: content.evidence,
    note: content.note,
  };
}
