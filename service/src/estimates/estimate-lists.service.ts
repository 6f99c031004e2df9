import { Injectable } from '@nestjs/common';
import type { EstimateSummary, estimatesQuery } from '@siltlight/common/wire/estimates';
import type { Page } from '@siltlight/common/wire/shared';
import type { z } from 'zod';
import type { Person } from '../auth/policy';
import { numberOfCursor, pageOf } from '../http/paging';
import { EstimateViews, type LoadedRun } from './estimate-views.service';

type Query = z.infer<typeof estimatesQuery> & { limit: number; cursor?: string | undefined };

/** Lists of estimates, newest first. */
@Injectable()
export class EstimateLists {
  constructor(private readonly views: EstimateViews) {}

  async page(query: Query, reader: Person): Promise<Page<EstimateSummary>> {
    const visible = await this.visible(query, reader);
    const page = await pageOf<LoadedRun, LoadedRun>(query, {
      fetch: (count, after) => {
        const before = after === undefined ? Infinity : numberOfCursor(after);
        return Promise.resolve(visible.filter(({ run }) => run.runNumber < before).slice(0, count));
      },
      count: () => Promise.resolve(visible.length),
      keyOf: ({ run }) => String(run.runNumber),
      toItem: (loaded) => loaded,
    });
    return { ...page, items: await Promise.all(page.items.map((loaded) => this.views.summary(loaded))) };
  }

  /** The latest published estimate of each slice. */
  async latestPublished(reader: Person): Promise<Map<string, LoadedRun>> {
    const published = (await this.views.newest({}, reader)).filter(({ state }) => state === 'published');
    const latest = new Map<string, LoadedRun>();
    for (const loaded of published.sort(byPublication)) latest.set(loaded.run.sliceSlug, loaded);
    return latest;
  }

  private async visible({ slice, state }: Query, reader: Person): Promise<LoadedRun[]> {
    const runs = await this.views.newest(slice === undefined ? {} : { sliceSlug: slice }, reader);
    return runs.filter((loaded) => state === undefined || loaded.state === state);
  }
}

const byPublication = (a: LoadedRun, b: LoadedRun) =>
  (a.version?.publishedAt ?? '').localeCompare(b.version?.publishedAt ?? '');
