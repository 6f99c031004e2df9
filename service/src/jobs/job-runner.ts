import { type BeforeApplicationShutdown, Injectable, type OnApplicationBootstrap } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Settings } from '../config/settings';
import { newId, nowIso } from '../database/row';
import { WriteQueue } from '../database/write-queue';
import { problemFrom } from '../http/problem-from';
import { JobProgress } from './job-progress';
import { JobRow } from './models/job-row';

/** Does the work of one kind of job. Long sums belong into a worker thread; the main one must stay free. */
export type RunJob = (
  job: { id: string; payload: unknown; personId: string },
  report: (progress01: number, stage: string) => Promise<void>,
  signal: AbortSignal,
) => Promise<unknown>;

const CONCURRENT = 2;
/** A job that ends the process three times is not tried a fourth time. */
const MAX_ATTEMPTS = 3;
const STOP_WITHIN_MS = 5000;

@Injectable()
export class JobRunner implements OnApplicationBootstrap, BeforeApplicationShutdown {
  private readonly kinds = new Map<string, RunJob>();
  private readonly running = new Map<
    string,
    { personId: string; abort: AbortController; ended: Promise<void> }
  >();
  private stopping = false;
  private filling: Promise<void> = Promise.resolve();

  constructor(
    @InjectModel(JobRow) private readonly rows: typeof JobRow,
    private readonly writes: WriteQueue,
    private readonly settings: Settings,
  ) {}

  register(kind: string, run: RunJob): void {
    if (this.kinds.has(kind)) throw new Error(`Jobs of kind ${kind} have a runner already.`);
    this.kinds.set(kind, run);
  }

  requireKnown(kind: string): void {
    if (!this.kinds.has(kind)) throw new Error(`No runner is registered for jobs of kind ${kind}.`);
  }

  abort(id: string): void {
    this.running.get(id)?.abort.abort(new Error('cancelled'));
  }

  /** What was running when the process ended is taken up again, until it has been tried too often. */
  async onApplicationBootstrap(): Promise<void> {
    await this.writes.run(async (transaction) => {
      for (const row of await this.rows.findAll({ where: { state: 'running' }, transaction })) {
        const given = row.attempts < MAX_ATTEMPTS;
        const error = `It was tried ${row.attempts} times, and each time the service ended before it did.`;
        const change = given
          ? { state: 'queued' as const }
          : { state: 'failed' as const, error, finishedAt: nowIso() };
        await row.update(change, { transaction });
      }
    });
    this.wake();
  }

  async beforeApplicationShutdown(): Promise<void> {
    this.stopping = true;
    for (const { abort } of this.running.values()) abort.abort(new Error('stopping'));
    const ended = Promise.all([this.filling, ...[...this.running.values()].map((job) => job.ended)]);
    await Promise.race([ended, new Promise((resolve) => setTimeout(resolve, STOP_WITHIN_MS).unref())]);
  }

  /** Starts what can be started. Calls follow one another, so no job is taken twice. */
  wake(): void {
    this.filling = this.filling
      .then(() => this.fill())
      .catch((error: unknown) => this.logFailure('jobs-stalled', error));
  }

  private async fill(): Promise<void> {
    while (!this.stopping && this.running.size < CONCURRENT) {
      const row = await this.takeNext();
      if (!row) return;
      const abort = new AbortController();
      const entry = { personId: row.personId, abort, ended: Promise.resolve() };
      this.running.set(row.id, entry);
      entry.ended = this.perform(row, abort.signal)
        .catch((error: unknown) => this.logFailure('job-not-recorded', error))
        .finally(() => {
          this.running.delete(row.id);
          this.wake();
        });
    }
  }

  /** The oldest job of whoever has the fewest running: nobody waits behind another's long list. */
  private takeNext(): Promise<JobRow | null> {
    return this.writes.run(async (transaction) => {
      const attributes = ['id', 'personId'];
      const queued = await this.rows.findAll({
        where: { state: 'queued' },
        attributes,
        order: [['id', 'ASC']],
        transaction,
      });
      const load = (personId: string) =>
        [...this.running.values()].filter((job) => job.personId === personId).length;
      const next = queued.sort((a, b) => load(a.personId) - load(b.personId))[0];
      const row = next ? await this.rows.findByPk(next.id, { transaction }) : null;
      await row?.update(
        { state: 'running', attempts: row.attempts + 1, startedAt: nowIso() },
        { transaction },
      );
      return row;
    });
  }

  private async perform(row: JobRow, signal: AbortSignal): Promise<void> {
    const { id, payload, personId } = row;
    const progress = new JobProgress(signal, (value, stage) =>
      this.change(id, { progress: Math.max(value, row.progress), stage }),
    );
    try {
      const run = this.kinds.get(row.kind);
      if (!run) throw new Error(`No runner is registered for jobs of kind ${row.kind}.`);
      const result = await run(
        { id, payload, personId },
        (value, stage) => progress.report(value, stage),
        signal,
      );
      await this.change(id, { state: 'done', progress: 1, result: result ?? null, finishedAt: nowIso() });
    } catch (error) {
      if (this.stopping) await this.change(id, { state: 'queued', attempts: row.attempts - 1 });
      else if (!signal.aborted)
        await this.change(id, { state: 'failed', error: this.told(error, id), finishedAt: nowIso() });
    }
  }

  /** Only a job that still runs is changed: one that was cancelled meanwhile stays so. */
  private async change(id: string, change: Partial<JobRow>): Promise<void> {
    await this.writes.run((transaction) =>
      this.rows.update(change, { where: { id, state: 'running' }, transaction }),
    );
  }

  private told(error: unknown, jobId: string): string {
    const known = problemFrom(error);
    if (known) return known.extras.detail ?? known.title;
    const reference = newId();
    this.logFailure('job-failed', error, { jobId, reference });
    return `Something went wrong on our side; it was recorded under the reference ${reference}.`;
  }

  private logFailure(event: string, error: unknown, more: Record<string, unknown> = {}): void {
    const told = error instanceof Error ? (error.stack ?? error.message) : String(error);
    this.settings.log({ event, level: 'error', ...more, error: told });
  }
}
