import type { JobSummary } from '@siltlight/common/wire/jobs';
import type {
  BackdropView,
  EstimateDetail,
  EstimateRequest,
  OpticalSetView,
} from '@siltlight/common/wire/estimates';
import type { ExportFormat, ExportSummary } from '@siltlight/common/wire/exports';
import type { FieldDetail } from '@siltlight/common/wire/slices';
import type { Response } from 'supertest';
import type { SignedInCaller } from './sign-in';

export const ESTIMATES = '/api/v1/estimates';
export const EXPORTS = '/api/v1/exports';

/** Asks after a job until it has ended, as a client does. */
export async function ended(caller: SignedInCaller, jobPath: string): Promise<JobSummary> {
  for (let tries = 0; tries < 1200; tries += 1) {
    const job = (await caller.get(jobPath).expect(200)).body as JobSummary;
    if (['done', 'failed', 'cancelled'].includes(job.state)) return job;
    await new Promise((later) => setTimeout(later, 50));
  }
  throw new Error('The job did not end within a minute.');
}

export async function done(caller: SignedInCaller, jobPath: string): Promise<JobSummary> {
  const job = await ended(caller, jobPath);
  expect(job).toMatchObject({ state: 'done', progress: 1, error: null });
  return job;
}

export async function seededField(caller: SignedInCaller, slice = 'lgm'): Promise<FieldDetail> {
  const { items } = (await caller.get(`/api/v1/fields?slice=${slice}`).expect(200)).body;
  return items.at(-1) as FieldDetail;
}

/** A small run, to be changed where a test needs it otherwise. */
export async function smallRequest(
  caller: SignedInCaller,
  change: Partial<EstimateRequest> = {},
): Promise<EstimateRequest> {
  const sets = (await caller.get('/api/v1/optical-sets').expect(200)).body.items as OpticalSetView[];
  const backdrops = (await caller.get('/api/v1/backdrops').expect(200)).body.items as BackdropView[];
  return {
    fieldVersionId: change.fieldVersionId ?? (await seededField(caller)).versionId,
    opticalSetVersionId: sets.find(({ slug }) => slug === 'dust-broadband')!.versionId,
    backdropVersionId: backdrops[0]!.versionId,
    method: 'thin-layer-daily',
    transmittance: 0.76,
    longwave: { on: true, efficiencyWm2: 8 },
    members: 64,
    seed: 7,
    ...change,
  };
}

export const detailOf = async (caller: SignedInCaller, id: string): Promise<EstimateDetail> =>
  (await caller.get(`${ESTIMATES}/${id}`).expect(200)).body as EstimateDetail;

/** Runs an estimate to its end. */
export async function estimated(
  caller: SignedInCaller,
  change: Partial<EstimateRequest> = {},
): Promise<EstimateDetail> {
  const accepted = await caller.post(ESTIMATES, await smallRequest(caller, change)).expect(202);
  await done(caller, accepted.body.jobPath as string);
  return detailOf(caller, accepted.body.id as string);
}

export interface ExportedFile {
  summary: ExportSummary;
  bytes: Buffer;
  headers: Record<string, string>;
}

export async function exported(
  caller: SignedInCaller,
  estimateId: string,
  format: ExportFormat,
): Promise<ExportedFile> {
  const accepted = await caller.post(EXPORTS, { estimateId, format }).expect(202);
  await done(caller, accepted.body.jobPath as string);
  const path = `${EXPORTS}/${accepted.body.id}`;
  const summary = (await caller.get(path).expect(200)).body as ExportSummary;
  const file = await caller.get(`${path}/file`).buffer(true).parse(asBytes).expect(200);
  return { summary, bytes: file.body as Buffer, headers: file.headers };
}

/** Takes an answer as bytes, whatever its type. */
export function asBytes(answer: Response, finish: (error: Error | null, body: Buffer) => void): void {
  const parts: Buffer[] = [];
  const stream = answer as unknown as NodeJS.ReadableStream;
  stream.on('data', (part: Buffer) => parts.push(part));
  stream.on('end', () => finish(null, Buffer.concat(parts)));
}
