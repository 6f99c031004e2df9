import { Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import type { SliceContent } from '@siltlight/common/wire/slices';
import { notFound } from '../http/problem';
import { ShippedObjects } from '../versions/shipped-objects';
import type { Version } from '../versions/version';
import { VersionsService } from '../versions/versions.service';
import { shippedSlices, SLICE } from './shipped-slices';

export type SliceVersion = Version<SliceContent>;

@Injectable()
export class SlicesService implements OnApplicationBootstrap {
  constructor(
    private readonly versions: VersionsService,
    private readonly shipped: ShippedObjects,
  ) {}

  onApplicationBootstrap(): Promise<void> {
    return this.shipped.ensure(shippedSlices());
  }

  /** Youngest first: the order of the column. */
  async list(): Promise<SliceVersion[]> {
    const published = await this.versions.list(SLICE, { states: ['published'] });
    const slices = await Promise.all(published.map(({ id }) => this.versions.get<SliceContent>(id)));
    return slices.sort(
      (a, b) =>
        a.content.windowYoungKa - b.content.windowYoungKa || a.content.windowOldKa - b.content.windowOldKa,
    );
  }

  async find(slug: string): Promise<SliceVersion | null> {
    const object = await this.versions.objectBySlug(SLICE, slug);
    return object && this.versions.latestPublished<SliceContent>(object.id);
  }

  async bySlug(slug: string): Promise<SliceVersion> {
    const version = await this.find(slug);
    if (!version) throw notFound('Slice', slug);
    return version;
  }

  get(versionId: string): Promise<SliceVersion> {
    return this.versions.get<SliceContent>(versionId);
  }

  /** The slice that another is compared with, or null when it is itself the reference. */
  referenceOf({ content }: SliceVersion): Promise<SliceVersion | null> {
    return content.referenceSlug === null ? Promise.resolve(null) : this.bySlug(content.referenceSlug);
  }
}
