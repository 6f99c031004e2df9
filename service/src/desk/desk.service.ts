import { Injectable } from '@nestjs/common';
import type { DeskView } from '@siltlight/common/wire/desk';
import type { Person } from '../auth/policy';
import { EstimateLists } from '../estimates/estimate-lists.service';
import { EstimateViews, type LoadedRun } from '../estimates/estimate-views.service';
import { LedgerService } from '../ledger/ledger.service';
import { SubmissionsService } from '../submissions/submissions.service';

const SHOWN = 50;
const LATELY = 12;
/** In the ledger, and no news. */
const COMINGS_AND_GOINGS = ['sign-in', 'sign-out', 'end-session'];

/** What waits for a person, by their roles. */
@Injectable()
export class DeskService {
  constructor(
    private readonly submissions: SubmissionsService,
    private readonly lists: EstimateLists,
    private readonly estimates: EstimateViews,
    private readonly ledger: LedgerService,
  ) {}

  async of(person: Person): Promise<DeskView> {
    const has = (...roles: Person['roles']) => roles.some((role) => person.roles.includes(role));
    const runs = await this.estimates.newest({}, person);
    const others = (run: LoadedRun) => run.run.createdBy !== person.id;
    return {
      queue: has('steward') ? await this.queue(person) : [],
      mySubmissions: has('scientist', 'steward')
        ? (await this.submissions.list({ mine: 'true', limit: SHOWN }, person)).items
        : [],
      awaitingSignOff: has('scientist', 'steward')
        ? await this.summaries(runs.filter((run) => run.state === 'computed' && others(run)))
        : [],
      stale: await this.summaries(
        runs.filter(({ state, version }) => state === 'published' && version?.staleSince),
      ),
      latestPublished: await this.summaries([...(await this.lists.latestPublished(person)).values()]),
      lately: await this.lately(has('steward', 'administrator') ? {} : { personId: person.id }),
    };
  }

  private async queue(person: Person): Promise<DeskView['queue']> {
    const { items } = await this.submissions.list({ queue: 'true', limit: SHOWN }, person);
    return items.map((item) => ({
      ...item,
      own: item.contributor.id === person.id,
      waitsSince: item.submittedAt ?? item.createdAt,
    }));
  }

  private summaries(runs: LoadedRun[]) {
    return Promise.all(runs.slice(0, SHOWN).map((run) => this.estimates.summary(run)));
  }

  /** Stewards and administrators see what everybody did, others what they did themselves. */
  private async lately(whose: { personId?: string }): Promise<DeskView['lately']> {
    const rows = await this.ledger.find({ ...whose, notVerbs: COMINGS_AND_GOINGS }, LATELY);
    return rows.map(({ at, summary, objectKind, objectId }) => ({
      at,
      summary,
      path: pathOf(objectKind, objectId),
    }));
  }
}

function pathOf(objectKind: string, objectId: string): string | null {
  if (objectKind === 'submission') return `/intake/${objectId}`;
  return objectKind === 'estimate' ? `/estimates/${objectId}` : null;
}
