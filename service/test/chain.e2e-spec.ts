import type { DatasetSummary } from '@siltlight/common/wire/datasets';
import type { EstimateDetail } from '@siltlight/common/wire/estimates';
import type { ColumnSlice, FieldDetail, SiteTrace, sourceCells } from '@siltlight/common/wire/slices';
import { NetCDFReader } from 'netcdfjs';
import * as Papa from 'papaparse';
import * as xlsx from 'xlsx';
import type { z } from 'zod';
import { detailOf, ESTIMATES, estimated, exported } from './support/estimating';
import { answers } from './support/form';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import { approved, REAL_EXPORT, REAL_WORKBOOK, sampleFile } from './support/submitting';
import { testApp, type TestApp } from './support/test-app';

/** The whole job, each test a step that goes on from the one before. */
let service: TestApp;
let scientist: SignedInCaller;
let scientist2: SignedInCaller;
let steward: SignedInCaller;
let modeller: SignedInCaller;
let workbookSlug: string;
let field: FieldDetail;
let estimate: EstimateDetail;
beforeAll(async () => {
  service = await testApp({ seeded: true });
  scientist = await signedInAs(service, 'scientist');
  scientist2 = await signedInAs(service, 'scientist2');
  steward = await signedInAs(service, 'steward');
  modeller = await signedInAs(service, 'modeller');
});
afterAll(() => service.close());

const siteOf = (name: string) => field.sites.find(({ site }) => site === name)!;

test('both spreadsheets are submitted and approved, and stand in Holdings beside the invented ones', async () => {
  const title = (name: string) => ({ ...answers, title: name });
  const book = await approved(
    scientist,
    steward,
    sampleFile(REAL_WORKBOOK),
    REAL_WORKBOOK,
    { grade: 'recomputed' },
    title('Dust of two deep ice cores'),
  );
  const text = await approved(
    scientist,
    steward,
    sampleFile(REAL_EXPORT),
    REAL_EXPORT,
    {},
    title('Staubflüsse, an export'),
  );
  workbookSlug = book.detail.dataset!.slug;
  const { items } = (await modeller.get('/api/v1/datasets').expect(200)).body;
  const held = new Map((items as DatasetSummary[]).map((dataset) => [dataset.slug, dataset]));
  expect(held.size).toBe(5);
  expect(held.get(workbookSlug)).toMatchObject({ invented: false, siteCount: 2, sampleCount: 240 });
  expect(held.get(text.detail.dataset!.slug)).toMatchObject({ invented: false, siteCount: 2 });
});

test('a field over the seeded sites and the new version takes the ratio of Dome C and leaves NGRIP aside, with the reason', async () => {
  const { items } = (await scientist.get('/api/v1/datasets').expect(200)).body;
  const chosen = (items as DatasetSummary[]).filter(
    ({ invented, slug }) => invented || slug === workbookSlug,
  );
  const before = await build(chosen.filter(({ invented }) => invented));
  field = await build(chosen);

  const domeC = siteOf('EDC');
  expect(domeC).toMatchObject({
    unusedReason: null,
    regionCode: 'EAN',
    referenceSamples: 2,
    sliceSamples: 4,
  });
  expect(domeC.ratio!).toBeCloseTo(domeC.sliceFluxGM2Yr! / domeC.referenceFluxGM2Yr!, 12);
  expect(domeC.ratio!).toBeGreaterThan(5);
  const ngrip = siteOf('NGRIP');
  expect(ngrip).toMatchObject({ unusedReason: 'no reference flux', ratio: null, referenceFluxGM2Yr: null });
  expect(ngrip.sliceFluxGM2Yr!).toBeGreaterThan(0);

  const sitesIn = ({ regions }: FieldDetail, code: string) =>
    regions.find((region) => region.code === code)!.siteCount;
  expect(sitesIn(field, 'EAN')).toBe(sitesIn(before, 'EAN') + 1);
  expect(sitesIn(field, 'GIC')).toBe(sitesIn(before, 'GIC'));
  expect(field.diagnostics.usedSites).toBe(before.diagnostics.usedSites + 1);
  for (const { hatched, siteCount, status } of field.regions) {
    expect(hatched).toBe(siteCount < 3);
    if (siteCount === 0) expect(status).toBe('global');
    if (siteCount === 1) expect(status).toBe('shrunk');
  }
});

async function build(datasets: DatasetSummary[]): Promise<FieldDetail> {
  const datasetVersionIds = datasets.map(({ latest }) => latest.versionId);
  const request = { sliceSlug: 'lgm', way: 'regional-scaling', datasetVersionIds };
  return (await scientist.post('/api/v1/fields', request).expect(201)).body as FieldDetail;
}

test('an estimate by the daily thin layer with longwave is run and signed off by a second person', async () => {
  const change = { fieldVersionId: field.versionId, method: 'thin-layer-daily', members: 512 } as const;
  estimate = await estimated(scientist, change);
  expect(estimate.result!.global.forcing.netWm2.low).toBeLessThan(estimate.netWm2!.high!);
  const seen = new Set(estimate.result!.cautions.map(({ code }) => code));
  for (const code of [
    'few-sites',
    'coarse-base-field',
    'longwave-by-efficiency',
    'interval-covers-varied-inputs',
  ]) {
    expect(seen).toContain(code);
  }
  await scientist.post(`${ESTIMATES}/${estimate.id}/sign-off`).expect(403);
  await scientist2.post(`${ESTIMATES}/${estimate.id}/sign-off`).expect(200);
  const { items } = (await modeller.get('/api/v1/slices/column').expect(200)).body;
  const lgm = (items as ColumnSlice[]).find(({ slug }) => slug === 'lgm')!;
  expect(lgm).toMatchObject({ latestNetWm2: estimate.netWm2!.value, stale: false });
});

test('a modeller fetches table and fields, and both say the number of the estimate', async () => {
  const table = await exported(modeller, estimate.id, 'regional-table-csv');
  const { data } = Papa.parse<Record<string, string>>(table.bytes.toString('utf8'), { header: true });
  expect(Number(data[0]!['forcing_net_central_W_m2'])).toBe(estimate.netWm2!.value);
  const { bytes } = await exported(modeller, estimate.id, 'slice-fields-netcdf');
  const reader = new NetCDFReader(bytes);
  const [forcing, area] = ['net_forcing', 'cell_area'].map(
    (name) => [reader.getDataVariable(name)].flat(2) as number[],
  );
  const total = area!.reduce((sum, cell) => sum + cell, 0);
  const mean = forcing!.reduce((sum, value, cell) => sum + (value * area![cell]!) / total, 0);
  expect(Math.abs(mean / estimate.netWm2!.value - 1)).toBeLessThan(1e-9);
  expect(String(reader.getAttribute('citations'))).toContain('Dust of two deep ice cores');
});

test('from the number of a region three calls lead to the cells of the spreadsheet, as another reader sees them', async () => {
  const { result, request } = await detailOf(modeller, estimate.id);
  expect(result!.regions.find(({ code }) => code === 'EAN')!.siteCount).toBeGreaterThan(1);
  const shown = (await modeller.get(`/api/v1/fields/${request.fieldVersionId}`).expect(200))
    .body as FieldDetail;
  const site = shown.sites.find(
    ({ regionCode, datasetSlug }) => regionCode === 'EAN' && datasetSlug === workbookSlug,
  )!;
  const query = `site=${encodeURIComponent(site.site)}&dataset=${site.datasetSlug}`;
  const trace = (await modeller.get(`/api/v1/fields/${shown.versionId}/trace?${query}`).expect(200))
    .body as SiteTrace;
  expect(trace).toMatchObject({ fileName: REAL_WORKBOOK, datasetTitle: 'Dust of two deep ice cores' });
  const [slice, reference] = trace.windows;
  expect(slice).toMatchObject({ sliceSlug: 'lgm', meanFluxGM2Yr: site.sliceFluxGM2Yr });
  expect(reference).toMatchObject({ sliceSlug: 'pre-industrial', meanFluxGM2Yr: site.referenceFluxGM2Yr });
  expect([slice!.samples.length, reference!.samples.length]).toEqual([
    site.sliceSamples,
    site.referenceSamples,
  ]);

  const book = xlsx.read(sampleFile(REAL_WORKBOOK));
  for (const sample of trace.windows.flatMap(({ samples }) => samples)) {
    expect(sample.sheet).toBe('EDC');
    const path = `/api/v1/datasets/${site.datasetSlug}/versions/${trace.versionNumber}/cells`;
    const { body } = await modeller.get(`${path}?sheet=${sample.sheet}&row=${sample.row}`).expect(200);
    const { rows, sha256 } = body as z.infer<typeof sourceCells>;
    expect(sha256).toMatch(/^[0-9a-f]{64}$/);
    const row = rows.find((candidate) => candidate.row === sample.row)!;
    for (const [cell, raw] of [
      [sample.fluxCell!, sample.fluxRaw],
      [sample.ageCell!, sample.ageRaw],
    ] as const) {
      const inFile = book.Sheets[sample.sheet]![cell] as xlsx.CellObject;
      expect(row.cells[cell.replace(/\d+$/, '')]).toBe(raw);
      expect(Number(raw)).toBe(inFile.v);
    }
    // The column is in mg m⁻² yr⁻¹, the canonical unit is g m⁻² yr⁻¹.
    expect(sample.fluxGM2Yr).toBeCloseTo(Number(sample.fluxRaw) / 1000, 12);
  }
});
