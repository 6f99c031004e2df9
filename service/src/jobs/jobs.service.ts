import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { JobSummary } from '@siltlight/common/wire/jobs';
import { Op, type Transaction, type WhereOptions } from 'sequelize';
import type { Person } from '../auth/policy';
import { nowIso } from '../database/row';
import { WriteQueue } from '../database/write-queue';
import { notFound, problem } from '../http/problem';
import { JobRunner, type RunJob } from './job-runner';
import { JobRow, summaryOf } from './models/job-row';

export interface JobRequest {
  kind: string;
  personId: string;
  payload: unknown;
  /** the same key asked again by the same person while the job is open gives the job that is there */
  dedupeKey?: string;
  title: string;
}

const OPEN = ['queued', 'running'];

/** Long work: asked for here, done one after the other by the runner, told at /api/v1/jobs. */
@Injectable()
export class JobsService {
  constructor(
    @InjectModel(JobRow) private readonly rows: typeof JobRow,
    private readonly writes: WriteQueue,
    private readonly runner: JobRunner,
  ) {}

  /** Call it in `onModuleInit`: jobs left over from before are taken up once the application has started. */
  register(kind: string, run: RunJob): void {
    this.runner.register(kind, run);
  }

  /** With a transaction the job is part of that write and starts once it is committed. */
  request(wanted: JobRequest, transaction?: Transaction): Promise<JobSummary> {
    return transaction
      ? this.insert(wanted, transaction)
      : this.writes.run((own) => this.insert(wanted, own));
  }

  async get(id: string, person: Person): Promise<JobSummary> {
    return summaryOf(await this.visibleRow(id, person));
  }

  /** What the runner answered; null unless the job is done. */
  async resultOf<Result>(id: string, person: Person): Promise<Result | null> {
    return (await this.visibleRow(id, person)).result as Result | null;
  }

  find(person: Person, count: number, after?: string): Promise<JobRow[]> {
    const where: WhereOptions = { personId: person.id, ...(after ? { id: { [Op.lt]: after } } : {}) };
    return this.rows.findAll({ where, order: [['id', 'DESC']], limit: count });
  }

  count(person: Person): Promise<number> {
    return this.rows.count({ where: { personId: person.id } });
  }

  /** The answer is at once; the runner hears of it through its signal, and whatever it still brings is dropped. */
  async cancel(id: string, person: Person): Promise<JobSummary> {
    await this.visibleRow(id, person);
    const row = await this.writes.run(async (transaction) => {
      const current = (await this.rows.findByPk(id, { transaction }))!;
      if (OPEN.includes(current.state)) {
        await current.update({ state: 'cancelled', finishedAt: nowIso() }, { transaction });
      } else if (current.state !== 'cancelled') {
        throw problem(
          409,
          'job-finished',
          'The job has finished already',
          `It is ${current.state} since ${current.finishedAt}.`,
        );
      }
      return current;
    });
    this.runner.abort(id);
    return summaryOf(row);
  }

  private async insert({ dedupeKey, ...wanted }: JobRequest, transaction: Transaction): Promise<JobSummary> {
    this.runner.requireKnown(wanted.kind);
    const { kind, personId } = wanted;
    const same = dedupeKey
      ? await this.rows.findOne({ where: { kind, personId, dedupeKey, state: OPEN }, transaction })
      : null;
    if (same) return summaryOf(same);
    const row = await this.rows.create(
      { ...wanted, payload: wanted.payload ?? {}, dedupeKey: dedupeKey ?? null, state: 'queued' },
      { transaction },
    );
    transaction.afterCommit(() => this.runner.wake());
    return summaryOf(row);
  }

  private async visibleRow(id: string, person: Person): Promise<JobRow> {
    const row = await this.rows.findByPk(id);
    const mayLook = row && (row.personId === person.id || person.roles.includes('administrator'));
    if (!mayLook) throw notFound('Job', id);
    return row;
  }
}
