import { Injectable } from '@nestjs/common';
import { Cron, CronExpression } from '@nestjs/schedule';
import { InjectModel } from '@nestjs/sequelize';
import { Op } from 'sequelize';
import { Settings } from '../config/settings';
import { WriteQueue } from '../database/write-queue';
import { OneTimeTokenRow } from './models/one-time-token-row';
import { SessionRow } from './models/session-row';
import { isoAt } from './session-limits';

/** Past sessions tell the usual places of a person; after this time they are only clutter. */
const KEPT_MS = 90 * 86_400_000;

@Injectable()
export class AccountSweep {
  constructor(
    @InjectModel(SessionRow) private readonly sessions: typeof SessionRow,
    @InjectModel(OneTimeTokenRow) private readonly oneTime: typeof OneTimeTokenRow,
    private readonly writes: WriteQueue,
    private readonly settings: Settings,
  ) {}

  @Cron(CronExpression.EVERY_DAY_AT_4AM)
  async nightly(): Promise<void> {
    try {
      await this.sweep();
    } catch (error) {
      this.settings.log({ event: 'account-sweep-failed', level: 'error', error: String(error) });
    }
  }

  /** Removes sessions and one-time tokens that ended long ago. */
  async sweep(): Promise<number> {
    const where = { expiresAt: { [Op.lt]: isoAt(Date.now() - KEPT_MS) } };
    return this.writes.run(async (transaction) => {
      const sessions = await this.sessions.destroy({ where, transaction });
      return sessions + (await this.oneTime.destroy({ where, transaction }));
    });
  }
}
