import { Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import type { OpticalSetView } from '@siltlight/common/wire/estimates';
import { ShippedObjects } from '../versions/shipped-objects';
import type { Version } from '../versions/version';
import { VersionsService } from '../versions/versions.service';
import { problem } from '../http/problem';
import { OPTICAL_SET, type OpticalSetContent, shippedOpticalSets } from './shipped-optical-sets';

@Injectable()
export class OpticalSetsService implements OnApplicationBootstrap {
  constructor(
    private readonly versions: VersionsService,
    private readonly shipped: ShippedObjects,
  ) {}

  onApplicationBootstrap(): Promise<void> {
    return this.shipped.ensure(shippedOpticalSets());
  }

  async list(): Promise<OpticalSetView[]> {
    const published = await this.versions.list(OPTICAL_SET, { states: ['published'] });
    return Promise.all(published.map(({ id }) => this.get(id)));
  }

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
    return viewOf(version);
  }
}

function viewOf(version: Version<OpticalSetContent>): OpticalSetView {
  const { id, number, checksum, object, content } = version;
  return { versionId: id, slug: object.slug, title: object.title, number, checksum, ...content };
}
