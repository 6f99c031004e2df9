import { Injectable } from '@nestjs/common';
import type { OpticalSetDetail, OpticalSetVersion } from '@siltlight/common/wire/optics';
import type { Person } from '../auth/policy';
import { notFound } from '../http/problem';
import { PeopleService } from '../users/people.service';
import { SHIPPED } from '../versions/shipped-objects';
import type { VersionedObject, VersionSummary } from '../versions/version';
import { VersionsService } from '../versions/versions.service';
import { OPTICAL_SET, type OpticalSetContent } from './optical-set-content';
import { viewOf } from './optical-sets.service';

/** Sets and their versions as a person may see them: a draft is its author's alone. */
@Injectable()
export class OpticalSetViews {
  constructor(
    private readonly versions: VersionsService,
    private readonly people: PeopleService,
  ) {}

  /** The reader's own draft where there is one, else what is in force, else what was last. */
  async current(slug: string, reader: Person): Promise<OpticalSetDetail> {
    const seen = await this.seen(slug, reader);
    const inForce = seen.find(({ state }) => state === 'published');
    const wanted = seen.find(({ state }) => state === 'draft') ?? inForce ?? seen.at(-1)!;
    return this.detail(wanted.id, reader);
  }

  async numbered(slug: string, number: number, reader: Person): Promise<OpticalSetDetail> {
    const found = (await this.seen(slug, reader)).find((version) => version.number === number);
    if (!found) throw notFound('Version', `${number} of ${slug}`);
    return this.detail(found.id, reader);
  }

  async listed(slug: string, reader: Person): Promise<OpticalSetVersion[]> {
    return (await this.seen(slug, reader)).map(({ id, number, state, checksum, createdAt, publishedAt }) => ({
      versionId: id,
      number,
      state,
      checksum,
      createdAt,
      publishedAt,
    }));
  }

  async detail(versionId: string, reader: Person): Promise<OpticalSetDetail> {
    const version = await this.versions.get<OpticalSetContent>(versionId);
    const { state, content, object, createdAt, createdBy, publishedAt } = version;
    const draft = (await this.seen(object.slug, reader)).find((one) => one.state === 'draft');
    const own = object.ownerId === reader.id && reader.roles.includes('scientist');
    return {
      ...viewOf(version),
      state,
      species: content.species,
      basis: content.basis,
      createdAt,
      createdBy: createdBy === SHIPPED ? null : await this.people.mark(createdBy),
      publishedAt,
      ownDraftVersionId: draft?.id ?? null,
      rights: {
        mayEdit: own && state === 'draft',
        mayPublish: own && state === 'draft',
        mayAddVersion: own && draft === undefined,
      },
    };
  }

  /** @throws Problem 404 also where only somebody else's draft exists */
  async objectSeen(slug: string, reader: Person): Promise<VersionedObject> {
    return (await this.seen(slug, reader))[0]!.object;
  }

  private async seen(slug: string, reader: Person): Promise<VersionSummary[]> {
    const all = await this.versions.list(OPTICAL_SET, { slug });
    const seen = all.filter(({ state, object }) => state !== 'draft' || object.ownerId === reader.id);
    if (seen.length === 0) throw notFound('Optical set', slug);
    return seen;
  }
}
