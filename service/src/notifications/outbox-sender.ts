import { type BeforeApplicationShutdown, Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Op } from 'sequelize';
import { Settings } from '../config/settings';
import { nowIso } from '../database/row';
import { WriteQueue } from '../database/write-queue';
import { MailTransport } from './mail-transport';
import { OutboxRow } from './models/outbox-row';
import { isFinal, MAX_ATTEMPTS, waitBeforeAttempt } from './retry-plan';

const LOOK_EVERY_MS = 15_000;

/** Sends what waits, one mail after the other, outside of any write. */
@Injectable()
export class OutboxSender implements OnApplicationBootstrap, BeforeApplicationShutdown {
  private working: Promise<void> = Promise.resolve();
  private timer: NodeJS.Timeout | undefined;
  private stopping = false;

  constructor(
    @InjectModel(OutboxRow) private readonly rows: typeof OutboxRow,
    private readonly writes: WriteQueue,
    private readonly transport: MailTransport,
    private readonly settings: Settings,
  ) {}

  onApplicationBootstrap(): void {
    if (!this.transport.exists) return;
    this.timer = setInterval(() => this.wake(), LOOK_EVERY_MS);
    this.timer.unref();
    this.wake();
  }

  async beforeApplicationShutdown(): Promise<void> {
    this.stopping = true;
    clearInterval(this.timer);
    this.transport.close();
    await this.working;
  }

  wake(): void {
    if (!this.transport.exists) return;
    this.working = this.working
      .then(() => this.sendDue())
      .catch((error: unknown) =>
        this.settings.log({ event: 'outbox-stalled', level: 'error', error: String(error) }),
      );
  }

  /** Resolves when everything that was due has been tried. */
  async settled(): Promise<void> {
    await this.working;
  }

  private async sendDue(): Promise<void> {
    while (!this.stopping) {
      const where = { state: 'waiting', nextAttemptAt: { [Op.lte]: nowIso() } };
      const mail = await this.rows.findOne({ where, order: [['nextAttemptAt', 'ASC']] });
      if (!mail) return;
      await this.trySending(mail);
    }
  }

  private async trySending(mail: OutboxRow): Promise<void> {
    const attempts = mail.attempts + 1;
    try {
      await this.transport.send(mail);
      await this.change(mail, { state: 'sent', attempts, sentAt: nowIso(), lastError: null });
    } catch (error) {
      const lastError = (error instanceof Error ? error.message : String(error)).slice(0, 500);
      const failed = isFinal(error) || attempts >= MAX_ATTEMPTS;
      const waitMs = waitBeforeAttempt(attempts, Math.random());
      const nextAttemptAt = new Date(Date.now() + waitMs).toISOString();
      await this.change(
        mail,
        failed ? { state: 'failed', attempts, lastError } : { attempts, lastError, nextAttemptAt },
      );
      this.settings.log({
        event: failed ? 'mail-failed' : 'mail-delayed',
        level: 'warn',
        mailId: mail.id,
        attempts,
      });
    }
  }

  private async change(mail: OutboxRow, change: Partial<OutboxRow>): Promise<void> {
    await this.writes.run((transaction) => mail.update(change, { transaction }));
  }
}
