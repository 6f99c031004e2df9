import type { ColumnSlice, SliceDetail } from '@siltlight/common/wire/slices';
import { estimated } from './support/estimating';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
let scientist: SignedInCaller;
let modeller: SignedInCaller;
beforeAll(async () => {
  service = await testApp({ seeded: true });
  scientist = await signedInAs(service, 'scientist');
  modeller = await signedInAs(service, 'modeller');
});
afterAll(() => service.close());

const columnOf = async () =>
  (await modeller.get('/api/v1/slices/column').expect(200)).body.items as ColumnSlice[];
const sliceOf = async (caller: SignedInCaller, slug: string) =>
  (await caller.get(`/api/v1/slices/${slug}`).expect(200)).body as SliceDetail;

test('the column runs from the youngest slice down, its Stages next to one another without an overlap', async () => {
  const column = await columnOf();
  expect(column[0]).toMatchObject({ slug: 'pre-industrial', label: 'PI', latestNetWm2: null, stale: false });
  const stages = column.filter(({ slug }) => /^mis-\d$/.test(slug));
  expect(stages.map(({ label }) => label)).toEqual(['MIS 2', 'MIS 3', 'MIS 4', 'MIS 5', 'MIS 6']);
  for (const [index, stage] of stages.entries()) {
    if (index > 0) expect(stage.youngKa).toBe(stages[index - 1]!.oldKa);
  }
});

test('a slice inside a Stage is a lens in it; one that crosses its edge stands in the first lane', async () => {
  const parents = new Map((await columnOf()).map(({ slug, parentSlug }) => [slug, parentSlug]));
  expect(parents.get('lgm')).toBe('mis-2');
  expect(parents.get('last-interglacial')).toBe('mis-5');
  expect(parents.get('penultimate-glacial-maximum')).toBe('mis-6');
  expect(parents.get('mis-2')).toBeNull();
  expect(parents.get('pre-industrial')).toBeNull();
});

test('a slice has window and orbital age apart, its reference, its records, fields and estimates', async () => {
  const lgm = await sliceOf(modeller, 'lgm');
  expect(lgm.content).toMatchObject({ windowYoungKa: 19, windowOldKa: 23, orbitalAgeKa: 21 });
  expect(lgm.reference).toMatchObject({ slug: 'pre-industrial' });
  expect(lgm.records.length).toBeGreaterThanOrEqual(27);
  for (const { sampleCount, coverage, meanFluxGM2Yr, regionCode } of lgm.records) {
    expect(sampleCount).toBeGreaterThan(0);
    expect(coverage).toBeGreaterThan(0);
    expect(coverage).toBeLessThanOrEqual(1);
    expect(meanFluxGM2Yr!).toBeGreaterThan(0);
    expect(regionCode).not.toBeNull();
  }
  expect(lgm.fields).toMatchObject([{ way: 'regional-scaling', stale: false }]);
  expect(lgm.estimates).toMatchObject([{ state: 'published' }]);
});

test('an estimate that is not published shows on the slice to those who may see it alone', async () => {
  const { id } = await estimated(scientist);
  const seenBy = async (caller: SignedInCaller) =>
    (await sliceOf(caller, 'lgm')).estimates.map((run) => run.id);
  expect(await seenBy(scientist)).toContain(id);
  expect(await seenBy(modeller)).not.toContain(id);
});

test('the reference itself has no reference, and an unknown slice is not found', async () => {
  expect((await sliceOf(modeller, 'pre-industrial')).reference).toBeNull();
  const missing = await modeller.get('/api/v1/slices/no-such-slice').expect(404);
  expect(missing.body.code).toBe('not-found');
});
