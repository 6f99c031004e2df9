import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { exportRequest, ExportSummary } from '@siltlight/common/wire/exports';
import type { Page } from '@siltlight/common/wire/shared';
import { Op } from 'sequelize';
import type { z } from 'zod';
import type { Person } from '../auth/policy';
import { newId } from '../database/row';
import { WriteQueue } from '../database/write-queue';
import { EstimateViews } from '../estimates/estimate-views.service';
import { FileStore } from '../files/file-store.service';
import { pageOf } from '../http/paging';
import { notFound, problem } from '../http/problem';
import { JobStates } from '../jobs/job-states.service';
import { JobsService } from '../jobs/jobs.service';
import { LedgerService } from '../ledger/ledger.service';
import { PeopleService } from '../users/people.service';
import type { ExportSubject } from './export-subject';
import { ExportSubjects } from './export-subjects.service';
import { FORMATS } from './formats/formats';
import { ExportRow } from './models/export-row';

const JOB = 'export';

/** Makes files of estimates as jobs and hands them out. */
@Injectable()
export class ExportsService implements OnModuleInit {
  constructor(
    @InjectModel(ExportRow) private readonly rows: typeof ExportRow,
    private readonly estimates: EstimateViews,
    private readonly subjects: ExportSubjects,
    private readonly jobs: JobsService,
    private readonly jobStates: JobStates,
    private readonly files: FileStore,
    private readonly people: PeopleService,
    private readonly ledger: LedgerService,
    private readonly writes: WriteQueue,
  ) {}

  onModuleInit(): void {
    this.jobs.register(JOB, async ({ payload }, report) => {
      await this.make((payload as { exportId: string }).exportId, report);
      return { resultPath: '/exports' };
    });
  }

  async request({ estimateId, format }: z.infer<typeof exportRequest>, by: Person) {
    const loaded = await this.estimates.load(estimateId, by);
    if (!loaded.version) {
      throw problem(
        409,
        'not-computed',
        'There is nothing to export yet',
        `Run ${loaded.run.runNumber} is ${loaded.state}; wait until it is computed.`,
      );
    }
    const id = newId();
    const title = `${loaded.run.title}, run ${loaded.run.runNumber}: ${FORMATS[format].title}`;
    const job = await this.writes.run(async (transaction) => {
      const row = await this.rows.create(
        { id, format, estimateId, title, createdBy: by.id },
        { transaction },
      );
      const queued = await this.jobs.request(
        { kind: JOB, personId: by.id, payload: { exportId: id }, title: `Export: ${title}` },
        transaction,
      );
      await row.update({ jobId: queued.id }, { transaction });
      await this.ledger.record(
        {
          actorId: by.id,
          verb: 'export',
          objectKind: 'export',
          objectId: id,
          objectTitle: title,
          summary: `Export asked for: ${title}`,
        },
        transaction,
      );
      return queued;
    });
    return { id, jobId: job.id, jobPath: `/api/v1/jobs/${job.id}` };
  }

  async page(
    query: { limit: number; cursor?: string | undefined },
    reader: Person,
  ): Promise<Page<ExportSummary>> {
    const own = { createdBy: reader.id };
    const page = await pageOf(query, {
      fetch: (count, after) =>
        this.rows.findAll({
          where: { ...own, ...(after === undefined ? {} : { id: { [Op.lt]: after } }) },
          order: [['id', 'DESC']],
          limit: count,
        }),
      count: () => this.rows.count({ where: own }),
      keyOf: ({ id }) => id,
      toItem: (row) => row,
    });
    return { ...page, items: await Promise.all(page.items.map((row) => this.summary(row))) };
  }

  async get(id: string, reader: Person): Promise<ExportRow> {
    const row = await this.rows.findByPk(id);
    if (!row || row.createdBy !== reader.id) throw notFound('Export', id);
    return row;
  }

  async summary(row: ExportRow): Promise<ExportSummary> {
    return {
      id: row.id,
      title: row.title,
      format: row.format,
      state: await this.jobStates.of(row.jobId!),
      jobId: row.jobId!,
      fileName: row.fileName ?? null,
      bytes: row.bytes ?? null,
      sha256: row.sha256 ?? null,
      estimateId: row.estimateId,
      estimateTitle: row.title,
      createdBy: await this.people.mark(row.createdBy),
      createdAt: row.createdAt,
    };
  }

  /** The finished file, or why there is none. */
  finished(row: ExportRow): { fileName: string; sha256: string; bytes: number; mediaType: string } {
    const { fileName, sha256, bytes } = row;
    if (!fileName || !sha256 || !bytes) {
      throw problem(
        409,
        'not-finished',
        'The file is not finished',
        'Look at the job; fetch the file when it is done.',
      );
    }
    return { fileName, sha256, bytes, mediaType: FORMATS[row.format].mediaType };
  }

  async subjectOf(row: ExportRow, reader: Person): Promise<ExportSubject> {
    return this.subjects.of(await this.estimates.load(row.estimateId, reader));
  }

  private async make(
    exportId: string,
    report: (progress: number, stage: string) => Promise<void>,
  ): Promise<void> {
    const row = (await this.rows.findByPk(exportId))!;
    await report(0.1, 'reading the estimate');
    const subject = await this.subjects.of(await this.estimates.byId(row.estimateId));
    const { make, suffix, mediaType } = FORMATS[row.format];
    const bytes = make(subject);
    await report(0.8, 'keeping the file');
    const fileName = `siltlight-${subject.content.pins.slice.slug}-run-${subject.runNumber}-${suffix}`;
    const stored = await this.files.put(bytes, { fileName, mediaType });
    await this.writes.run(async (transaction) => {
      await row.update({ fileName, sha256: stored.sha256, bytes: stored.bytes }, { transaction });
    });
  }
}
