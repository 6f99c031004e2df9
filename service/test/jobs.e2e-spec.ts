import * as fs from 'node:fs/promises';
import * as os from 'node:os';
import * as path from 'node:path';
import { DomainError } from '@siltlight/common/physical/domain-error';
import { WriteQueue } from '../src/database/write-queue';
import type { RunJob } from '../src/jobs/job-runner';
import { JobsService } from '../src/jobs/jobs.service';
import { JobRow } from '../src/jobs/models/job-row';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
let jobs: JobsService;
let scientist: SignedInCaller;
let personId: string;
beforeAll(async () => {
  service = await testApp({ seeded: true });
  jobs = service.app.get(JobsService);
  scientist = await signedInAs(service, 'scientist');
  personId = scientist.person.id;
});
afterAll(() => service.close());

let kinds = 0;
function kindThat(run: RunJob): string {
  kinds += 1;
  jobs.register(`test-${kinds}`, run);
  return `test-${kinds}`;
}

const ask = (kind: string, more: object = {}) =>
  jobs.request({ kind, personId, payload: { n: 1 }, title: 'A test', ...more });

async function ended(id: string, caller = scientist) {
  for (;;) {
    const { body } = await caller.get(`/api/v1/jobs/${id}`).expect(200);
    if (!['queued', 'running'].includes(body.state)) return body;
    await pause();
  }
}

const pause = () => new Promise((resolve) => setTimeout(resolve, 20));

/** Runs until it is cancelled. */
const patient: RunJob = (_job, _report, signal) =>
  new Promise((_resolve, reject) => signal.addEventListener('abort', () => reject(signal.reason as Error)));

test('a job is done once, with its payload, and tells where its result is', async () => {
  const seen: unknown[] = [];
  const kind = kindThat(async (job, report) => {
    seen.push(job);
    await report(0.5, 'half way');
    return { resultPath: '/estimates/7' };
  });
  const { id, state } = await ask(kind);
  expect(state).toBe('queued');
  expect(await ended(id)).toMatchObject({
    state: 'done',
    progress: 1,
    stage: 'half way',
    resultPath: '/estimates/7',
    error: null,
  });
  expect(seen).toEqual([{ id, payload: { n: 1 }, personId }]);
});

test('progress never falls and stays within 0 and 1', async () => {
  const written: number[] = [];
  const kind = kindThat(async ({ id }, report) => {
    for (const [index, value] of [0.6, 0.2, NaN, 7].entries()) {
      await report(value, `stage ${index}`);
      written.push((await JobRow.findByPk(id))!.progress);
    }
  });
  await ended((await ask(kind)).id);
  expect(written).toEqual([0.6, 0.6, 0.6, 1]);
});

test('a failure for a reason that people can mend is told; another one only by its reference', async () => {
  const wrong = new DomainError('outside-range', {
    field: 'ageKaBp',
    value: -1,
    unit: 'ka BP',
    allowed: [0, 800],
  });
  const told = await ended((await ask(kindThat(() => Promise.reject(wrong)))).id);
  expect(told).toMatchObject({
    state: 'failed',
    error: 'ageKaBp is -1 ka BP; it must lie within 0 to 800 ka BP.',
  });
  const hidden = await ended((await ask(kindThat(() => Promise.reject(new Error('inner secret'))))).id);
  expect(hidden.error).not.toContain('inner secret');
  const reference = /reference ([0-9a-f-]+)/.exec(hidden.error)![1];
  expect(service.logged).toContainEqual(expect.objectContaining({ event: 'job-failed', reference }));
});

test('a job can be cancelled at once, and what it still brings is dropped', async () => {
  let finish = (_value: unknown) => {};
  const stubborn = kindThat(() => new Promise((resolve) => (finish = resolve)));
  const { id } = await ask(stubborn);
  await scientist.post(`/api/v1/jobs/${id}/cancel`).expect(200);
  finish({ resultPath: '/too-late' });
  expect(await ended(id)).toMatchObject({ state: 'cancelled', resultPath: null });
  await scientist.post(`/api/v1/jobs/${id}/cancel`).expect(200);
});

test('a job that has finished cannot be cancelled', async () => {
  const { id } = await ask(kindThat(() => Promise.resolve(null)));
  await ended(id);
  expect((await scientist.post(`/api/v1/jobs/${id}/cancel`).expect(409)).body.code).toBe('job-finished');
});

test('the same request twice while it is open is one job, and afterwards a new one', async () => {
  const kind = kindThat(patient);
  const [first, second] = await Promise.all([ask(kind, { dedupeKey: 'k' }), ask(kind, { dedupeKey: 'k' })]);
  expect(second.id).toBe(first.id);
  await scientist.post(`/api/v1/jobs/${first.id}/cancel`).expect(200);
  const third = await ask(kind, { dedupeKey: 'k' });
  expect(third.id).not.toBe(first.id);
  await scientist.post(`/api/v1/jobs/${third.id}/cancel`).expect(200);
});

test('a job asked for in a write that fails never exists', async () => {
  const run = jest.fn(() => Promise.resolve(null));
  const kind = kindThat(run);
  const failing = service.app.get(WriteQueue).run(async (transaction) => {
    await jobs.request({ kind, personId, payload: null, title: 'Never' }, transaction);
    throw new Error('the act failed');
  });
  await expect(failing).rejects.toThrow('the act failed');
  expect(await JobRow.count({ where: { kind } })).toBe(0);
  expect(run).not.toHaveBeenCalled();
});

test('others do not learn that a job exists; administrators see it', async () => {
  const { id } = await ask(kindThat(() => Promise.resolve(null)));
  await ended(id);
  const other = await signedInAs(service, 'scientist2');
  await other.get(`/api/v1/jobs/${id}`).expect(404);
  await other.post(`/api/v1/jobs/${id}/cancel`).expect(404);
  expect((await other.get('/api/v1/jobs').expect(200)).body).toEqual({
    items: [],
    nextCursor: null,
    total: 0,
  });
  await (await signedInAs(service, 'admin')).get(`/api/v1/jobs/${id}`).expect(200);
  await service.stranger().get('/api/v1/jobs').expect(401);
  const page = await scientist.get('/api/v1/jobs?limit=1').expect(200);
  expect(page.body.items[0].id).toBe(id);
});

test("nobody waits behind another person's long list", async () => {
  const order: string[] = [];
  const gates: (() => void)[] = [];
  const kind = kindThat((job) => {
    order.push(job.personId);
    return new Promise<null>((resolve) => gates.push(() => resolve(null)));
  });
  const many = [];
  for (let count = 0; count < 4; count += 1) many.push(await ask(kind, { personId: 'busy' }));
  await ask(kind, { personId: 'late' });
  while (order.length < 5) {
    gates.shift()?.();
    await pause();
  }
  gates.forEach((open) => open());
  expect(order.indexOf('late')).toBeLessThan(4);
});

test('what ran when the service ended is taken up again, and given up after three deaths', async () => {
  const dataDir = await fs.mkdtemp(path.join(os.tmpdir(), 'siltlight-jobs-'));
  const first = await testApp({ dataDir });
  first.app.get(JobsService).register('long', patient);
  const base = { kind: 'long', title: 'Long', personId: 'p', payload: {} };
  const { id } = await first.app.get(JobsService).request(base);
  while ((await JobRow.findByPk(id))!.state !== 'running') await pause();
  const dead = await first.app
    .get(WriteQueue)
    .run((transaction) => JobRow.create({ ...base, state: 'cancelled', attempts: 3 }, { transaction }));
  await first.close();

  const second = await testApp({ dataDir });
  // An orderly stop is no death: the job is queued again and its attempt does not count. Here it has no runner.
  while (['queued', 'running'].includes((await JobRow.findByPk(id))!.state)) await pause();
  expect(await JobRow.findByPk(id)).toMatchObject({ state: 'failed', attempts: 1 });
  await second.app
    .get(WriteQueue)
    .run((transaction) => JobRow.update({ state: 'running' }, { where: { id: dead.id }, transaction }));
  await second.close();

  const third = await testApp({ dataDir });
  expect(await JobRow.findByPk(dead.id)).toMatchObject({ state: 'failed', attempts: 3 });
  await third.close();
  await fs.rm(dataDir, { recursive: true });
});
