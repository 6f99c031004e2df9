import * as fs from 'node:fs/promises';
import { createHash } from 'node:crypto';
import { LedgerService } from '../src/ledger/ledger.service';
import { answers } from './support/form';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import {
  approved,
  described,
  expectedRows,
  expectRows,
  handedIn,
  REAL_EXPORT,
  REAL_WORKBOOK,
  sampleFile,
  Steps,
  SUBMISSIONS,
  upload,
  uploaded,
} from './support/submitting';
import { testAppWithPeople } from './support/demo-people';
import type { TestApp } from './support/test-app';

let service: TestApp;
let scientist: SignedInCaller;
let scientist2: SignedInCaller;
let steward: SignedInCaller;
beforeAll(async () => {
  service = await testAppWithPeople();
  scientist = await signedInAs(service, 'scientist');
  scientist2 = await signedInAs(service, 'scientist2');
  steward = await signedInAs(service, 'steward');
});
afterAll(() => service.close());

const ledger = () => service.app.get(LedgerService, { strict: false });

/** The two files of the first job, from the upload to the samples of the version. */
test.each([
  { fileName: REAL_WORKBOOK, expected: 'A_expected.csv' as const, used: ['EDC', 'NGRIP'] },
  { fileName: REAL_EXPORT, expected: 'B_expected.csv' as const, used: ['B_Staubfluesse_Export'] },
])(
  '$fileName is proposed, vetted, handed in and approved, and its samples equal the expected rows',
  async ({ fileName, expected, used }) => {
    const steps = new Steps(await uploaded(scientist, sampleFile(fileName), fileName));
    const { mapping } = steps.detail;
    expect(mapping.tables.filter((table) => table.used).map(({ sheet }) => sheet)).toEqual(used);
    for (const table of mapping.tables) expect(table.reason.length).toBeGreaterThan(15);
    for (const { reason } of mapping.columns) expect(reason.length).toBeGreaterThan(10);

    const refused = await steps.call(scientist, 'submit').expect(422);
    expect(refused.body.code).toBe('not-ready');
    const pointers = refused.body.errors.map(({ pointer }: { pointer: string }) => pointer);
    expect(pointers).toEqual(expect.arrayContaining(['/metadata/licence', '/metadata/creators']));
    for (const { message } of refused.body.errors) expect(message.length).toBeGreaterThan(20);

    await steps.put(scientist, 'metadata', { ...answers, title: `Fluxes of ${fileName}` });
    expect(steps.detail).toMatchObject({ missingMetadata: [], rights: { maySubmit: true, whyNot: null } });
    for (const finding of await steps.findings(scientist)) {
      expect(finding.message).toMatch(/^\S.{20,}/s);
      expect(finding.remedy.length).toBeGreaterThan(5);
    }
    await steps.post(scientist, 'submit');
    expect(steps.detail).toMatchObject({ state: 'submitted', rights: { mayEdit: false } });

    const queue = (await steward.get(`${SUBMISSIONS}?queue=true&limit=200`).expect(200)).body.items;
    expect(queue.map(({ id }: { id: string }) => id)).toContain(steps.detail.id);
    await steps.waiveAll(steward);
    await steps.post(steward, 'decision', { decision: 'approve' });
    const { slug, versionNumber } = steps.detail.dataset!;
    const base = `/api/v1/datasets/${slug}/versions/${versionNumber}`;
    const samples = (await scientist.get(`${base}/samples?limit=1000`).expect(200)).body;
    expectRows(samples.items, expectedRows(expected));
    expect(samples.total).toBe(expectedRows(expected).length);

    const sha256 = createHash('sha256').update(sampleFile(fileName)).digest('hex');
    for (const path of [`${base}/file`, `${steps.path}/file`]) {
      const file = await scientist.get(path).responseType('blob').expect(200);
      expect(
        createHash('sha256')
          .update(file.body as Buffer)
          .digest('hex'),
      ).toBe(sha256);
      expect(file.headers['content-disposition']).toMatch(/^attachment; filename="/);
      expect(file.headers['x-content-type-options']).toBe('nosniff');
      expect(file.headers['x-checksum-sha256']).toBe(sha256);
    }
  },
);

test('a double click makes one submission; the same bytes sent anew later are told', async () => {
  const bytes = Buffer.from('site,lat,lon,age (ka BP),dust flux (g m-2 yr-1)\nZ1,10.25,20.5,1.5,4.1\n');
  const [a, b] = await Promise.all([
    uploaded(scientist, bytes, 'twice.csv'),
    uploaded(scientist, bytes, 'twice.csv'),
  ]);
  expect(b.id).toBe(a.id);
  await scientist
    .put(`${SUBMISSIONS}/${a.id}/metadata`, { ...a.metadata, note: 'Worked on.' })
    .set('If-Match', '"1"')
    .expect(200);
  const later = await uploaded(scientist, bytes, 'twice.csv');
  expect(later.sameFileAs).toEqual({ id: a.id, number: a.number });
});

test('the same bytes under another name are read on their own: the sheet is called after the file', async () => {
  const first = await described(scientist, undefined, 'one.csv');
  // More uploads than parsed files and evaluations are kept in memory.
  for (let count = 0; count < 8; count += 1) await described(scientist, undefined, `other-${count}.csv`);
  const grid = await scientist.get(`${first.path}/grid?sheet=one&fromRow=3&limit=1`).expect(200);
  expect(grid.body.rows[0].cells.F).toMatchObject({ text: '0.42', value: 0.42 });
  await scientist.get(`${first.path}/grid?sheet=other-7`).expect(404);
});

test('a refused upload leaves no submission, no ledger row and no file', async () => {
  const before = await ledger().count({});
  const { total } = (await scientist.get(SUBMISSIONS).expect(200)).body;
  await upload(scientist, Buffer.from('%PDF-1.7'), 'report.xlsx').expect(415);
  await upload(scientist, 'a,b\n1,2\n', 'a.csv', { kind: 'pollen' }).expect(422);
  await upload(scientist, 'a,b\n1,2\n', 'a.csv', { state: 'approved' }).expect(422);
  await scientist.post(SUBMISSIONS, {}).expect(422);
  expect(await ledger().count({})).toBe(before);
  expect((await scientist.get(SUBMISSIONS).expect(200)).body.total).toBe(total);
  expect(await fs.readdir(service.settings.temporaryDir)).toEqual([]);
});

test('a draft is nobody else’s to see: 404 for another scientist and for stewards, whatever they call', async () => {
  const { path, detail } = await described(scientist);
  const acts: [method: 'get' | 'post' | 'put' | 'delete', path: string, body?: object][] = [
    ['get', path],
    ['get', `${path}/grid?sheet=small`],
    ['get', `${path}/findings`],
    ['get', `${path}/file`],
    ['get', `${path}/history`],
    ['put', `${path}/mapping`, detail.mapping],
    ['put', `${path}/metadata`, answers],
    ['post', `${path}/corrections`, { corrections: [{ sheet: 'small', row: 3, column: 'F', text: '1' }] }],
    ['delete', `${path}/corrections/none`],
    ['post', `${path}/leave-out`, { rows: [{ sheet: 'small', row: 3 }], reason: 'because' }],
    ['post', `${path}/take-back`, { rows: [{ sheet: 'small', row: 3 }] }],
    ['post', `${path}/submit`],
    ['post', `${path}/withdraw`, { reason: 'because' }],
  ];
  for (const other of [scientist2, steward]) {
    for (const [method, where, body] of acts) {
      const call = other[method](where, body).set('If-Match', `"${detail.revision}"`);
      expect({ method, where, code: (await call.expect(404)).body.code }).toEqual({
        method,
        where,
        code: 'not-found',
      });
    }
    const seen = (await other.get(`${SUBMISSIONS}?limit=200`).expect(200)).body.items;
    expect(seen.map(({ id }: { id: string }) => id)).not.toContain(detail.id);
  }
  const withdrawn = await scientist
    .post(`${path}/withdraw`, { reason: 'never mind' })
    .set('If-Match', `"${detail.revision}"`)
    .expect(200);
  expect(withdrawn.body.state).toBe('withdrawn');
  await steward.get(path).expect(404);
});

test('every change needs the revision that was seen: 428 without, 412 with an old one, and one of two wins', async () => {
  const steps = await described(scientist);
  await scientist.put(`${steps.path}/metadata`, answers).expect(428);
  await scientist.post(`${steps.path}/submit`).expect(428);
  const old = await scientist.put(`${steps.path}/metadata`, answers).set('If-Match', '"1"').expect(412);
  expect(old.body.code).toBe('changed-meanwhile');
  const both = await Promise.all(
    ['one', 'two'].map((note) =>
      scientist.put(`${steps.path}/metadata`, { ...answers, note }).set('If-Match', steps.tag),
    ),
  );
  expect(both.map(({ status }) => status).sort()).toEqual([200, 412]);
  const kept = both.find(({ status }) => status === 200)!.body;
  expect((await steps.reload(scientist)).metadata.note).toBe(kept.metadata.note);
});

test('fields that are not the caller’s to set are refused everywhere, and nothing changes', async () => {
  const steps = await described(scientist);
  const { mapping } = steps.detail;
  const rows = [{ sheet: 'small', row: 3 }];
  const correction = { sheet: 'small', row: 3, column: 'F', text: '1' };
  const bodies: [method: 'put' | 'post', act: string, body: object][] = [
    ['put', 'metadata', answers],
    ['put', 'mapping', mapping],
    ['post', 'corrections', { corrections: [correction] }],
    ['post', 'leave-out', { rows, reason: 'because' }],
    ['post', 'take-back', { rows }],
    ['post', 'withdraw', { reason: 'because' }],
  ];
  for (const [method, act, body] of bodies) {
    const set = { state: 'approved', contributorId: 'me', revision: 9, createdAt: '1999-01-01T00:00:00Z' };
    for (const [field, value] of Object.entries(set)) {
      const call = scientist[method](`${steps.path}/${act}`, { ...body, [field]: value });
      const refused = await call.set('If-Match', steps.tag).expect(422);
      expect(refused.body.detail).toContain(field);
    }
  }
  const before = steps.detail;
  expect(await steps.reload(scientist)).toEqual(before);
});

test('the mapping form is remembered for the contributor’s next file, and for nobody else', async () => {
  const sheet = (flux: number) =>
    `place,breadth,length,when,quux\nR1,10.25,20.5,1.5,${flux}\nR1,10.25,20.5,2.5,4.2\n`;
  const first = await uploaded(scientist, sheet(4.1), 'odd.csv');
  const steps = new Steps(first);
  const [table] = first.mapping.tables;
  const fields: Record<string, [string, string | null]> = {
    A: ['site', null],
    B: ['latitudeDeg', '°'],
    C: ['longitudeDeg', '°'],
    D: ['ageKaBp', 'ka BP'],
    E: ['fluxGM2Yr', 'mg m-2 yr-1'],
  };
  const columns = Object.entries(fields).map(([column, [field, unit]], index) => ({
    sheet: 'odd',
    column,
    heading: ['place', 'breadth', 'length', 'when', 'quux'][index]!,
    field,
    unit,
    confidence: 1,
    reason: 'By hand.',
  }));
  const mapping = {
    tables: [{ ...table!, headerRows: [1], unitsRow: null, firstRow: 2, lastRow: 3, used: true }],
    columns,
    constants: [],
  };
  await steps.put(scientist, 'mapping', mapping);
  expect(steps.detail.counts).toMatchObject({ rows: 2, usableRows: 2 });
  const next = await uploaded(scientist, sheet(5.3), 'odd.csv');
  const quux = next.mapping.columns.find(({ heading }) => heading === 'quux')!;
  expect(quux).toMatchObject({ field: 'fluxGM2Yr', unit: 'mg m-2 yr-1' });
  expect(quux.reason).toMatch(/last time/);
  const theirs = await uploaded(scientist2, sheet(5.3), 'odd.csv');
  expect(theirs.mapping.columns.find(({ heading }) => heading === 'quux')?.field ?? null).toBeNull();
});

test('a mapping that does not fit the file is refused with a pointer to each fault, and the old one stays', async () => {
  const steps = await described(scientist);
  const { mapping } = steps.detail;
  const bad = {
    ...mapping,
    tables: [{ ...mapping.tables[0]!, lastRow: 4000 }],
    columns: [{ ...mapping.columns[0]!, sheet: 'nowhere' }, ...mapping.columns.slice(1)],
  };
  const refused = await scientist.put(`${steps.path}/mapping`, bad).set('If-Match', steps.tag).expect(422);
  expect(refused.body.errors.map(({ pointer }: { pointer: string }) => pointer)).toEqual([
    '/tables/0/lastRow',
    '/columns/0/sheet',
  ]);
  expect((await steps.reload(scientist)).mapping).toEqual(mapping);
});

test('the proposal sent back as the mapping changes nothing that is read', async () => {
  const steps = new Steps(await uploaded(scientist, sampleFile(REAL_WORKBOOK), REAL_WORKBOOK));
  const { counts, mapping } = steps.detail;
  await steps.put(scientist, 'mapping', mapping);
  expect(steps.detail).toMatchObject({ counts, mapping });
});

test('a mend types over a cell, keeps the raw text, and can be undone', async () => {
  const text =
    'site,latitude,longitude,age (ka BP),dust flux (g m-2 yr-1)\nM1,10.25,20.5,1.5,four\nM1,10.25,20.5,2.5,4.2\n';
  const steps = await described(scientist, text, 'mend.csv');
  const usable = steps.detail.counts.usableRows;
  const errors = steps.detail.counts.errors;
  expect(errors).toBeGreaterThan(0);
  const mend = { sheet: 'mend', row: 2, column: 'E', text: '4.0' };
  await steps.post(scientist, 'corrections', { corrections: [mend] });
  expect(steps.detail.corrections).toMatchObject([
    { ...mend, rawText: 'four', by: { name: 'Ilka Vossberg' } },
  ]);
  expect(steps.detail.counts.usableRows).toBe(usable + 1);
  expect(steps.detail.counts.errors).toBeLessThan(errors);
  const cell = (await scientist.get(`${steps.path}/grid?sheet=mend&fromRow=2&limit=1`).expect(200)).body
    .rows[0].cells.E;
  expect(cell).toMatchObject({ text: 'four', mended: '4.0', value: 4 });

  const undo = scientist.delete(`${steps.path}/corrections/${steps.detail.corrections[0]!.id}`);
  const undone = await undo.set('If-Match', steps.tag).expect(200);
  expect(undone.body).toMatchObject({ corrections: [], counts: { usableRows: usable, errors } });
  const gone = scientist.delete(`${steps.path}/corrections/${mend.sheet}`);
  await gone.set('If-Match', `"${undone.body.revision}"`).expect(404);
  const nowhere = { corrections: [mend, { ...mend, row: 900 }] };
  const refused = await scientist
    .post(`${steps.path}/corrections`, nowhere)
    .set('If-Match', `"${undone.body.revision}"`)
    .expect(422);
  expect(refused.body.errors[0].pointer).toBe('/corrections/1/row');
});

test('rows are left out with a reason, stay visible, and are taken back', async () => {
  const steps = await described(scientist);
  const rows = [{ sheet: 'small', row: 3 }];
  await steps.post(scientist, 'leave-out', { rows: [...rows, ...rows], reason: 'Turbidite.' });
  expect(steps.detail).toMatchObject({
    leftOut: [{ ...rows[0], reason: 'Turbidite.' }],
    counts: { rows: 2, usableRows: 1, leftOut: 1 },
  });
  const grid = (await scientist.get(`${steps.path}/grid?sheet=small&fromRow=3&limit=2`).expect(200)).body;
  expect(grid.rows.map(({ leftOut }: { leftOut: string | null }) => leftOut)).toEqual(['Turbidite.', null]);
  await steps.post(scientist, 'leave-out', { rows, reason: 'A slump.' });
  expect(steps.detail.leftOut).toEqual([{ ...rows[0], reason: 'A slump.' }]);
  await steps.post(scientist, 'take-back', { rows });
  expect(steps.detail).toMatchObject({ leftOut: [], counts: { usableRows: 2, leftOut: 0 } });
  await steps.call(scientist, 'leave-out', { rows, reason: 'x' }).expect(422);
  const refused = await steps.call(scientist, 'leave-out', {
    rows: [{ sheet: 'small', row: 99 }],
    reason: 'Turbidite.',
  });
  expect(refused.body.errors?.[0].pointer).toBe('/rows/0/row');
});

test('the grid gives a window of raw cells with canonical values under the mapped ones', async () => {
  const { path } = new Steps(await uploaded(scientist, sampleFile(REAL_WORKBOOK), REAL_WORKBOOK));
  const grid = (await scientist.get(`${path}/grid?sheet=EDC&fromRow=5&limit=6`).expect(200)).body;
  expect(grid).toMatchObject({
    sheet: 'EDC',
    rowCount: 158,
    fromRow: 5,
    columns: ['A', 'B', 'C', 'D', 'E', 'F', 'G'],
  });
  expect(grid.rows.map(({ row, data }: { row: number; data: boolean }) => [row, data])).toEqual([
    [5, false],
    [6, false],
    [7, true],
    [8, true],
    [9, true],
    [10, true],
  ]);
  const flux = grid.rows[3].cells.F;
  expect(flux.value).toBeCloseTo(Number(flux.text) / 1000, 9);
  expect(flux).toMatchObject({ unit: 'g m-2 yr-1', rule: expect.stringContaining('mg m-2 yr-1') });
  const past = (await scientist.get(`${path}/grid?sheet=EDC&fromRow=5000`).expect(200)).body;
  expect(past.rows).toEqual([]);
  await scientist.get(`${path}/grid?sheet=nowhere`).expect(404);
  await scientist.get(`${path}/grid?sheet=EDC&limit=501`).expect(422);
});

test('findings are filtered, paged and counted by rule', async () => {
  const { path } = new Steps(await uploaded(scientist, sampleFile(REAL_EXPORT), REAL_EXPORT));
  const all = (await scientist.get(`${path}/findings?limit=1000`).expect(200)).body;
  expect(all.items.length).toBe(all.total);
  expect(all.byRule.reduce((sum: number, { count }: { count: number }) => sum + count, 0)).toBe(all.total);
  const errors = (await scientist.get(`${path}/findings?severity=error&offset=1&limit=2`).expect(200)).body;
  expect(errors.items.length).toBe(2);
  expect(errors.items.every(({ severity }: { severity: string }) => severity === 'error')).toBe(true);
  const v79 = (await scientist.get(`${path}/findings?code=V79`).expect(200)).body;
  expect(v79).toMatchObject({ total: 1, items: [{ code: 'V79', remedyKind: 'answer' }] });
  await scientist.get(`${path}/findings?limit=1001`).expect(422);
});

test('the history tells each act once, newest first, and lists page by a cursor', async () => {
  const steps = await handedIn(scientist);
  const { items } = (await scientist.get(`${steps.path}/history`).expect(200)).body;
  expect(items.map(({ summary }: { summary: string }) => summary.replace(/^S-\d+:? /, ''))).toEqual([
    'handed in',
    'form filled in',
    'uploaded: small.csv',
  ]);
  expect(items[0]).toMatchObject({ who: { name: 'Ilka Vossberg' }, at: expect.stringMatching(/Z$/) });

  const seen: string[] = [];
  let cursor = '';
  do {
    const page = (await scientist.get(`${SUBMISSIONS}?mine=true&limit=3${cursor}`).expect(200)).body;
    seen.push(...page.items.map(({ number }: { number: string }) => number));
    cursor = page.nextCursor === null ? '' : `&cursor=${encodeURIComponent(page.nextCursor)}`;
    expect(page.total).toBeGreaterThan(3);
  } while (cursor !== '');
  expect(seen).toEqual([...new Set(seen)].sort().reverse());
  const drafts = (await scientist.get(`${SUBMISSIONS}?state=draft&limit=200`).expect(200)).body.items;
  expect(drafts.every(({ state }: { state: string }) => state === 'draft')).toBe(true);
});

test('a file without one usable row cannot be handed in', async () => {
  const steps = await described(scientist);
  const rows = [3, 4].map((row) => ({ sheet: 'small', row }));
  await steps.post(scientist, 'leave-out', { rows, reason: 'All of it.' });
  const refused = await steps.call(scientist, 'submit').expect(422);
  expect(['no-usable-row', 'not-ready']).toContain(refused.body.code);
});

test('rules and templates are there for everybody who is signed in', async () => {
  const rules = (await scientist.get('/api/v1/rules').expect(200)).body.items;
  expect(rules.length).toBeGreaterThanOrEqual(25);
  for (const { id, title, why, source } of rules) {
    expect(id).toMatch(/^V\d\d$/);
    for (const text of [title, why, source]) expect(text.length).toBeGreaterThan(3);
  }
  const template = await scientist.get(`${SUBMISSIONS}/template?kind=dust-flux`).expect(200);
  expect(template.headers['content-type']).toMatch(/^text\/csv/);
  expect(template.headers['content-disposition']).toMatch(/attachment; filename="\S+\.csv"/);
  const read = await uploaded(scientist, template.text, 'template.csv');
  expect(read.mapping.tables.length).toBeGreaterThan(0);
});

test('the chain of the ledger holds after all of this', async () => {
  await approved(scientist, steward);
  expect(await ledger().verify()).toMatchObject({ intact: true, firstBroken: null });
});
