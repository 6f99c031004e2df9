import type { DatasetSummary } from '@siltlight/common/wire/datasets';
import type { EstimateSummary } from '@siltlight/common/wire/estimates';
import type { ColumnSlice, FieldDetail } from '@siltlight/common/wire/slices';
import type { SubmissionDetail, SubmissionSummary } from '@siltlight/common/wire/submissions';
import { QueryTypes } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { SeedRegistry } from '../src/database/seed-registry';
import { demoSheetText } from '../src/demo/demo-sheet-text';
import { demoSheets } from '../src/demo/demo-sites';
import { seededField } from './support/estimating';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
let scientist: SignedInCaller;
let steward: SignedInCaller;
beforeAll(async () => {
  service = await testApp({ seeded: true });
  scientist = await signedInAs(service, 'scientist');
  steward = await signedInAs(service, 'steward');
});
afterAll(() => service.close());

const itemsOf = async <Item>(caller: SignedInCaller, path: string) =>
  (await caller.get(path).expect(200)).body.items as Item[];

const TABLES = [
  'objects',
  'versions',
  'submissions',
  'samples',
  'estimate_runs',
  'people',
  'ledger',
  'stored_files',
];
async function counts(): Promise<Record<string, number>> {
  const database = service.app.get(Sequelize);
  const counted = TABLES.map(async (table) => {
    const [row] = await database.query<{ n: number }>(`SELECT count(*) AS n FROM ${table}`, {
      type: QueryTypes.SELECT,
    });
    return [table, row!.n] as const;
  });
  return Object.fromEntries(await Promise.all(counted));
}

test('the first screen shows a finished chain: holdings, fields, and published estimates in the column', async () => {
  const datasets = await itemsOf<DatasetSummary>(scientist, '/api/v1/datasets');
  expect(datasets.map(({ title }) => title).sort()).toEqual(demoSheets.map(({ title }) => title).sort());
  for (const { latest, siteCount } of datasets) {
    expect(latest).toMatchObject({ state: 'published', number: 1 });
    expect(siteCount).toBeGreaterThanOrEqual(3);
  }
  const column = await itemsOf<ColumnSlice>(scientist, '/api/v1/slices/column');
  const coloured = column.filter(({ latestNetWm2 }) => latestNetWm2 !== null).map(({ slug }) => slug);
  expect(coloured).toEqual(expect.arrayContaining(['lgm', 'mid-holocene', 'mis-2', 'heinrich-stadial-1']));
  expect(column.map(({ youngKa }) => youngKa)).toEqual(
    column.map(({ youngKa }) => youngKa).sort((a, b) => a - b),
  );
  expect(column.find(({ slug }) => slug === 'lgm')).toMatchObject({ parentSlug: 'mis-2', stale: false });
});

test('the queue holds work: one submission waits, another went back with a query on a cell', async () => {
  const queue = await itemsOf<SubmissionSummary>(steward, '/api/v1/submissions?queue=true');
  expect(queue).toHaveLength(1);
  expect(queue[0]).toMatchObject({ state: 'submitted', invented: true });
  const [returned] = await itemsOf<SubmissionSummary>(scientist, '/api/v1/submissions?mine=true');
  expect(returned).toMatchObject({ state: 'returned', invented: true });
  const detail = (await scientist.get(`/api/v1/submissions/${returned!.id}`).expect(200))
    .body as SubmissionDetail;
  expect(detail.queries).toHaveLength(1);
  expect(detail.decisions.at(-1)).toMatchObject({ decision: 'return' });
  expect(detail.rights.mayEdit).toBe(true);
});

test('everything that rests on the scenario is marked as invented', async () => {
  const marked = [
    ...(await itemsOf<DatasetSummary>(scientist, '/api/v1/datasets')),
    ...(await itemsOf<FieldDetail>(scientist, '/api/v1/fields')),
    ...(await itemsOf<EstimateSummary>(scientist, '/api/v1/estimates')),
    ...(await itemsOf<SubmissionSummary>(steward, '/api/v1/submissions')),
  ];
  expect(marked.length).toBeGreaterThanOrEqual(3 + 4 + 4 + 4);
  expect(marked.filter(({ invented }) => !invented)).toEqual([]);
});

test('sites with both windows lie in at least six regions, so that the ratios of the first field rest on evidence', async () => {
  const field = await seededField(scientist);
  const regions = new Set(
    field.sites.filter(({ ratio }) => ratio !== null).map(({ regionCode }) => regionCode),
  );
  expect(regions.size).toBeGreaterThanOrEqual(6);
  expect(field.diagnostics.regionsWithSites).toBe(regions.size);
  expect(field.regions.filter(({ status }) => status === 'sites').length).toBeGreaterThanOrEqual(1);
});

test('the ratios that were put into the invented sheets come back out of the chain', async () => {
  const { sites } = await seededField(scientist);
  const invented = demoSheets.flatMap((sheet) => sheet.sites);
  expect(sites).toHaveLength(invented.length);
  for (const { site, glacialRatio } of invented) {
    const found = sites.find((candidate) => candidate.site === site)!;
    // Scatter of ±8 % on each of three or four samples a window.
    expect(Math.abs(Math.log(found.ratio! / glacialRatio))).toBeLessThan(0.16);
  }
});

test('a second run of the seed adds nothing, whether its steps are noted as done or were broken off before', async () => {
  const seeds = service.app.get(SeedRegistry);
  const before = await counts();
  expect(await seeds.run()).toEqual([]);
  expect(await counts()).toEqual(before);
  await service.app.get(Sequelize).query("DELETE FROM seed_runs WHERE name LIKE 'demo-%'");
  expect((await seeds.run()).length).toBeGreaterThanOrEqual(4);
  expect(await counts()).toEqual(before);
});

test('the invented sheets are the same text every time', () => {
  for (const sheet of demoSheets) {
    expect(demoSheetText(sheet)).toBe(demoSheetText(sheet));
    expect(demoSheetText(sheet)).not.toMatch(/NaN|Infinity/);
    expect(sheet.title).toContain('invented');
  }
});
