import { Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import type { BackdropView } from '@siltlight/common/wire/estimates';
import { problem } from '../http/problem';
import { ShippedObjects } from '../versions/shipped-objects';
import { VersionsService } from '../versions/versions.service';
import { BACKDROP, type BackdropContent, shippedBackdrops } from './shipped-backdrops';

@Injectable()
export class BackdropsService implements OnApplicationBootstrap {
  constructor(
    private readonly versions: VersionsService,
    private readonly shipped: ShippedObjects,
  ) {}

  onApplicationBootstrap(): Promise<void> {
    return this.shipped.ensure(shippedBackdrops());
  }

  async list(): Promise<BackdropView[]> {
    const published = await this.versions.list(BACKDROP, { states: ['published'] });
    return Promise.all(published.map(({ id }) => this.get(id)));
  }

  async get(versionId: string): Promise<BackdropView> {
    const { id, number, checksum, object, content } = await this.versions.get<BackdropContent>(versionId);
    if (object.kind !== BACKDROP) {
      throw problem(
        422,
        'not-a-backdrop',
        'That is not a backdrop',
        `Version ${versionId} is of another kind. Pick one of GET /api/v1/backdrops.`,
      );
    }
    return { versionId: id, slug: object.slug, title: object.title, number, checksum, ...content };
  }
}
