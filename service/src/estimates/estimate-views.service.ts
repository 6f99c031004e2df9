import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { EstimateDetail, EstimateSummary, estimateState } from '@siltlight/common/wire/estimates';
import { Op } from 'sequelize';
import type { z } from 'zod';
import type { Person } from '../auth/policy';
import { FieldsService } from '../fields/fields.service';
import { notFound } from '../http/problem';
import { JobStates } from '../jobs/job-states.service';
import { OpticalSetsService } from '../optics/optical-sets.service';
import { BackdropsService } from '../backdrops/backdrops.service';
import { PeopleService } from '../users/people.service';
import type { Version } from '../versions/version';
import { VersionsService } from '../versions/versions.service';
import type { EstimateContent } from './estimate-content';
import { EstimateContext } from './estimate-context.service';
import { EstimateRunRow } from './models/estimate-run-row';

type State = z.infer<typeof estimateState>;

export interface LoadedRun {
  run: EstimateRunRow;
  version: Version<EstimateContent> | null;
  state: State;
}

/** Estimates as people read them. */
@Injectable()
export class EstimateViews {
  constructor(
    @InjectModel(EstimateRunRow) private readonly runs: typeof EstimateRunRow,
    private readonly versions: VersionsService,
    private readonly jobStates: JobStates,
    private readonly fields: FieldsService,
    private readonly sets: OpticalSetsService,
    private readonly backdrops: BackdropsService,
    private readonly context: EstimateContext,
    private readonly people: PeopleService,
  ) {}

  /** Published ones are for everybody; others for their author and for those who may sign off. */
  async load(id: string, reader: Person): Promise<LoadedRun> {
    const run = await this.runs.findByPk(id);
    const loaded = run && (await this.withVersion(run));
    if (!loaded || !maySee(loaded, reader)) throw notFound('Estimate', id);
    return loaded;
  }

  /** For work of the service itself, on behalf of somebody who was allowed to ask for it. */
  async byId(id: string): Promise<LoadedRun> {
    const run = await this.runs.findByPk(id);
    if (!run) throw notFound('Estimate', id);
    return this.withVersion(run);
  }

  async withVersion(run: EstimateRunRow): Promise<LoadedRun> {
    if (run.versionId) {
      const version = await this.versions.get<EstimateContent>(run.versionId);
      return { run, version, state: version.state === 'draft' ? 'computed' : version.state };
    }
    const state = run.jobId ? await this.jobStates.of(run.jobId) : 'failed';
    // A job that ended without a result has nothing to show: done is said only with one.
    return { run, version: null, state: state === 'done' ? 'failed' : state };
  }

  /** Newest first, as far as the reader may see. */
  async newest(where: { sliceSlug?: string }, reader: Person, limit = 500): Promise<LoadedRun[]> {
    const rows = await this.runs.findAll({ where, order: [['runNumber', 'DESC']], limit });
    const loaded = await Promise.all(rows.map((run) => this.withVersion(run)));
    return loaded.filter((entry) => maySee(entry, reader));
  }

  async ofFields(fieldVersionIds: string[]): Promise<LoadedRun[]> {
    const where = { fieldVersionId: fieldVersionIds, versionId: { [Op.ne]: null } };
    const rows = await this.runs.findAll({ where, order: [['runNumber', 'ASC']] });
    return Promise.all(rows.map((run) => this.withVersion(run)));
  }

  async summary({ run, version, state }: LoadedRun): Promise<EstimateSummary> {
    const field = await this.fields.get(run.fieldVersionId);
    return {
      id: run.id,
      runNumber: run.runNumber,
      title: run.title,
      state,
      sliceSlug: run.sliceSlug,
      sliceName: field.content.slice.name,
      referenceName: field.content.reference.name,
      method: run.request.method,
      netWm2: version?.content.result.global.forcing.netWm2 ?? null,
      stale: (version?.staleSince ?? null) !== null,
      staleReason: version?.staleReason ?? null,
      invented: field.content.invented,
      createdBy: await this.people.mark(run.createdBy),
      createdAt: run.createdAt,
      publishedBy: version?.publishedBy ? await this.people.mark(version.publishedBy) : null,
      publishedAt: version?.publishedAt ?? null,
    };
  }

  async detail(loaded: LoadedRun, reader: Person): Promise<EstimateDetail> {
    const { run, version } = loaded;
    const field = await this.fields.get(run.fieldVersionId);
    const [opticalSet, backdrop] = await Promise.all([
      this.sets.get(run.request.opticalSetVersionId),
      this.backdrops.get(run.request.backdropVersionId),
    ]);
    return {
      ...(await this.summary(loaded)),
      jobId: run.jobId ?? null,
      checksum: version?.checksum ?? null,
      request: run.request,
      fieldTitle: field.content.title,
      opticalSetTitle: `${opticalSet.title}, version ${opticalSet.number}`,
      backdropTitle: `${backdrop.title}, version ${backdrop.number}`,
      result: version?.content.result ?? null,
      context: await this.context.of(
        field.content.slice.versionId,
        field.content.reference.versionId,
        run.request.longwave.on,
      ),
      rights: rightsOf(loaded, reader),
    };
  }
}

const SIGNERS = ['scientist', 'steward'] as const;
const isSigner = ({ roles }: Person) => SIGNERS.some((role) => roles.includes(role));

function maySee({ run, state }: LoadedRun, reader: Person): boolean {
  const isOut = state === 'published' || state === 'superseded' || state === 'withdrawn';
  return isOut || run.createdBy === reader.id || (state === 'computed' && isSigner(reader));
}

function rightsOf({ run, state }: LoadedRun, reader: Person): EstimateDetail['rights'] {
  const own = run.createdBy === reader.id;
  const maySignOff = state === 'computed' && !own && isSigner(reader);
  return {
    maySignOff,
    mayWithdraw: state === 'published' && (own || reader.roles.includes('steward')),
    whyNot: state === 'computed' && own ? 'Yours: a second person signs it off.' : null,
  };
}
