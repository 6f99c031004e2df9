import { Injectable } from '@nestjs/common';
import { AR6_REGIONS } from '@siltlight/common/tables/ar6-regions';
import type { DatasetSummary, DatasetVersionDetail } from '@siltlight/common/wire/datasets';
import type { Person } from '../auth/policy';
import { notFound } from '../http/problem';
import { PeopleService } from '../users/people.service';
import type { Version, VersionSummary } from '../versions/version';
import { VersionsService } from '../versions/versions.service';
import { citationOf } from './citation';
import { DATASET, type DatasetContent } from './dataset-content';
import { DatasetDependants } from './dataset-dependants';
import { SamplesService } from './samples.service';

export type DatasetVersion = Version<DatasetContent>;

const REGION_NAMES = new Map(AR6_REGIONS.map(({ code, name }) => [code, name]));

/** Holdings as people read them. */
@Injectable()
export class DatasetsService {
  constructor(
    private readonly versions: VersionsService,
    private readonly samples: SamplesService,
    private readonly dependants: DatasetDependants,
    private readonly people: PeopleService,
  ) {}

  async list(): Promise<DatasetSummary[]> {
    const published = await this.versions.list(DATASET, { states: ['published'] });
    return Promise.all(published.map((summary) => this.summary(summary.id)));
  }

  /** A version by its number, else the one in force, else (all withdrawn) the newest. */
  async version(slug: string, number?: number): Promise<DatasetVersion> {
    const object = await this.versions.objectBySlug(DATASET, slug);
    if (!object) throw notFound('Dataset', slug);
    const all = await this.versions.list(DATASET, { objectIds: [object.id] });
    const shown = all.filter(({ state }) => state !== 'draft');
    const wanted =
      number === undefined
        ? (shown.find(({ state }) => state === 'published') ?? shown.at(-1))
        : shown.find((version) => version.number === number);
    if (!wanted) throw notFound('Version', `${number ?? ''} of ${slug}`);
    return this.versions.get<DatasetContent>(wanted.id);
  }

  byVersionId(versionId: string): Promise<DatasetVersion> {
    return this.versions.get<DatasetContent>(versionId);
  }

  async detail(version: DatasetVersion, reader: Person): Promise<DatasetVersionDetail> {
    const { content, object } = version;
    const siblings = await this.versions.list(DATASET, { objectIds: [object.id] });
    const sites = await this.samples.sites(version.id);
    return {
      slug: object.slug,
      title: content.title,
      kind: content.kind,
      invented: content.invented,
      version: await this.versionSummary(version),
      versions: await Promise.all(
        siblings.filter(({ state }) => state !== 'draft').map((sibling) => this.versionSummary(sibling)),
      ),
      citation: citationOf(content, version),
      metadata: content.metadata,
      grade: content.grade,
      sites: sites.map((site) => ({ ...site, regionName: REGION_NAMES.get(site.regionCode ?? '') ?? null })),
      sampleCount: content.samples.length,
      submission: content.submission,
      file: content.file,
      usedBy: await this.dependants.usedBy(version.id),
      rights: {
        mayWithdraw: reader.roles.includes('steward') && ['published', 'superseded'].includes(version.state),
      },
    };
  }

  private async summary(versionId: string): Promise<DatasetSummary> {
    const version = await this.versions.get<DatasetContent>(versionId);
    const { content, object } = version;
    const sites = new Set(content.samples.map(({ site }) => site));
    return {
      slug: object.slug,
      title: content.title,
      kind: content.kind,
      archive: content.metadata.archive ?? null,
      licence: content.metadata.licence ?? null,
      siteCount: sites.size,
      sampleCount: content.samples.length,
      invented: content.invented,
      latest: await this.versionSummary(version),
    };
  }

  private async versionSummary(version: VersionSummary): Promise<DatasetSummary['latest']> {
    const { id, number, state, checksum, publishedAt, publishedBy, note, withdrawnReason } = version;
    return {
      versionId: id,
      number,
      state,
      checksum,
      publishedAt,
      publishedBy: publishedBy === null ? null : await this.people.mark(publishedBy),
      note,
      withdrawnReason,
    };
  }
}
