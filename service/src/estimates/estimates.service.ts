import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { prepareEstimate } from '@siltlight/common/estimate/prepared-estimate';
import { previewEstimate } from '@siltlight/common/estimate/run-estimate';
import type { EstimateRequest, EstimateResult } from '@siltlight/common/wire/estimates';
import type { Transaction } from 'sequelize';
import type { Person } from '../auth/policy';
import { newId } from '../database/row';
import { WriteQueue } from '../database/write-queue';
import { JobsService } from '../jobs/jobs.service';
import { LedgerService } from '../ledger/ledger.service';
import { VersionsService } from '../versions/versions.service';
import { ComputingProcesses } from './computing-processes.service';
import { ESTIMATE, type EstimateContent } from './estimate-content';
import { labelResult } from './label-result';
import { EstimateRunRow } from './models/estimate-run-row';
import { ResolveInputs } from './resolve-inputs.service';

/** Raised when a change of the code moves a number, so that a record says what computed it. */
export const CODE_VERSION = '0.1.0';

const JOB = 'estimate';

/** Asks for estimates and computes them as jobs. */
@Injectable()
export class EstimatesService implements OnModuleInit {
  constructor(
    @InjectModel(EstimateRunRow) private readonly runs: typeof EstimateRunRow,
    private readonly inputs: ResolveInputs,
    private readonly processes: ComputingProcesses,
    private readonly versions: VersionsService,
    private readonly jobs: JobsService,
    private readonly ledger: LedgerService,
    private readonly writes: WriteQueue,
  ) {}

  onModuleInit(): void {
    this.jobs.register(JOB, async ({ payload }, report, signal) => {
      const { runId } = payload as { runId: string };
      await this.compute(runId, report, signal);
      return { resultPath: `/estimates/${runId}` };
    });
  }

  /** Few members, the same central values: what a full run will say, at once. */
  async preview(request: EstimateRequest): Promise<EstimateResult> {
    const { inputs } = await this.inputs.resolve(request);
    return labelResult(previewEstimate(inputs));
  }

  async request(
    request: EstimateRequest,
    by: Person,
  ): Promise<{ id: string; jobId: string; jobPath: string }> {
    const { title, pins, inputs } = await this.inputs.resolve(request);
    prepareEstimate(inputs); // refuses now, by name, what the job would refuse later
    const id = newId();
    const job = await this.writes.run(async (transaction) => {
      const run = await this.createRun({ id, title, sliceSlug: pins.slice.slug, request, by }, transaction);
      const wanted = { kind: JOB, personId: by.id, payload: { runId: id }, title: `Estimate: ${title}` };
      const queued = await this.jobs.request(wanted, transaction);
      await run.update({ jobId: queued.id }, { transaction });
      return queued;
    });
    return { id, jobId: job.id, jobPath: `/api/v1/jobs/${job.id}` };
  }

  /** The same without a job, for the invented scenario, which is made before anybody can wait for it. */
  async runNow(request: EstimateRequest, by: Person): Promise<string> {
    const { title, pins } = await this.inputs.resolve(request);
    const id = newId();
    await this.writes.run((transaction) =>
      this.createRun({ id, title, sliceSlug: pins.slice.slug, request, by }, transaction),
    );
    await this.compute(id, () => Promise.resolve(), new AbortController().signal);
    return id;
  }

  private async createRun(
    given: { id: string; title: string; sliceSlug: string; request: EstimateRequest; by: Person },
    transaction: Transaction,
  ): Promise<EstimateRunRow> {
    const { id, title, sliceSlug, request, by } = given;
    const last = await this.runs.max<number | null, EstimateRunRow>('runNumber', { transaction });
    const runNumber = (last ?? 0) + 1;
    const run = await this.runs.create(
      { id, runNumber, title, sliceSlug, request, fieldVersionId: request.fieldVersionId, createdBy: by.id },
      { transaction },
    );
    const summary = `Run ${runNumber} asked for: ${title}`;
    await this.ledger.record(
      {
        actorId: by.id,
        verb: 'request-estimate',
        objectKind: ESTIMATE,
        objectId: id,
        objectTitle: title,
        summary,
        after: request,
      },
      transaction,
    );
    return run;
  }

  private async compute(
    runId: string,
    report: (progress: number, stage: string) => Promise<void>,
    signal: AbortSignal,
  ): Promise<void> {
    const run = (await this.runs.findByPk(runId))!;
    // Taken up again after a stop between the two last steps: the result is there already.
    if (run.versionId !== null && run.versionId !== undefined) return;
    await report(0.05, 'reading the pinned versions');
    const { inputs, pins, title, invented } = await this.inputs.resolve(run.request);
    await report(0.2, `computing ${inputs.ensemble.members} members`);
    const result = labelResult(await this.processes.compute(inputs, signal));
    await report(0.9, 'keeping the result');
    const content: EstimateContent = {
      title,
      invented,
      codeVersion: CODE_VERSION,
      request: run.request,
      pins,
      inputs,
      result,
    };
    await this.writes.run(async (transaction) => {
      signal.throwIfAborted();
      const given = { kind: ESTIMATE, title, ownerId: run.createdBy, content, slug: `run-${run.runNumber}` };
      const { version } = await this.versions.createObject(given, transaction);
      await run.update({ versionId: version.id }, { transaction });
      await this.inheritStaleness(run.fieldVersionId, version.id, transaction);
      await this.ledger.record(
        {
          actorId: run.createdBy,
          verb: 'compute-estimate',
          objectKind: ESTIMATE,
          objectId: run.id,
          objectTitle: title,
          summary: `Run ${run.runNumber} computed: ${title}`,
          after: { checksum: version.checksum },
        },
        transaction,
      );
    });
  }

  /** The field may have become stale while nobody knew of this result, or may have been so before. */
  private async inheritStaleness(
    fieldVersionId: string,
    versionId: string,
    transaction: Transaction,
  ): Promise<void> {
    const { staleReason } = await this.versions.get(fieldVersionId, transaction);
    if (staleReason !== null) await this.versions.markStale([versionId], staleReason, transaction);
  }
}
