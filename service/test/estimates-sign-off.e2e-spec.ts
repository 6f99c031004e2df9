import type { DatasetSummary } from '@siltlight/common/wire/datasets';
import type { EstimateDetail, EstimateSummary } from '@siltlight/common/wire/estimates';
import type { LedgerEntryView } from '@siltlight/common/wire/ledger';
import type { ColumnSlice, FieldDetail } from '@siltlight/common/wire/slices';
import { demoSheetText } from '../src/demo/demo-sheet-text';
import { demoSheets } from '../src/demo/demo-sites';
import { detailOf, ESTIMATES, estimated, seededField } from './support/estimating';
import { mailsOf } from './support/mailed-links';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import { approved } from './support/submitting';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
let scientist: SignedInCaller;
let scientist2: SignedInCaller;
let steward: SignedInCaller;
let steward2: SignedInCaller;
let modeller: SignedInCaller;
beforeAll(async () => {
  service = await testApp({ seeded: true });
  scientist = await signedInAs(service, 'scientist');
  scientist2 = await signedInAs(service, 'scientist2');
  steward = await signedInAs(service, 'steward');
  steward2 = await signedInAs(service, 'steward2');
  modeller = await signedInAs(service, 'modeller');
});
afterAll(() => service.close());

const stratum = async (slug: string) => {
  const { items } = (await modeller.get('/api/v1/slices/column').expect(200)).body;
  return (items as ColumnSlice[]).find((slice) => slice.slug === slug)!;
};
const ledgerOf = async (id: string) =>
  (await steward.get(`/api/v1/ledger?objectKind=estimate&objectId=${id}`).expect(200)).body
    .items as LedgerEntryView[];
const sign = (caller: SignedInCaller, { id }: EstimateDetail) => caller.post(`${ESTIMATES}/${id}/sign-off`);
const withdraw = (caller: SignedInCaller, { id }: EstimateDetail, body: object) =>
  caller.post(`${ESTIMATES}/${id}/withdraw`, body);

test('the author does not sign off; a second person does, once, and the stratum takes the new colour', async () => {
  const mails = mailsOf(service);
  const estimate = await estimated(scientist, { longwave: { on: true, efficiencyWm2: 3 } });
  const before = await stratum('lgm');
  const own = await sign(scientist, estimate).expect(403);
  expect(own.body).toMatchObject({ code: 'four-eyes' });
  expect((await detailOf(scientist2, estimate.id)).rights).toMatchObject({ maySignOff: true });

  const answers = await Promise.all([sign(scientist2, estimate), sign(steward, estimate)]);
  expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  expect(answers.find(({ status }) => status === 409)!.body.code).toBe('wrong-state');
  expect((await sign(steward2, estimate).expect(409)).body.code).toBe('wrong-state');

  const published = await detailOf(modeller, estimate.id);
  expect(published).toMatchObject({
    state: 'published',
    checksum: estimate.checksum,
    result: estimate.result,
  });
  expect(published.publishedBy!.id).not.toBe(scientist.person.id);
  const after = await stratum('lgm');
  expect(after.latestNetWm2).toBe(estimate.netWm2!.value);
  expect(after.latestNetWm2).not.toBe(before.latestNetWm2);

  const acts = (await ledgerOf(estimate.id)).map(({ verb, actor }) => [verb, actor!.id]);
  expect(acts).toEqual([
    ['sign-off-estimate', published.publishedBy!.id],
    ['compute-estimate', scientist.person.id],
    ['request-estimate', scientist.person.id],
  ]);
  expect(mails.filter(({ mailKind }) => mailKind === 'estimate-published')).toMatchObject([
    { toPersonId: scientist.person.id, linkPath: `/estimates/${estimate.id}` },
  ]);
  expect((await steward.get('/api/v1/ledger/verify').expect(200)).body.intact).toBe(true);
});

test('who may not see an estimate cannot tell that it exists; once it is published, everybody sees it', async () => {
  const estimate = await estimated(scientist, { seed: 2 });
  for (const path of ['', '/run-record']) {
    const hidden = await modeller.get(`${ESTIMATES}/${estimate.id}${path}`).expect(404);
    const missing = await modeller.get(`${ESTIMATES}/nowhere${path}`).expect(404);
    expect(hidden.body.title).toBe(missing.body.title);
  }
  const listed = async () =>
    ((await modeller.get(`${ESTIMATES}?limit=200`).expect(200)).body.items as EstimateSummary[]).map(
      ({ id }) => id,
    );
  expect(await listed()).not.toContain(estimate.id);
  await detailOf(steward, estimate.id);
  await sign(steward, estimate).expect(200);
  expect(await listed()).toContain(estimate.id);
  const seen = await detailOf(modeller, estimate.id);
  expect(seen.rights).toEqual({ maySignOff: false, mayWithdraw: false, whyNot: null });
});

test('an estimate is withdrawn with a reason, by its author or a steward, stays readable, and leaves the column', async () => {
  const mails = mailsOf(service);
  const before = await stratum('lgm');
  const estimate = await estimated(scientist, { seed: 3, longwave: { on: true, efficiencyWm2: 20 } });
  expect((await withdraw(scientist, estimate, { reason: 'too early' }).expect(409)).body.code).toBe(
    'wrong-state',
  );
  await sign(scientist2, estimate).expect(200);
  expect((await stratum('lgm')).latestNetWm2).toBe(estimate.netWm2!.value);

  const empty = await withdraw(steward, estimate, {}).expect(422);
  expect(empty.body.errors[0].pointer).toBe('/reason');
  expect((await withdraw(scientist2, estimate, { reason: 'not mine' }).expect(403)).body.code).toBe(
    'not-yours',
  );
  await withdraw(steward, estimate, { reason: 'The backdrop was wrong.' }).expect(200);
  expect((await detailOf(modeller, estimate.id)).state).toBe('withdrawn');
  expect((await stratum('lgm')).latestNetWm2).toBe(before.latestNetWm2);
  expect((await ledgerOf(estimate.id))[0]!.summary).toContain('The backdrop was wrong.');
  expect(mails.filter(({ mailKind }) => mailKind === 'estimate-withdrawn')).toMatchObject([
    { toPersonId: scientist.person.id, lines: expect.arrayContaining(['The backdrop was wrong.']) },
  ]);
  expect((await sign(scientist2, estimate).expect(409)).body.detail).toContain('withdrawn');
});

test('a superseded dataset version makes its fields and estimates stale, with the reason, wherever they show', async () => {
  const field = await seededField(scientist);
  const unpublished = await estimated(scientist, { seed: 4 });
  const { items } = (await scientist.get('/api/v1/datasets').expect(200)).body;
  const ice = (items as DatasetSummary[]).find(({ archive }) => archive === 'ice')!;
  expect((await stratum('lgm')).stale).toBe(false);
  const sheet = demoSheets.find(({ archive }) => archive === 'ice')!;
  const shorter = { ...sheet, sites: sheet.sites.slice(0, 2) };
  await approved(scientist2, steward, demoSheetText(shorter), 'ice_again.csv', { datasetSlug: ice.slug });

  const stale = (await scientist.get(`/api/v1/fields/${field.versionId}`).expect(200)).body as FieldDetail;
  expect(stale.stale).toBe(true);
  expect(stale.staleReason).toMatch(/version 1 was superseded by version 2/);
  expect(await detailOf(scientist, unpublished.id)).toMatchObject({
    stale: true,
    staleReason: stale.staleReason,
  });
  expect((await stratum('lgm')).stale).toBe(true);
  const desk = (await scientist.get('/api/v1/desk').expect(200)).body;
  expect(desk.stale.map(({ sliceSlug }: EstimateSummary) => sliceSlug)).toContain('lgm');
  const old = (await scientist.get(`/api/v1/datasets/${ice.slug}/versions/1`).expect(200)).body;
  expect(old.usedBy.length).toBeGreaterThanOrEqual(2);
  expect(old.usedBy.filter(({ stale: marked }: { stale: boolean }) => !marked)).toEqual([]);

  const later = await estimated(scientist, { seed: 5, fieldVersionId: field.versionId });
  expect(later).toMatchObject({ stale: true, staleReason: stale.staleReason });
});

test('a fresh field on the versions in force gives an estimate that is not stale, and its sign-off mends the column', async () => {
  const { items } = (await scientist.get('/api/v1/datasets').expect(200)).body;
  const datasetVersionIds = (items as DatasetSummary[]).map(({ latest }) => latest.versionId);
  const request = { sliceSlug: 'lgm', way: 'regional-scaling', datasetVersionIds };
  const field = (await scientist.post('/api/v1/fields', request).expect(201)).body as FieldDetail;
  const estimate = await estimated(scientist, { fieldVersionId: field.versionId });
  expect(estimate.stale).toBe(false);
  await sign(scientist2, estimate).expect(200);
  expect(await stratum('lgm')).toMatchObject({ stale: false, latestNetWm2: estimate.netWm2!.value });
});
