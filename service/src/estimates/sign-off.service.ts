import { Injectable } from '@nestjs/common';
import type { Person } from '../auth/policy';
import { WriteQueue } from '../database/write-queue';
import { problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import { OutboxService } from '../notifications/outbox.service';
import { VersionsService } from '../versions/versions.service';
import { ESTIMATE } from './estimate-content';
import { EstimateViews, type LoadedRun } from './estimate-views.service';

/** A second person's word publishes an estimate; a reason withdraws it. */
@Injectable()
export class SignOff {
  constructor(
    private readonly views: EstimateViews,
    private readonly versions: VersionsService,
    private readonly ledger: LedgerService,
    private readonly outbox: OutboxService,
    private readonly writes: WriteQueue,
  ) {}

  async sign(id: string, by: Person): Promise<void> {
    const { run, version, state } = await this.views.load(id, by);
    if (run.createdBy === by.id) {
      throw problem(
        403,
        'four-eyes',
        'A second person signs off',
        `Run ${run.runNumber} is yours; somebody else has to look at it before it is published.`,
      );
    }
    if (state !== 'computed' || !version) throw wrongState(run.runNumber, state, 'computed');
    await this.writes.run(async (transaction) => {
      await this.versions.publish(version.id, by.id, transaction);
      await this.ledger.record(
        {
          actorId: by.id,
          verb: 'sign-off-estimate',
          objectKind: ESTIMATE,
          objectId: run.id,
          objectTitle: run.title,
          summary: `Run ${run.runNumber} signed off and published: ${run.title}`,
          after: { checksum: version.checksum },
        },
        transaction,
      );
      await this.outbox.queue(
        {
          toPersonId: run.createdBy,
          mailKind: 'estimate-published',
          subject: `Run ${run.runNumber} is published: ${run.title}`,
          lines: [`${by.name} signed off your estimate "${run.title}".`],
          linkPath: `/estimates/${run.id}`,
        },
        transaction,
      );
    });
  }

  async withdraw(id: string, by: Person, reason: string): Promise<void> {
    const { run, version, state } = await this.views.load(id, by);
    if (state !== 'published' || !version) throw wrongState(run.runNumber, state, 'published');
    if (run.createdBy !== by.id && !by.roles.includes('steward')) {
      throw problem(403, 'not-yours', 'This estimate is not yours', 'Its author or a steward withdraws it.');
    }
    await this.writes.run(async (transaction) => {
      await this.versions.withdraw(version.id, by.id, reason, transaction);
      await this.ledger.record(
        {
          actorId: by.id,
          verb: 'withdraw-estimate',
          objectKind: ESTIMATE,
          objectId: run.id,
          objectTitle: run.title,
          summary: `Run ${run.runNumber} withdrawn: ${reason}`,
        },
        transaction,
      );
      if (run.createdBy === by.id) return;
      await this.outbox.queue(
        {
          toPersonId: run.createdBy,
          mailKind: 'estimate-withdrawn',
          subject: `Run ${run.runNumber} is withdrawn: ${run.title}`,
          lines: [`${by.name} withdrew your estimate "${run.title}".`, reason],
          linkPath: `/estimates/${run.id}`,
        },
        transaction,
      );
    });
  }
}

function wrongState(runNumber: number, state: LoadedRun['state'], wanted: string) {
  return problem(
    409,
    'wrong-state',
    `The estimate is ${state}`,
    `Run ${runNumber} is ${state}; it must be ${wanted}. Reload to see what happened.`,
  );
}
