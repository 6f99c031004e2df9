import { createHash } from 'node:crypto';
import type { EstimateMethodId, EstimateRequest, EstimateResult } from '@siltlight/common/wire/estimates';
import { ComputingProcesses } from '../src/estimates/computing-processes.service';
import { CODE_VERSION } from '../src/estimates/estimates.service';
import {
  asBytes,
  detailOf,
  done,
  ended,
  ESTIMATES,
  estimated,
  seededField,
  smallRequest,
} from './support/estimating';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
let scientist: SignedInCaller;
let scientist2: SignedInCaller;
beforeAll(async () => {
  service = await testApp({ seeded: true });
  scientist = await signedInAs(service, 'scientist');
  scientist2 = await signedInAs(service, 'scientist2');
});
afterAll(() => service.close());

const METHODS: EstimateMethodId[] = ['thin-layer-daily', 'thin-layer', 'simple-albedo', 'efficiency'];
const codes = ({ cautions }: { cautions: { code: string }[] }) => cautions.map(({ code }) => code);
const efficiency = { method: 'efficiency', shortwaveEfficiencyWm2: -13 } as const;

async function preview(change: Partial<EstimateRequest> = {}): Promise<EstimateResult> {
  const answer = await scientist
    .post(`${ESTIMATES}/preview`, await smallRequest(scientist, change))
    .expect(200);
  return answer.body as EstimateResult;
}

/** Area-weighted sum of the regions and of what lies in none. */
function summed(
  { regions, outside }: EstimateResult,
  part: 'shortwaveWm2' | 'longwaveWm2' | 'netWm2',
): number {
  return regions.reduce(
    (sum, region) => sum + region.areaShare * region.forcing[part].value,
    outside.areaShare * outside.forcing[part].value,
  );
}

test('an estimate is accepted with the address of its job, runs, and gives a result per region and for the globe', async () => {
  const request = await smallRequest(scientist, { title: 'A first look' });
  const accepted = await scientist.post(ESTIMATES, request).expect(202);
  expect(accepted.headers.location).toBe(accepted.body.jobPath);
  const job = await done(scientist, accepted.body.jobPath as string);
  expect(job).toMatchObject({ kind: 'estimate', resultPath: `/estimates/${accepted.body.id}` });
  const detail = await detailOf(scientist, accepted.body.id as string);
  expect(detail).toMatchObject({
    state: 'computed',
    title: 'A first look',
    invented: true,
    stale: false,
    request,
    publishedBy: null,
  });
  expect(detail.netWm2).toEqual(detail.result!.global.forcing.netWm2);
  expect(detail.checksum).toMatch(/^[0-9a-f]{64}$/);
  expect(detail.result!.regions).toHaveLength(58);
  expect(detail.result!.outcomes).toHaveLength(50);
  expect(detail.result!.outcomes).toEqual([...detail.result!.outcomes].sort((a, b) => a - b));
  expect(detail.rights).toEqual({
    maySignOff: false,
    mayWithdraw: false,
    whyNot: expect.stringContaining('second'),
  });
});

test.each(METHODS)(
  'with the method %s the regions and the rest add up to the globe, to 1e-9',
  async (method) => {
    const result = await preview(method === 'efficiency' ? efficiency : { method });
    const shares = result.regions.reduce((sum, { areaShare }) => sum + areaShare, result.outside.areaShare);
    expect(Math.abs(shares - 1)).toBeLessThan(1e-9);
    for (const part of ['shortwaveWm2', 'longwaveWm2', 'netWm2'] as const) {
      const whole = result.global.forcing[part].value;
      expect(Math.abs(summed(result, part) - whole)).toBeLessThanOrEqual(1e-9 * Math.abs(whole));
    }
    expect(result.global.forcing.netWm2.value).toBeCloseTo(
      result.global.forcing.shortwaveWm2.value + result.global.forcing.longwaveWm2.value,
      12,
    );
    for (const { forcing } of result.regions) {
      expect(forcing.netWm2.low!).toBeLessThanOrEqual(forcing.netWm2.high!);
    }
    expect(result.monthly === null).toBe(method === 'thin-layer' || method === 'efficiency');
    expect(codes(result).includes('half-day-per-region')).toBe(method === 'thin-layer');
  },
);

test('forcing and direct effect are apart: their difference is the direct effect of the reference, and the label says which slices', async () => {
  const { global, label } = await preview();
  expect(label).toMatchObject({
    level: 'top of atmosphere',
    sky: 'all sky',
    kind: 'instantaneous, no rapid adjustments',
    sliceName: 'Last Glacial Maximum',
    referenceName: 'Pre-industrial',
  });
  const [slice, reference] = [global.directEffect.netWm2.value, global.directEffectReference.netWm2.value];
  expect(global.forcing.netWm2.value).toBeCloseTo(slice - reference, 12);
  expect(Math.abs(slice)).toBeGreaterThan(Math.abs(global.forcing.netWm2.value));
  expect(global.burdenSliceTg).toBeGreaterThan(global.burdenReferenceTg);
});

test('without longwave the parts say zero, the label says shortwave only, and a caution says how that biases', async () => {
  const off = await preview({ longwave: { on: false, efficiencyWm2: 8 } });
  const on = await preview();
  expect(codes(off)).toContain('longwave-off');
  expect(codes(on)).not.toContain('longwave-off');
  expect(off.label.processes).toContain('shortwave only');
  expect(off.global.forcing.longwaveWm2.value).toBe(0);
  expect(on.global.forcing.longwaveWm2.value).toBeGreaterThan(0);
  expect(off.global.forcing.shortwaveWm2.value).toBe(on.global.forcing.shortwaveWm2.value);
});

test('a preview has the central values of the run', async () => {
  const { result } = await estimated(scientist, { members: 256 });
  const seen = await preview({ members: 256 });
  expect(seen.global.forcing.netWm2.value).toBe(result!.global.forcing.netWm2.value);
  expect(seen.regions.map(({ forcing }) => forcing.netWm2.value)).toEqual(
    result!.regions.map(({ forcing }) => forcing.netWm2.value),
  );
  expect(seen.monthly).toEqual(result!.monthly);
});

const REFUSED: [string, object, field: string][] = [
  ['a transmittance above 1', { transmittance: 1.2 }, 'transmittance'],
  ['a transmittance as text', { transmittance: '0.76' }, 'transmittance'],
  ['a missing method', { method: undefined }, 'method'],
  ['a method that does not exist', { method: 'guess' }, 'method'],
  ['too few members', { members: 3 }, 'members'],
  ['too many members', { members: 1e6 }, 'members'],
  ['a seed below zero', { seed: -1 }, 'seed'],
  ['a missing seed', { seed: undefined }, 'seed'],
  [
    'a longwave efficiency beyond all bounds',
    { longwave: { on: true, efficiencyWm2: 900 } },
    'efficiencyWm2',
  ],
  ['an efficiency method without its efficiency', { method: 'efficiency' }, 'shortwaveEfficiencyWm2'],
  ['an unknown field', { fieldVersionId: 'nowhere' }, 'fieldVersionId'],
  ['an unknown optical set', { opticalSetVersionId: 'nowhere' }, 'opticalSetVersionId'],
  ['an unknown backdrop', { backdropVersionId: 'nowhere' }, 'backdropVersionId'],
];

test.each(REFUSED)('%s is refused and named, by the run and by the preview', async (_what, change, field) => {
  const request = { ...(await smallRequest(scientist)), ...change };
  for (const path of [ESTIMATES, `${ESTIMATES}/preview`]) {
    const refused = await scientist.post(path, request).expect(422);
    expect(refused.headers['content-type']).toContain('application/problem+json');
    expect(refused.body.errors[0].pointer).toMatch(new RegExp(`/${field}$`));
    expect(refused.body.errors[0].message.length).toBeGreaterThan(10);
  }
});

test('a version of another kind in the wrong place is refused under its field, and so is a field that is not asked for', async () => {
  const request = await smallRequest(scientist);
  const swapped = { ...request, fieldVersionId: request.backdropVersionId };
  const refused = await scientist.post(ESTIMATES, swapped).expect(422);
  expect(refused.body.errors[0]).toMatchObject({
    pointer: '/fieldVersionId',
    value: request.backdropVersionId,
  });
  await scientist.post(ESTIMATES, { ...request, state: 'published' }).expect(422);
});

const EDGES: [string, Partial<EstimateRequest>][] = [
  ['least transmittance', { transmittance: 0.3 }],
  ['full transmittance', { transmittance: 1 }],
  ['least longwave', { longwave: { on: true, efficiencyWm2: -20 } }],
  ['most longwave', { longwave: { on: true, efficiencyWm2: 60 } }],
  ['the most cooling efficiency', { method: 'efficiency', shortwaveEfficiencyWm2: -150 }],
  ['a warming efficiency', { method: 'efficiency', shortwaveEfficiencyWm2: 150, members: 2048 }],
  ['the largest seed', { seed: 4_294_967_295 }],
];
test.each(EDGES)('%s is computed without a gap in the numbers', async (_what, change) => {
  const text = JSON.stringify((await preview(change)).regions);
  expect(text).not.toContain('"value":null');
});

test('the same request twice gives the same bytes, and run again gives them a third time', async () => {
  const first = await estimated(scientist, { seed: 99 });
  const second = await estimated(scientist2, { seed: 99 });
  expect(second.id).not.toBe(first.id);
  expect(second.checksum).toBe(first.checksum);
  const again = await scientist.post(`${ESTIMATES}/${first.id}/run-again`).expect(202);
  expect(again.headers.location).toBe(again.body.jobPath);
  await done(scientist, again.body.jobPath as string);
  const third = await detailOf(scientist, again.body.id as string);
  expect(third.checksum).toBe(first.checksum);
  expect(third.runNumber).toBeGreaterThan(second.runNumber);
  expect((await estimated(scientist, { seed: 100 })).checksum).not.toBe(first.checksum);
});

test('the run record is the canonical content: its SHA-256 is the checksum, and it pins what the run rests on', async () => {
  const detail = await estimated(scientist);
  const record = await scientist
    .get(`${ESTIMATES}/${detail.id}/run-record`)
    .buffer(true)
    .parse(asBytes)
    .expect(200);
  const bytes = record.body as Buffer;
  expect(createHash('sha256').update(bytes).digest('hex')).toBe(detail.checksum);
  expect(record.headers['x-checksum-sha256']).toBe(detail.checksum);
  expect(record.headers['content-disposition']).toContain(`siltlight-run-${detail.runNumber}.json`);
  const content = JSON.parse(bytes.toString('utf8'));
  expect(content).toMatchObject({
    codeVersion: CODE_VERSION,
    request: detail.request,
    result: detail.result,
  });
  const field = await seededField(scientist);
  expect(content.pins.field).toMatchObject({ versionId: field.versionId, checksum: field.checksum });
  expect(content.pins.datasetVersions).toEqual(
    field.datasetVersions.map(({ versionId, checksum }) => ({ versionId, checksum })),
  );
  for (const pin of ['slice', 'reference', 'opticalSet', 'backdrop']) {
    expect(content.pins[pin].checksum).toMatch(/^[0-9a-f]{64}$/);
  }
});

test('beside the estimate stand the greenhouse forcing and the published values, those of another kind with the reason', async () => {
  const { context } = await estimated(scientist);
  // Meinshausen 2020 for 190 ppm, 375 ppb, 200 ppb against 284.3, 808.2, 273: about −2.8 W m⁻² (checked in common).
  expect(context.greenhouse!.valueWm2).toBeGreaterThan(-3.2);
  expect(context.greenhouse!.valueWm2).toBeLessThan(-2.4);
  const same = context.published.filter(({ otherKind }) => otherKind === null);
  expect(same).toMatchObject([{ id: 'P21', valueWm2: -1, evidence: 'from memory' }]);
  expect(context.published.find(({ id }) => id === 'P02')!.otherKind).toContain('direct radiative effect');
  expect(context.published.map(({ id }) => id)).not.toContain('P22');
});

test('a job that is cancelled gives no result, and its estimate says so', async () => {
  const request = await smallRequest(scientist, { members: 4096 });
  const accepted = await Promise.all(
    [1, 2, 3, 4].map((seed) => scientist.post(ESTIMATES, { ...request, seed }).expect(202)),
  );
  const last = accepted.at(-1)!.body as { id: string; jobPath: string };
  expect((await scientist.post(`${last.jobPath}/cancel`).expect(200)).body.state).toBe('cancelled');
  const detail = await detailOf(scientist, last.id);
  expect(detail).toMatchObject({ state: 'cancelled', result: null, checksum: null });
  const record = await scientist.get(`${ESTIMATES}/${last.id}/run-record`).expect(409);
  expect(record.body.code).toBe('not-computed');
  for (const { body } of accepted.slice(0, -1)) await ended(scientist, body.jobPath as string);
  expect((await detailOf(scientist, last.id)).state).toBe('cancelled');
});

test('the computing process tells a refusal by name, ends on an abort, and goes on afterwards', async () => {
  const detail = await estimated(scientist);
  const { inputs, result } = (await scientist.get(`${ESTIMATES}/${detail.id}/run-record`).expect(200)).body;
  const processes = service.app.get(ComputingProcesses, { strict: false });
  const never = new AbortController().signal;
  await expect(processes.compute({ ...inputs, transmittance: 1.2 }, never)).rejects.toMatchObject({
    name: 'DomainError',
    field: 'transmittance',
    value: 1.2,
    allowed: [0, 1],
  });
  const abort = new AbortController();
  const cut = processes.compute(inputs, abort.signal);
  abort.abort(new Error('cut short'));
  await expect(cut).rejects.toThrow('cut short');
  await expect(processes.compute(inputs, abort.signal)).rejects.toThrow('cut short');
  const both = await Promise.all([processes.compute(inputs, never), processes.compute(inputs, never)]);
  for (const { global } of both) expect(global).toEqual(result.global);
});

test('lists come in pages, newest first, and can be narrowed to a slice and a state', async () => {
  const first = (await scientist.get(`${ESTIMATES}?limit=2`).expect(200)).body;
  expect(first.items).toHaveLength(2);
  const numbers: number[] = first.items.map(({ runNumber }: { runNumber: number }) => runNumber);
  const next = (await scientist.get(`${ESTIMATES}?limit=200&cursor=${first.nextCursor}`).expect(200)).body;
  numbers.push(...next.items.map(({ runNumber }: { runNumber: number }) => runNumber));
  expect(numbers).toHaveLength(first.total);
  expect(numbers).toEqual([...numbers].sort((a, b) => b - a));
  const narrowed = (await scientist.get(`${ESTIMATES}?slice=mis-2&state=published`).expect(200)).body;
  expect(narrowed.items).toMatchObject([{ sliceSlug: 'mis-2', state: 'published' }]);
  await scientist.get(`${ESTIMATES}?cursor=none`).expect(422);
  await scientist.get(`${ESTIMATES}?state=guess`).expect(422);
});
