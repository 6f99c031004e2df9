import * as fs from 'node:fs/promises';
import * as http from 'node:http';
import type { AddressInfo } from 'node:net';
import { Sequelize } from 'sequelize-typescript';
import type { Mapping } from '@siltlight/common/sheet/mapping';
import { hostileFiles, strangeFiles } from './hostile-files';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import { expectedRows, expectRows, REAL_EXPORT, REAL_WORKBOOK, sampleFile } from './support/submitting';
import { testAppWithPeople } from './support/demo-people';
import type { TestApp } from './support/test-app';

const PATH = '/api/v1/calculators/check-file';

let service: TestApp;
let modeller: SignedInCaller;
beforeAll(async () => {
  service = await testAppWithPeople();
  modeller = await signedInAs(service, 'modeller');
});
afterAll(() => service.close());

const check = (content: Buffer | string, fileName: string, fields: Record<string, string> = {}) =>
  Object.entries(fields).reduce(
    (call, [name, value]) => call.field(name, value),
    modeller.post(PATH).attach('file', Buffer.from(content as string), fileName),
  );

const filled = (rows: { fluxGM2Yr: number | null }[]) => rows.filter(({ fluxGM2Yr }) => fluxGM2Yr !== null);

const filesKept = async () =>
  (await fs.readdir(service.settings.dataDir, { recursive: true, withFileTypes: true }))
    .filter((entry) => entry.isFile() && !entry.name.startsWith('siltlight.sqlite'))
    .map((entry) => `${entry.parentPath}/${entry.name}`)
    .sort();

/** Mail of the demo is still on its way, and sessions note when they were last seen. */
const LEFT_OUT_OF_COUNT = ['sessions', 'mailbox_messages', 'outbox', 'jobs'];
async function rowsKept(): Promise<Record<string, number>> {
  const database = service.app.get(Sequelize);
  const [tables] = await database.query("SELECT name FROM sqlite_master WHERE type = 'table' ORDER BY name");
  const counts: Record<string, number> = {};
  for (const { name } of tables as { name: string }[]) {
    if (LEFT_OUT_OF_COUNT.includes(name)) continue;
    const [rows] = await database.query(`SELECT count(*) AS n FROM "${name}"`);
    counts[name] = (rows as { n: number }[])[0]!.n;
  }
  return counts;
}

test('the real workbook gives its expected rows, its tables with reasons and its findings, and nothing is kept', async () => {
  const [rowsBefore, filesBefore] = [await rowsKept(), await filesKept()];
  const { body } = await check(sampleFile(REAL_WORKBOOK), REAL_WORKBOOK).expect(200);
  expect(Object.keys(body).sort()).toEqual(['columns', 'counts', 'findings', 'rows', 'tables']);
  const used = body.tables.map(({ sheet, used }: { sheet: string; used: boolean }) => [sheet, used]);
  expect(used).toEqual([
    ['READ ME', false],
    ['EDC', true],
    ['NGRIP', true],
    ['old calc', false],
  ]);
  expect(body.tables[3].reason).toMatch(/superseded/);
  expect(body.tables[1]).toMatchObject({ headerRows: [4, 5, 6], unitsRow: 6, firstRow: 7 });
  expect(body.counts.rows).toBe(body.rows.length);
  expectRows(filled(body.rows) as never, expectedRows('A_expected.csv'));
  expect(await rowsKept()).toEqual(rowsBefore);
  expect(await filesKept()).toEqual(filesBefore);
});

test('the semicolon export gives its expected rows, and every row and finding has the agreed fields', async () => {
  const { body } = await check(sampleFile(REAL_EXPORT), REAL_EXPORT).expect(200);
  expectRows(filled(body.rows) as never, expectedRows('B_expected.csv'));
  const rowFields =
    'sheet row site latitudeDeg longitudeDeg ageKaBp fluxGM2Yr fluxSigmaGM2Yr quantity ageSigmaKa depthM sizeCutoff';
  for (const row of body.rows) {
    expect(Object.keys(row).sort()).toEqual(rowFields.split(' ').sort());
    expect(row.quantity).toBe('dust');
  }
  for (const finding of body.findings) {
    expect(finding).toMatchObject({ code: expect.stringMatching(/^V\d\d$/), message: expect.any(String) });
    expect(finding.remedy.length).toBeGreaterThan(5);
    expect(['error', 'warning', 'note']).toContain(finding.severity);
    expect(Object.keys(finding)).toEqual(
      expect.arrayContaining(['slug', 'sheet', 'row', 'column', 'severity']),
    );
  }
  const bySeverity = (severity: string) =>
    body.findings.filter((finding: { severity: string }) => finding.severity === severity).length;
  expect(body.counts).toEqual({
    rows: 18,
    errors: bySeverity('error'),
    warnings: bySeverity('warning'),
    notes: bySeverity('note'),
  });
  expect(body.findings.some(({ code }: { code: string }) => code === 'V04')).toBe(true);
});

test('offset and limit of a repeated upload page through the same order', async () => {
  const all = (await check(sampleFile(REAL_WORKBOOK), REAL_WORKBOOK).expect(200)).body;
  const page = (
    await check(sampleFile(REAL_WORKBOOK), REAL_WORKBOOK, { offset: '100', limit: '75' }).expect(200)
  ).body;
  expect(page.rows).toEqual(all.rows.slice(100, 175));
  expect(page.counts).toEqual(all.counts);
  const beyond = await check(sampleFile(REAL_WORKBOOK), REAL_WORKBOOK, { offset: '9999' }).expect(200);
  expect(beyond.body.rows).toEqual([]);
  for (const [field, value] of Object.entries({
    limit: '10001',
    offset: '-1',
    kind: 'pollen',
    owner: 'me',
  })) {
    const refused = await check('a,b\n1,2\n', 'a.csv', { [field]: value }).expect(422);
    expect(refused.body.errors[0].field || refused.body.detail).toContain(
      field === 'owner' ? 'owner' : field,
    );
  }
});

test('the answer sent back unchanged as the mapping gives the same answer', async () => {
  for (const name of [REAL_WORKBOOK, REAL_EXPORT]) {
    const first = (await check(sampleFile(name), name).expect(200)).body;
    const mapping = JSON.stringify({ tables: first.tables, columns: first.columns });
    const again = (await check(sampleFile(name), name, { mapping }).expect(200)).body;
    expect(again.rows).toEqual(first.rows);
    expect(again.tables).toEqual(first.tables);
    expect(again.columns).toEqual(first.columns);
  }
});

describe('a mapping corrects the proposal', () => {
  const text = 'Notes of the cruise\nDome X,,,\nname,lat,lon,x,y\n,,,ka,mg\nK1,10,20,1.5,4\nK2,11,21,2.5,8\n';
  const table = (changes: object) => ({
    sheet: 'cores',
    headerRows: [3],
    unitsRow: 4,
    firstRow: 5,
    lastRow: 6,
    used: true,
    ...changes,
  });
  const column = (letter: string, field: string | null, unit: string | null = null) => ({
    sheet: 'cores',
    column: letter,
    field,
    unit,
  });
  const columns = [
    column('A', 'site'),
    column('B', 'latitudeDeg', '°'),
    column('C', 'longitudeDeg', '°'),
    column('D', 'ageKaBp', 'ka BP'),
    column('E', 'fluxGM2Yr', 'mg m-2 yr-1'),
  ];
  const checked = (mapping: object) => check(text, 'cores.csv', { mapping: JSON.stringify(mapping) });

  test('tables, header rows, fields and units given by hand are what is read', async () => {
    const { body } = await checked({ tables: [table({})], columns }).expect(200);
    expect(body.rows).toMatchObject([
      { row: 5, site: 'K1', latitudeDeg: 10, longitudeDeg: 20, ageKaBp: 1.5, fluxGM2Yr: 0.004 },
      { row: 6, site: 'K2', latitudeDeg: 11, longitudeDeg: 21, ageKaBp: 2.5, fluxGM2Yr: 0.008 },
    ]);
    const fewer = await checked({ tables: [table({ firstRow: 6, headerRows: [3, 4] })], columns }).expect(
      200,
    );
    expect(fewer.body.rows.map(({ row }: { row: number }) => row)).toEqual([6]);
    expect(fewer.body.tables[0].headerRows).toEqual([3, 4]);
    const none = await checked({ tables: [table({ used: false })], columns }).expect(200);
    expect(none.body.rows).toEqual([]);
  });

  test('a table of the real workbook can be left aside and a unit changed', async () => {
    const first = (await check(sampleFile(REAL_WORKBOOK), REAL_WORKBOOK).expect(200)).body as Mapping & {
      rows: { sheet: string; fluxGM2Yr: number | null }[];
    };
    const tables = first.tables.map((entry) => (entry.sheet === 'EDC' ? { ...entry, used: false } : entry));
    const changed = first.columns.map((entry) =>
      entry.sheet === 'NGRIP' && entry.column === 'F' ? { ...entry, unit: 'mg/m2/a' } : entry,
    );
    const mapping = JSON.stringify({ tables, columns: changed });
    const { body } = await check(sampleFile(REAL_WORKBOOK), REAL_WORKBOOK, { mapping }).expect(200);
    const ngrip = first.rows.filter(({ sheet }) => sheet === 'NGRIP');
    expect(body.rows.length).toBe(ngrip.length);
    body.rows.forEach((row: { fluxGM2Yr: number | null }, index: number) => {
      const before = ngrip[index]!.fluxGM2Yr;
      if (before === null) expect(row.fluxGM2Yr).toBeNull();
      else expect(row.fluxGM2Yr).toBeCloseTo(before / 1000, 12);
    });
  });

  test.each([
    ['a sheet that is not there', { tables: [table({ sheet: 'other' })] }, '/mapping/tables/0/sheet'],
    ['rows beyond the sheet', { tables: [table({ lastRow: 700 })] }, '/mapping/tables/0/lastRow'],
    ['a heading among the data', { tables: [table({ headerRows: [5] })] }, '/mapping/tables/0/headerRows/0'],
    ['a column of no sheet', { columns: [{ ...columns[0], sheet: 'x' }] }, '/mapping/columns/0/sheet'],
    ['a column without a letter', { columns: [{ ...columns[0], column: '7' }] }, '/mapping/columns/0/column'],
    ['no list', { tables: 'all' }, '/mapping/tables'],
    ['an unknown part', { owner: 'me' }, '/mapping'],
  ])('%s is refused with a pointer', async (_what, mapping, pointer) => {
    const refused = await checked(mapping).expect(422);
    expect(refused.type).toBe('application/problem+json');
    expect(refused.body.errors[0].pointer).toBe(pointer);
  });

  test('a mapping that is not JSON is refused', async () => {
    for (const mapping of ['{"tables": [', '{"__proto__": {}}', 'null']) {
      const refused = await check(text, 'cores.csv', { mapping }).expect(422);
      expect(refused.body.errors[0].field).toContain('mapping');
    }
  });
});

test('an unconvertible unit and a missing column are findings with a remedy, not refusals', async () => {
  const weights = 'site,latitude,longitude,age (ka BP),dust flux (kg)\nK1,10,20,1.5,4\nK2,11,21,2.5,8\n';
  const { body } = await check(weights, 'weights.csv').expect(200);
  const unit = body.findings.find(({ code }: { code: string }) => code === 'V06');
  expect(unit).toMatchObject({ severity: 'error', column: 'E' });
  expect(unit.remedy.length).toBeGreaterThan(10);
  expect(body.rows.every(({ fluxGM2Yr }: { fluxGM2Yr: null }) => fluxGM2Yr === null)).toBe(true);

  const noAge = 'site,latitude,longitude,dust flux (g m-2 yr-1)\nK1,10,20,4\nK2,11,21,8\n';
  const without = (await check(noAge, 'no-age.csv').expect(200)).body;
  const missing = without.findings.filter(
    ({ severity, message }: { severity: string; message: string }) =>
      severity === 'error' && /\bage\b/i.test(message),
  );
  expect(missing.length).toBeGreaterThan(0);
  expect(without.rows.every(({ ageKaBp }: { ageKaBp: null }) => ageKaBp === null)).toBe(true);
});

const REFUSED = [
  'secret.xlsx',
  'ratio.xlsx',
  'image.xlsx',
  'noise.csv',
  'text.xlsx',
  'nothing.csv',
  'far-row.xlsx',
  'entities.xlsx',
  'truncated.xlsx',
];

test.each(hostileFiles.filter(({ fileName }) => REFUSED.includes(fileName)))(
  '$fileName is refused with $status and the code $code, and leaves nothing behind',
  async ({ fileName, make, status, code }) => {
    const refused = await check(make(), fileName).expect(status);
    expect(refused.type).toBe('application/problem+json');
    expect(refused.body).toMatchObject({ code, status, detail: expect.stringMatching(/\S{3}/) });
    expect(await fs.readdir(service.settings.temporaryDir)).toEqual([]);
  },
);

test.each(strangeFiles)('$fileName is read as the honest table that it holds', async ({ fileName, make }) => {
  const { body } = await check(make(), fileName).expect(200);
  expect(body.tables.some(({ sheet }: { sheet: string }) => sheet === 'Fluxes')).toBe(true);
  expect(({} as Record<string, unknown>).polluted).toBeUndefined();
  await modeller.post('/api/v1/calculators/orbit', { ageKaBp: 0 }).expect(200);
});

test('more than 50 MiB is refused with the limit, whatever kind of file it is', async () => {
  const large = Buffer.alloc(50 * 1024 * 1024 + 1, 'a,b\n1,2\n');
  const refused = await check(large, 'large.csv').expect(413);
  expect(refused.body).toMatchObject({ code: 'too-large', limit: 50 * 1024 * 1024 });
  expect(await fs.readdir(service.settings.temporaryDir)).toEqual([]);
});

test('without a file, with two or under another name it is refused and told how', async () => {
  for (const call of [modeller.post(PATH, {}), modeller.post(PATH).field('kind', 'dust-flux')]) {
    const refused = await call.expect(422);
    expect(refused.body.code).toBe('file-missing');
  }
  const other = modeller.post(PATH).attach('sheet', Buffer.from('a,b\n'), 'a.csv');
  expect((await other.expect(422)).body.detail).toContain('"file"');
  await modeller.post(PATH).type('text/csv').send('a,b\n1,2\n').expect(415);
  await service.stranger().post(PATH).expect(401);
  expect(await fs.readdir(service.settings.temporaryDir)).toEqual([]);
});

test('uploads that break off leave no file behind', async () => {
  const server = service.app.getHttpServer();
  if (!server.listening) await new Promise<void>((ready) => server.listen(0, '127.0.0.1', ready));
  const { port } = server.address() as AddressInfo;
  const breakOff = () =>
    new Promise<void>((done) => {
      const call = http.request({
        port,
        host: '127.0.0.1',
        path: PATH,
        method: 'POST',
        headers: {
          Cookie: modeller.cookie,
          'X-CSRF-Token': modeller.csrfToken,
          'Content-Type': 'multipart/form-data; boundary=edge',
          'Content-Length': 10_000_000,
        },
      });
      call.on('error', () => done());
      call.write('--edge\r\nContent-Disposition: form-data; name="file"; filename="a.csv"\r\n\r\n');
      call.write('1,2\n'.repeat(50_000), () => setTimeout(() => call.destroy(), 20));
      call.on('close', () => done());
    });
  await Promise.all(Array.from({ length: 20 }, breakOff));
  for (let tries = 0; tries < 100; tries += 1) {
    if ((await fs.readdir(service.settings.temporaryDir)).length === 0) break;
    await new Promise((later) => setTimeout(later, 50));
  }
  expect(await fs.readdir(service.settings.temporaryDir)).toEqual([]);
  await modeller.get('/api/v1/me').expect(200);
});

test('an access token that may read can check files', async () => {
  const wanted = { name: 'script', scopes: ['read'], expiresInDays: 1 };
  const { token } = (await modeller.post('/api/v1/me/access-tokens', wanted).expect(201)).body;
  const answer = await service
    .stranger()
    .post(PATH)
    .set('Authorization', `Bearer ${token}`)
    .attach('file', sampleFile(REAL_EXPORT), REAL_EXPORT)
    .expect(200);
  expect(answer.body.counts.rows).toBe(18);
});
