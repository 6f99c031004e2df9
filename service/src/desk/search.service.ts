import { Injectable } from '@nestjs/common';
import type { SearchHit } from '@siltlight/common/wire/desk';
import type { Person } from '../auth/policy';
import { DatasetsService } from '../datasets/datasets.service';
import { SamplesService } from '../datasets/samples.service';
import { EstimateViews } from '../estimates/estimate-views.service';
import { SlicesService } from '../slices/slices.service';
import { SubmissionsService } from '../submissions/submissions.service';

const MOST = 20;
const SUBMISSIONS = 200;

/** Finds slices, datasets, sites, estimates and submissions by a part of their name, whatever its case. */
@Injectable()
export class SearchService {
  constructor(
    private readonly slices: SlicesService,
    private readonly datasets: DatasetsService,
    private readonly samples: SamplesService,
    private readonly estimates: EstimateViews,
    private readonly submissions: SubmissionsService,
  ) {}

  async find(text: string, reader: Person): Promise<SearchHit[]> {
    const wanted = text.trim().toLowerCase();
    const hits = (
      await Promise.all([
        this.sliceHits(),
        this.datasetHits(),
        this.estimateHits(reader),
        this.submissionHits(reader),
      ])
    ).flat();
    return hits.filter(({ title }) => title.toLowerCase().includes(wanted)).slice(0, MOST);
  }

  private async sliceHits(): Promise<SearchHit[]> {
    const slices = await this.slices.list();
    return slices.map(({ content }) => ({
      kind: 'slice',
      title: `${content.name} (${content.label})`,
      detail: `${content.windowOldKa} to ${content.windowYoungKa} ka`,
      path: `/slices/${content.slug}`,
    }));
  }

  private async datasetHits(): Promise<SearchHit[]> {
    const datasets = await this.datasets.list();
    const lists = datasets.map(async ({ slug, title, siteCount, latest }): Promise<SearchHit[]> => {
      const sites = await this.samples.sites(latest.versionId);
      const path = `/holdings/${slug}`;
      return [
        { kind: 'dataset', title, detail: `version ${latest.number}, ${siteCount} sites`, path },
        ...sites.map(({ site }) => ({
          kind: 'site' as const,
          title: site,
          detail: title,
          path: `${path}?site=${encodeURIComponent(site)}`,
        })),
      ];
    });
    return (await Promise.all(lists)).flat();
  }

  private async estimateHits(reader: Person): Promise<SearchHit[]> {
    const runs = await this.estimates.newest({}, reader);
    return runs.map(({ run, state }) => ({
      kind: 'estimate',
      title: `${run.title}, run ${run.runNumber}`,
      detail: state,
      path: `/estimates/${run.id}`,
    }));
  }

  private async submissionHits(reader: Person): Promise<SearchHit[]> {
    const contributes = reader.roles.some((role) => role === 'scientist' || role === 'steward');
    if (!contributes) return [];
    const { items } = await this.submissions.list({ limit: SUBMISSIONS }, reader);
    return items.map(({ id, number, title, state }) => ({
      kind: 'submission',
      title: `${title} (${number})`,
      detail: state,
      path: `/intake/${id}`,
    }));
  }
}
