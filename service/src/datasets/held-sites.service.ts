import { Injectable } from '@nestjs/common';
import type { HeldSite } from '@siltlight/common/vetting/context';
import { VersionsService } from '../versions/versions.service';
import { DATASET, type DatasetContent } from './dataset-content';
import { SamplesService } from './samples.service';

/** Sites that Holdings know already, for checks of what comes in against what is there. */
@Injectable()
export class HeldSites {
  private known: { mark: string; sites: HeldSite[] } | undefined;

  constructor(
    private readonly versions: VersionsService,
    private readonly samples: SamplesService,
  ) {}

  async all(): Promise<HeldSite[]> {
    const published = await this.versions.list(DATASET, { states: ['published'] });
    const mark = published.map(({ id }) => id).join(' ');
    if (this.known?.mark !== mark) {
      const lists = await Promise.all(published.map(({ id }) => this.ofVersion(id)));
      this.known = { mark, sites: lists.flat() };
    }
    return this.known.sites;
  }

  private async ofVersion(versionId: string): Promise<HeldSite[]> {
    const { content, object } = await this.versions.get<DatasetContent>(versionId);
    const sites = await this.samples.sites(versionId);
    return sites.map(({ site, latitudeDeg, longitudeDeg }) => ({
      site,
      latitudeDeg,
      longitudeDeg,
      datasetTitle: object.title,
      archive: content.metadata.archive ?? null,
    }));
  }
}
