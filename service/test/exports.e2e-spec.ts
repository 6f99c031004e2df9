import { createHash } from 'node:crypto';
import type { EstimateDetail, EstimateRegionResult, ForcingTriple } from '@siltlight/common/wire/estimates';
import type { ExportSummary } from '@siltlight/common/wire/exports';
import * as Papa from 'papaparse';
import { FileStore } from '../src/files/file-store.service';
import { FORMATS } from '../src/exports/formats/formats';
import { REGIONAL_COLUMNS } from '../src/exports/formats/regional-table';
import {
  detailOf,
  done,
  ESTIMATES,
  estimated,
  exported,
  type ExportedFile,
  EXPORTS,
  smallRequest,
} from './support/estimating';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
let scientist: SignedInCaller;
let modeller: SignedInCaller;
let published: EstimateDetail;
let table: ExportedFile;
beforeAll(async () => {
  service = await testApp({ seeded: true });
  scientist = await signedInAs(service, 'scientist');
  modeller = await signedInAs(service, 'modeller');
  const { items } = (await modeller.get(`${ESTIMATES}?slice=lgm&state=published`).expect(200)).body;
  published = await detailOf(modeller, items[0].id as string);
  table = await exported(modeller, published.id, 'regional-table-csv');
});
afterAll(() => service.close());

const sha256 = (bytes: Buffer) => createHash('sha256').update(bytes).digest('hex');
const rowsOf = (bytes: Buffer) =>
  Papa.parse<Record<string, string>>(bytes.toString('utf8'), { header: true, skipEmptyLines: true });

/** Column names and API values of a triple, in the words of the file. */
function cellsOf(kind: string, triple: ForcingTriple): [string, number | null][] {
  const parts = [
    ['sw', triple.shortwaveWm2],
    ['lw', triple.longwaveWm2],
    ['net', triple.netWm2],
  ] as const;
  return parts.flatMap(([part, { value, low, high }]): [string, number | null][] => [
    [`${kind}_${part}_central_W_m2`, value],
    [`${kind}_${part}_p05_W_m2`, low],
    [`${kind}_${part}_p95_W_m2`, high],
  ]);
}

test('the table is read back by another package with every number bit for bit: globe, regions in order, the rest', () => {
  const { data, errors, meta } = rowsOf(table.bytes);
  expect(errors).toEqual([]);
  expect(meta.fields).toEqual(REGIONAL_COLUMNS.map(({ name }) => name));
  const { regions, global, outside } = published.result!;
  expect(data.map((row) => row['region_code'])).toEqual([
    'GLOBAL',
    ...regions.map(({ code }) => code),
    'NONE',
  ]);
  const expectCells = (row: Record<string, string>, cells: [string, number | null][]) => {
    for (const [name, value] of cells) {
      const text = row[name]!;
      expect([name, text === '' ? null : Number(text)]).toEqual([name, value]);
    }
  };
  const ofRegion = (region: EstimateRegionResult): [string, number | null][] => [
    ['area_share', region.areaShare],
    ['site_count', region.siteCount],
    ['dust_optical_depth_550nm_slice', region.opticalDepthSlice],
    ['dust_optical_depth_550nm_reference', region.opticalDepthReference],
    ...cellsOf('forcing', region.forcing),
    ...cellsOf('direct_effect', region.directEffect),
  ];
  regions.forEach((region, index) => expectCells(data[index + 1]!, ofRegion(region)));
  expectCells(data[0]!, [
    ...cellsOf('forcing', global.forcing),
    ...cellsOf('direct_effect', global.directEffect),
  ]);
  expectCells(data.at(-1)!, [['area_share', outside.areaShare], ...cellsOf('forcing', outside.forcing)]);
});

test('the rows of the table add up to its first by their area shares, to 1e-9', () => {
  const [globe, ...rest] = rowsOf(table.bytes).data;
  const net = 'forcing_net_central_W_m2';
  const sum = rest.reduce((total, row) => total + Number(row['area_share']) * Number(row[net]), 0);
  expect(Math.abs(sum / Number(globe![net]) - 1)).toBeLessThan(1e-9);
});

test('negative numbers stand plain in the table: nothing escapes them, no comma splits them', () => {
  const text = table.bytes.toString('utf8');
  expect(text).toMatch(/,-\d/);
  expect(text).not.toContain("'-");
  expect(text).not.toContain('−');
  expect(text.endsWith('\r\n')).toBe(true);
});

test('the descriptor says what each column is, where the table came from, and fits the file', async () => {
  const { body } = await modeller.get(`${EXPORTS}/${table.summary.id}/descriptor`).expect(200);
  const [resource] = body.resources;
  expect(resource).toMatchObject({
    path: table.summary.fileName,
    bytes: table.bytes.length,
    hash: `sha256:${sha256(table.bytes)}`,
    encoding: 'utf-8',
  });
  expect(resource.schema.fields.map(({ name }: { name: string }) => name)).toEqual(
    rowsOf(table.bytes).meta.fields,
  );
  for (const { name, title, type, unit } of resource.schema.fields) {
    expect(title.length).toBeGreaterThan(5);
    expect(['string', 'number', 'integer', 'boolean']).toContain(type);
    expect(unit === undefined).toBe(type !== 'number');
    if (/_W_m2$/.test(name as string)) expect(unit).toBe('W m-2');
  }
  expect(resource.schema).toMatchObject({
    missingValues: [''],
    primaryKey: ['slice', 'reference', 'region_code'],
  });
  const keys = rowsOf(table.bytes).data.map((row) => row['region_code']);
  expect(new Set(keys).size).toBe(keys.length);
  expect(body.licenses).toEqual([{ name: 'CC0-1.0' }]);
  expect(body.sources).toHaveLength(3);
  for (const { title } of body.sources)
    expect(title).toMatch(/SHA-256 [0-9a-f]{64}\. Invented data, not for use\./);
  expect(body['siltlight:estimateChecksum']).toBe(published.checksum);
  expect(body.description).toContain('Signed off by a second person');
  expect(body.description).toContain('invented');
});

test('a file carries its checksum, answers 304 to whoever has it, and is named after slice and run', async () => {
  const { summary, headers, bytes } = table;
  expect(summary).toMatchObject({ state: 'done', sha256: sha256(bytes), bytes: bytes.length });
  expect(headers['x-checksum-sha256']).toBe(sha256(bytes));
  expect(headers['etag']).toBe(`"${sha256(bytes)}"`);
  expect(headers['content-length']).toBe(String(bytes.length));
  expect(headers['content-type']).toBe('text/csv; charset=utf-8');
  const name = `siltlight-lgm-run-${published.runNumber}-regions.csv`;
  expect(headers['content-disposition']).toContain(`attachment; filename="${name}"`);
  const path = `${EXPORTS}/${summary.id}/file`;
  const known = await modeller.get(path).set('If-None-Match', headers['etag']!).expect(304);
  expect(known.headers['etag']).toBe(headers['etag']);
  for (const tags of [`"other", ${headers['etag']}`, `W/${headers['etag']}`, '*']) {
    await modeller.get(path).set('If-None-Match', tags).expect(304);
  }
  await modeller.get(path).set('If-None-Match', '"other"').expect(200);
});

test.each(['regional-table-csv', 'slice-fields-netcdf'] as const)(
  'the same estimate gives the same %s bytes, whoever asks',
  async (format) => {
    const first = await exported(modeller, published.id, format);
    const second = await exported(scientist, published.id, format);
    expect(second.bytes.equals(first.bytes)).toBe(true);
    expect(second.summary.fileName).toBe(first.summary.fileName);
    expect(second.summary.id).not.toBe(first.summary.id);
  },
);

test('files are made without a look at the clock or at the language of the machine', async () => {
  const content = (await modeller.get(`${ESTIMATES}/${published.id}/run-record`).expect(200)).body;
  const slice = { windowYoungKa: 19, windowOldKa: 23, orbitalAgeKa: 21 };
  const { runNumber, state, checksum } = published;
  const subject = { runNumber, state, checksum: checksum!, slice, content, datasets: [] };
  for (const { make } of Object.values(FORMATS)) {
    const plain = make(subject);
    const looked = jest.fn();
    const spies = [
      jest.spyOn(globalThis, 'Date').mockImplementation(looked as never),
      jest.spyOn(Number.prototype, 'toLocaleString').mockImplementation(looked as never),
      jest.spyOn(String.prototype, 'localeCompare').mockImplementation(looked as never),
      jest.spyOn(Intl, 'NumberFormat').mockImplementation(looked as never),
    ];
    const again = make(subject);
    for (const spy of spies) spy.mockRestore();
    expect(looked).not.toHaveBeenCalled();
    expect(again.equals(plain)).toBe(true);
  }
});

test('an estimate that is not signed off can be exported by those who see it, and the file says that it is not published', async () => {
  const own = await estimated(scientist);
  const fields = await exported(scientist, own.id, 'slice-fields-netcdf');
  expect(fields.bytes.toString('latin1')).toContain('Not published: computed.');
  const rows = await exported(scientist, own.id, 'regional-table-csv');
  const { body } = await scientist.get(`${EXPORTS}/${rows.summary.id}/descriptor`).expect(200);
  expect(body.description).toContain('Not published: computed.');
  await modeller.post(EXPORTS, { estimateId: own.id, format: 'regional-table-csv' }).expect(404);
});

test('what is not finished is not handed out: 409 with what to do', async () => {
  const request = await smallRequest(scientist, { members: 4096, seed: 11 });
  const running = (await scientist.post(ESTIMATES, request).expect(202)).body as {
    id: string;
    jobPath: string;
  };
  const wanted = { estimateId: running.id, format: 'regional-table-csv' };
  expect((await scientist.post(EXPORTS, wanted).expect(409)).body.code).toBe('not-computed');
  await scientist.post(`${running.jobPath}/cancel`).expect(200);

  const store = service.app.get(FileStore, { strict: false });
  let goOn = () => {};
  const waits = new Promise<void>((resolve) => (goOn = resolve));
  const put = store.put.bind(store);
  const held = jest.spyOn(store, 'put').mockImplementation(async (...given) => {
    await waits;
    return put(...given);
  });
  const accepted = await modeller.post(EXPORTS, { ...wanted, estimateId: published.id }).expect(202);
  expect(accepted.headers.location).toBe(accepted.body.jobPath);
  const path = `${EXPORTS}/${accepted.body.id}`;
  expect((await modeller.get(path).expect(200)).body).toMatchObject({ sha256: null, fileName: null });
  for (const what of ['file', 'descriptor']) {
    const refused = await modeller.get(`${path}/${what}`).expect(409);
    expect(refused.body).toMatchObject({ code: 'not-finished', detail: expect.stringContaining('job') });
  }
  goOn();
  await done(modeller, accepted.body.jobPath as string);
  held.mockRestore();
  await modeller.get(`${path}/file`).expect(200);
});

test('an export is its owner’s alone: others, administrators too, find nothing there', async () => {
  for (const other of [scientist, await signedInAs(service, 'admin')]) {
    for (const path of ['', '/file', '/descriptor']) {
      await other.get(`${EXPORTS}/${table.summary.id}${path}`).expect(404);
    }
    const { items } = (await other.get(`${EXPORTS}?limit=200`).expect(200)).body;
    expect((items as ExportSummary[]).map(({ id }) => id)).not.toContain(table.summary.id);
  }
  await modeller.get(`${EXPORTS}/${table.summary.id}`).expect(200);
});

test('own exports are listed in pages, newest first', async () => {
  const all = (await modeller.get(`${EXPORTS}?limit=200`).expect(200)).body;
  const ids = (all.items as ExportSummary[]).map(({ id }) => id);
  expect(ids).toContain(table.summary.id);
  expect(ids).toEqual([...ids].sort().reverse());
  expect(all.total).toBe(ids.length);
  const first = (await modeller.get(`${EXPORTS}?limit=1`).expect(200)).body;
  const next = (await modeller.get(`${EXPORTS}?limit=1&cursor=${first.nextCursor}`).expect(200)).body;
  expect([first.items[0].id, next.items[0].id]).toEqual(ids.slice(0, 2));
});

test('a request for nothing, for another format or with more than is asked is refused by name', async () => {
  const good = { estimateId: published.id, format: 'regional-table-csv' };
  const refusals: [object, string][] = [
    [{ ...good, format: 'xlsx' }, '/format'],
    [{ format: good.format }, '/estimateId'],
    [{ ...good, sha256: 'x' }, ''],
  ];
  for (const [body, pointer] of refusals) {
    const refused = await modeller.post(EXPORTS, body).expect(422);
    expect(refused.body.errors[0].pointer).toContain(pointer);
  }
  await modeller.post(EXPORTS, { ...good, estimateId: 'nowhere' }).expect(404);
  const fields = await exported(modeller, published.id, 'slice-fields-netcdf');
  const none = await modeller.get(`${EXPORTS}/${fields.summary.id}/descriptor`).expect(404);
  expect(none.body.code).toBe('no-descriptor');
});
