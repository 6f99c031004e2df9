import type { FieldDetail, SiteTrace } from '@siltlight/common/wire/slices';
import type { DatasetSummary } from '@siltlight/common/wire/datasets';
import { LedgerService } from '../src/ledger/ledger.service';
import { testAppWithPeople } from './support/demo-people';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import { approved, REAL_WORKBOOK, sampleFile, SMALL_TABLE, type Steps } from './support/submitting';
import type { TestApp } from './support/test-app';

const FIELDS = '/api/v1/fields';
const SLICE = 'lgm';

let service: TestApp;
let scientist: SignedInCaller;
let steward: SignedInCaller;
let modeller: SignedInCaller;
let real: Steps;
let versionIds: string[];
let datasets: DatasetSummary[];
beforeAll(async () => {
  service = await testAppWithPeople(['demo-holdings']);
  scientist = await signedInAs(service, 'scientist');
  steward = await signedInAs(service, 'steward');
  modeller = await signedInAs(service, 'modeller');
  real = await approved(scientist, steward, sampleFile(REAL_WORKBOOK), REAL_WORKBOOK);
  datasets = (await scientist.get('/api/v1/datasets').expect(200)).body.items;
  versionIds = datasets.map(({ latest }) => latest.versionId);
});
afterAll(() => service.close());

const request = (more: object = {}) => ({
  sliceSlug: SLICE,
  way: 'regional-scaling',
  datasetVersionIds: versionIds,
  ...more,
});
const build = async (more: object = {}): Promise<FieldDetail> =>
  (await scientist.post(FIELDS, request(more)).expect(201)).body;

test('Dome C adds its ratio; NorthGRIP has no sample in the reference window and is never used', async () => {
  const { sites, regions, diagnostics } = (await scientist.post(`${FIELDS}/preview`, request()).expect(200))
    .body as FieldDetail;
  const domeC = sites.find(({ site }) => site === 'EDC')!;
  expect(domeC).toMatchObject({ regionCode: 'EAN', unusedReason: null });
  expect(domeC.ratio).toBeCloseTo(domeC.sliceFluxGM2Yr! / domeC.referenceFluxGM2Yr!, 12);
  expect(domeC.ratio!).toBeGreaterThan(5);
  const ngrip = sites.find(({ site }) => site === 'NGRIP')!;
  expect(ngrip).toMatchObject({ referenceFluxGM2Yr: null, ratio: null, unusedReason: 'no reference flux' });
  expect(ngrip.sliceFluxGM2Yr).toBeGreaterThan(0);

  const used = sites.filter(({ unusedReason }) => unusedReason === null);
  expect(diagnostics.usedSites).toBe(used.length);
  expect(diagnostics.regionsWithSites).toBeGreaterThanOrEqual(6);
  for (const region of regions) {
    const inRegion = used.filter(({ regionCode }) => regionCode === region.code).length;
    expect({ code: region.code, siteCount: region.siteCount }).toEqual({
      code: region.code,
      siteCount: inRegion,
    });
    const status = inRegion === 0 ? 'global' : inRegion < 3 ? 'shrunk' : 'sites';
    expect({ code: region.code, status: region.status }).toEqual({ code: region.code, status });
    expect(region.hatched).toBe(inRegion < 3);
    expect(region.ratio.low).toBeLessThan(region.ratio.value);
    expect(region.ratio.high).toBeGreaterThan(region.ratio.value);
    expect(region.opticalDepthSlice).toBeGreaterThan(0);
    if (inRegion === 0) expect(region.ratio.value).toBeCloseTo(diagnostics.globalRatio.value, 12);
  }
});

test('leaving the new version out takes Dome C out of its region', async () => {
  const mine = datasets.find(({ slug }) => slug === real.detail.dataset!.slug)!.latest.versionId;
  const body = request({ datasetVersionIds: versionIds.filter((id) => id !== mine) });
  const without = (await scientist.post(`${FIELDS}/preview`, body).expect(200)).body as FieldDetail;
  expect(without.sites.some(({ site }) => site === 'EDC')).toBe(false);
  const withIt = (await scientist.post(`${FIELDS}/preview`, request()).expect(200)).body as FieldDetail;
  const count = (field: FieldDetail) => field.regions.find(({ code }) => code === 'EAN')!.siteCount;
  expect(count(withIt) - count(without)).toBe(1);
});

test('a kept field is the previewed one, published, listed under its slice, with one act in the ledger', async () => {
  const acts = () => service.app.get(LedgerService, { strict: false }).count({});
  const before = await acts();
  const preview = (await scientist.post(`${FIELDS}/preview`, request()).expect(200)).body as FieldDetail;
  expect(preview.versionId).toBe('');
  expect(await acts()).toBe(before);
  const field = await build();
  expect((await acts()) - before).toBe(1);
  expect(field).toMatchObject({
    state: 'published',
    checksum: preview.checksum,
    stale: false,
    invented: true,
  });
  const { versionId, createdAt, createdBy, state, ...same } = field;
  expect(preview).toMatchObject(same);
  expect({ state, by: createdBy.name, at: createdAt }).toMatchObject({
    state: 'published',
    by: 'Ilka Vossberg',
  });
  expect((await modeller.get(`${FIELDS}/${versionId}`).expect(200)).body).toEqual(field);
  const listed = (await modeller.get(`${FIELDS}?slice=${SLICE}`).expect(200)).body.items;
  expect(listed[0].versionId).toBe(versionId);
  expect((await modeller.get(`${FIELDS}?slice=mid-holocene`).expect(200)).body.items).toEqual([]);
});

test('the grid has the field’s global means: the area mean of its cells', async () => {
  const field = await build();
  const grid = (await modeller.get(`${FIELDS}/${field.versionId}/grid`).expect(200)).body;
  expect(grid.stepDeg).toBe(2);
  for (const [values, mean] of [
    [grid.opticalDepthSlice, field.globalOpticalDepthSlice],
    [grid.opticalDepthReference, field.globalOpticalDepthReference],
  ] as [number[], number][]) {
    expect(values).toHaveLength(90 * 180);
    const bands = Array.from({ length: 90 }, (_, row) => {
      const [south, north] = [row * 2 - 90, row * 2 - 88].map((degrees) => (degrees * Math.PI) / 180);
      const share = (Math.sin(north!) - Math.sin(south!)) / 2;
      const cells = values.slice(row * 180, row * 180 + 180);
      return (share * cells.reduce((sum, value) => sum + value, 0)) / 180;
    });
    const own = bands.reduce((sum, value) => sum + value, 0);
    // The service splits cells at region edges, each edge to some 1e-9 of the sphere.
    expect(Math.abs(own / mean - 1)).toBeLessThan(1e-6);
    expect(Math.min(...values)).toBeGreaterThan(0);
  }
});

test('from a site’s fluxes the trace leads to samples and on to the cells of the file', async () => {
  const field = await build();
  const { slug } = real.detail.dataset!;
  const path = `${FIELDS}/${field.versionId}/trace?site=EDC&dataset=${slug}`;
  const trace = (await modeller.get(path).expect(200)).body as SiteTrace;
  expect(trace).toMatchObject({ fileName: REAL_WORKBOOK, versionNumber: 1, submissionId: real.detail.id });
  const site = field.sites.find((entry) => entry.site === 'EDC')!;
  expect(trace.windows.map(({ meanFluxGM2Yr }) => meanFluxGM2Yr)).toEqual([
    site.sliceFluxGM2Yr,
    site.referenceFluxGM2Yr,
  ]);
  for (const window of trace.windows) {
    expect(window.samples.length).toBeGreaterThan(0);
    const weights = window.samples.reduce((sum, { weight }) => sum + weight, 0);
    const mean = window.samples.reduce((sum, { weight, fluxGM2Yr }) => sum + weight * fluxGM2Yr, 0) / weights;
    expect(Math.abs(mean / window.meanFluxGM2Yr! - 1)).toBeLessThan(1e-9);
    for (const sample of window.samples) {
      const cells = (
        await modeller
          .get(`/api/v1/datasets/${slug}/versions/1/cells?sheet=${sample.sheet}&row=${sample.row}`)
          .expect(200)
      ).body.rows.find(({ row }: { row: number }) => row === sample.row).cells;
      expect(sample.fluxCell).toBe(`F${sample.row}`);
      expect(cells.F).toBe(sample.fluxRaw);
      expect(cells.A).toBe(sample.ageRaw);
    }
  }
  const ngrip = (
    await modeller.get(`${FIELDS}/${field.versionId}/trace?site=NGRIP&dataset=${slug}`).expect(200)
  ).body as SiteTrace;
  expect(ngrip.windows[1]).toMatchObject({ meanFluxGM2Yr: null, samples: [] });
  await modeller.get(`${FIELDS}/${field.versionId}/trace?site=EDC&dataset=nowhere`).expect(404);
  await modeller.get(`${FIELDS}/${field.versionId}/trace?site=Nowhere&dataset=${slug}`).expect(404);
});

test('what cannot be built from is refused with a pointer', async () => {
  const draftless = '019b0000-0000-7000-8000-000000000000';
  const slice = (await scientist.get('/api/v1/slices').expect(200)).body.items[0].versionId;
  const cases: [object, string][] = [
    [{ sliceSlug: 'pre-industrial' }, '/sliceSlug'],
    [{ sliceSlug: 'no-such-slice' }, '/sliceSlug'],
    [{ datasetVersionIds: [versionIds[0], draftless] }, '/datasetVersionIds/1'],
    [{ datasetVersionIds: [slice] }, '/datasetVersionIds/0'],
    [{ datasetVersionIds: [] }, '/datasetVersionIds'],
    [{ way: 'kriging' }, '/way'],
    [{ ownerId: 'me' }, ''],
  ];
  for (const [change, pointer] of cases) {
    for (const path of [FIELDS, `${FIELDS}/preview`]) {
      const refused = await scientist.post(path, request(change)).expect(422);
      expect({ change, pointer: refused.body.errors[0].pointer }).toEqual({ change, pointer });
      expect(refused.body.detail.length).toBeGreaterThan(20);
    }
  }
});

test('one size fraction is used; records of another are listed as left aside, and none at all is refused', async () => {
  const fine = SMALL_TABLE.replaceAll('bulk', '<10 um').replaceAll('KX-1', 'KX-9');
  const other = await approved(scientist, steward, fine, 'fine.csv');
  const { items } = (await scientist.get('/api/v1/datasets').expect(200)).body as { items: DatasetSummary[] };
  const id = items.find(({ slug }) => slug === other.detail.dataset!.slug)!.latest.versionId;
  const both = (
    await scientist.post(`${FIELDS}/preview`, request({ datasetVersionIds: [...versionIds, id] })).expect(200)
  ).body as FieldDetail;
  expect(both.sizeCutoff).toBe('bulk');
  const aside = both.sites.find(({ site }) => site === 'Core KX-9')!;
  expect(aside.unusedReason).toMatch(/size fraction/);
  expect(aside.ratio).toBeNull();
  const picked = (
    await scientist
      .post(`${FIELDS}/preview`, request({ datasetVersionIds: [...versionIds, id], sizeCutoff: '<10 um' }))
      .expect(200)
  ).body as FieldDetail;
  expect(picked.sites.filter(({ unusedReason }) => unusedReason === null).map(({ site }) => site)).toEqual([
    'Core KX-9',
  ]);
  const none = await scientist.post(`${FIELDS}/preview`, request({ sizeCutoff: '<1 um' })).expect(422);
  expect(none.body.detail.length).toBeGreaterThan(20);
});

test('a version that replaces or withdraws one makes the fields on it stale and can be used itself', async () => {
  const first = await approved(scientist, steward, SMALL_TABLE, 'first.csv');
  const { slug } = first.detail.dataset!;
  const idOf = async () =>
    (await scientist.get(`/api/v1/datasets/${slug}`).expect(200)).body.version.versionId;
  const firstId = await idOf();
  const [old, untouched] = [await build({ datasetVersionIds: [...versionIds, firstId] }), await build()];
  const revised = SMALL_TABLE.replace('0.42', '0.44');
  await approved(scientist, steward, revised, 'second.csv', { datasetSlug: slug });
  const stale = (await modeller.get(`${FIELDS}/${old.versionId}`).expect(200)).body as FieldDetail;
  expect(stale).toMatchObject({ stale: true, checksum: old.checksum });
  expect(stale.staleReason).toMatch(/version 1 was superseded by version 2/);
  expect((await modeller.get(`${FIELDS}/${untouched.versionId}`).expect(200)).body.stale).toBe(false);
  const used = (await modeller.get(`/api/v1/datasets/${slug}/versions/1`).expect(200)).body.usedBy;
  expect(used).toEqual([{ kind: 'field', id: old.versionId, title: old.title, stale: true }]);

  const gone = await scientist.post(FIELDS, request({ datasetVersionIds: [firstId] })).expect(422);
  expect(gone.body.errors[0].message).toMatch(/superseded/);
  const next = await build({ datasetVersionIds: [...versionIds, await idOf()] });
  expect(next.stale).toBe(false);
  await steward.post(`/api/v1/datasets/${slug}/versions/2/withdraw`, { reason: 'Wrong core.' }).expect(200);
  const withdrawn = (await modeller.get(`${FIELDS}/${next.versionId}`).expect(200)).body as FieldDetail;
  expect(withdrawn).toMatchObject({ stale: true, staleReason: expect.stringContaining('Wrong core.') });
  const refused = await scientist.post(FIELDS, request({ datasetVersionIds: [await idOf()] })).expect(422);
  expect(refused.body.errors[0].message).toMatch(/withdrawn/);
});

test('other kinds of versions are no fields', async () => {
  await modeller.get(`${FIELDS}/${versionIds[0]}`).expect(404);
  await modeller.get(`${FIELDS}/${versionIds[0]}/grid`).expect(404);
  await modeller.get(`${FIELDS}/none`).expect(404);
});
