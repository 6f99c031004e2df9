import { execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import * as path from 'node:path';
import { Sequelize } from 'sequelize-typescript';
import type { DatasetVersionDetail } from '@siltlight/common/wire/datasets';
import { MailboxRow } from '../src/notifications/models/mailbox-row';
import { testAppWithPeople } from './support/demo-people';
import { answers } from './support/form';
import { signedInAs, type SignedInCaller } from './support/sign-in';
import {
  approved,
  expectedRows,
  expectRows,
  REAL_EXPORT,
  REAL_WORKBOOK,
  sampleFile,
  SMALL_TABLE,
  type Steps,
} from './support/submitting';
import type { TestApp } from './support/test-app';

let service: TestApp;
let scientist: SignedInCaller;
let steward: SignedInCaller;
let modeller: SignedInCaller;
let real: Steps;
let base: string;
beforeAll(async () => {
  service = await testAppWithPeople();
  scientist = await signedInAs(service, 'scientist');
  steward = await signedInAs(service, 'steward');
  modeller = await signedInAs(service, 'modeller');
  real = await approved(scientist, steward, sampleFile(REAL_WORKBOOK), REAL_WORKBOOK, { grade: 'measured' });
  base = `/api/v1/datasets/${real.detail.dataset!.slug}/versions/1`;
});
afterAll(() => service.close());

const sha256 = (bytes: Buffer | string) => createHash('sha256').update(bytes).digest('hex');
const detailOf = async (where = base) => (await modeller.get(where).expect(200)).body as DatasetVersionDetail;

test('approval makes one published version with citation, sites, metadata and the link back to the submission', async () => {
  const detail = await detailOf();
  expect(detail).toMatchObject({
    title: answers.title,
    kind: 'dust-flux',
    invented: false,
    grade: 'measured',
    sampleCount: 240,
    metadata: answers,
    version: { number: 1, state: 'published', publishedBy: { name: 'Mirela Castag' } },
    submission: { id: real.detail.id, number: real.detail.number },
    file: { fileName: REAL_WORKBOOK, sha256: sha256(sampleFile(REAL_WORKBOOK)) },
    usedBy: [],
    rights: { mayWithdraw: false },
  });
  expect(detail.versions).toHaveLength(1);
  expect(detail.sites.map(({ site, regionCode }) => [site, regionCode])).toEqual([
    ['EDC', 'EAN'],
    ['NGRIP', 'GIC'],
  ]);
  const year = new Date().getUTCFullYear();
  expect(detail.citation).toBe(
    `Ilka Vossberg (${year}): ${answers.title}, version 1. Siltlight Holdings. CC-BY-4.0. ` +
      `Supplement to https://doi.org/10.1038/nature06763. SHA-256 ${detail.version.checksum}.`,
  );
  const { items } = (await modeller.get('/api/v1/datasets').expect(200)).body;
  expect(items).toMatchObject([
    { slug: detail.slug, siteCount: 2, sampleCount: 240, latest: detail.version },
  ]);
});

test('the checksum is that of the content as sent, and a second program computes it from the document alone', async () => {
  const { checksum } = (await detailOf()).version;
  const content = await modeller.get(`${base}/content`).expect(200);
  expect(content.headers.etag).toBe(`"${checksum}"`);
  expect(sha256(content.text)).toBe(checksum);
  const program = path.join(__dirname, 'support/canonical_checksum.py');
  expect(
    execFileSync('python3', [program], { input: `${content.text}\n` })
      .toString()
      .trim(),
  ).toBe(checksum);
  await modeller.get(`${base}/content`).set('If-None-Match', `"${checksum}"`).expect(304);
  const rows = JSON.parse(content.text).samples;
  expectRows(rows, expectedRows('A_expected.csv'));
});

test('samples page in the order of the file, by site, each with its cells', async () => {
  const page = (await modeller.get(`${base}/samples?site=NGRIP&offset=2&limit=3`).expect(200)).body;
  const ngrip = expectedRows('A_expected.csv').filter(({ site }) => site === 'NGRIP');
  expect(page.total).toBe(ngrip.length);
  expectRows(page.items, ngrip.slice(2, 5));
  const [first] = page.items;
  expect(first).toMatchObject({ sheet: 'NGRIP', quantity: 'dust', sizeCutoff: 'bulk' });
  const flux = first.cells.fluxGM2Yr;
  expect(flux).toMatchObject({ cell: `F${first.row}`, raw: expect.stringMatching(/\d/) });
  const around = (await modeller.get(`${base}/cells?sheet=NGRIP&row=${first.row}`).expect(200)).body;
  expect(around).toMatchObject({ fileName: REAL_WORKBOOK, sheet: 'NGRIP', versionNumber: 1 });
  const row = around.rows.find((entry: { row: number }) => entry.row === first.row);
  expect(row.cells.F).toBe(flux.raw);
  expect(around.rows.length).toBeLessThanOrEqual(33);
  await modeller.get(`${base}/cells?sheet=nowhere&row=3`).expect(404);
  await modeller.get(`${base}/samples?limit=1001`).expect(422);
});

test('PROV names the file, the version, the vetting and both people, each under a name that is declared', async () => {
  const prov = (await modeller.get(`${base}/provenance`).expect(200)).body;
  const { checksum } = (await detailOf()).version;
  const names = new Set(['entity', 'activity', 'agent'].flatMap((kind) => Object.keys(prov[kind])));
  for (const relation of [
    'used',
    'wasGeneratedBy',
    'wasDerivedFrom',
    'wasAttributedTo',
    'wasAssociatedWith',
  ]) {
    for (const link of Object.values(prov[relation] as Record<string, Record<string, string>>)) {
      const ends = Object.entries(link).filter(([key]) => key !== 'prov:time');
      expect(ends).toHaveLength(2);
      for (const [, name] of ends) expect(names).toContain(name);
    }
  }
  expect(JSON.stringify(prov)).toContain(checksum);
  expect(JSON.stringify(prov)).toContain(sha256(sampleFile(REAL_WORKBOOK)));
  for (const name of names) expect(Object.keys(prov.prefix)).toContain(name.split(':')[0]);
});

test('the contributor finds one mail about the approval in the mailbox', async () => {
  let mails: { subject: string; id: string }[] = [];
  for (let tries = 0; tries < 200 && mails.length === 0; tries += 1) {
    const { items } = (await scientist.get('/api/v1/mailbox?limit=200').expect(200)).body;
    mails = items.filter(({ subject }: { subject: string }) => subject.includes('approved'));
    await new Promise((later) => setTimeout(later, 50));
  }
  expect(mails).toHaveLength(1);
  expect(mails[0]!.subject).toContain(real.detail.number);
  const { text } = (await scientist.get(`/api/v1/mailbox/${mails[0]!.id}`).expect(200)).body;
  expect(text).toContain((await detailOf()).version.checksum);
  expect(await MailboxRow.count({ where: { subject: mails[0]!.subject } })).toBe(1);
});

test('a second approval into the same dataset supersedes the first, which stays as it was', async () => {
  const before = await modeller.get(`${base}/content`).expect(200);
  const { slug } = real.detail.dataset!;
  const next = await approved(scientist, steward, sampleFile(REAL_EXPORT), REAL_EXPORT, {
    datasetSlug: slug,
  });
  expect(next.detail.dataset).toMatchObject({ slug, versionNumber: 2 });
  const latest = await detailOf(`/api/v1/datasets/${slug}`);
  expect(latest.version).toMatchObject({ number: 2, state: 'published' });
  expect(latest.versions.map(({ number, state }) => [number, state])).toEqual([
    [1, 'superseded'],
    [2, 'published'],
  ]);
  expect((await modeller.get(`${base}/content`).expect(200)).text).toBe(before.text);
  expect((await modeller.get('/api/v1/datasets').expect(200)).body.items).toHaveLength(1);
});

test('a version is withdrawn with a reason by a steward, stays readable, and is not withdrawn twice', async () => {
  const steps = await approved(scientist, steward, SMALL_TABLE, 'withdrawn.csv');
  const where = `/api/v1/datasets/${steps.detail.dataset!.slug}/versions/1`;
  await scientist.post(`${where}/withdraw`, { reason: 'wrong unit' }).expect(403);
  await steward.post(`${where}/withdraw`, {}).expect(422);
  await steward.post(`${where}/withdraw`, { reason: 'wrong unit', state: 'draft' }).expect(422);
  const both = await Promise.all(
    [1, 2].map(() => steward.post(`${where}/withdraw`, { reason: 'The unit was wrong.' })),
  );
  expect(both.map(({ status }) => status).sort()).toEqual([200, 409]);
  const detail = await detailOf(where);
  expect(detail.version).toMatchObject({ state: 'withdrawn', withdrawnReason: 'The unit was wrong.' });
  await modeller.get(`${where}/content`).expect(200);
  const { items } = (await modeller.get('/api/v1/datasets').expect(200)).body;
  expect(items.map(({ slug }: { slug: string }) => slug)).not.toContain(detail.slug);
});

test('no statement changes or deletes a version or its samples', async () => {
  const run = (sql: string) => service.app.get(Sequelize).query(sql);
  for (const sql of [
    'UPDATE samples SET flux_g_m2_yr = 1',
    'DELETE FROM samples',
    `UPDATE versions SET content = '{}' WHERE state <> 'draft'`,
    `UPDATE versions SET checksum = 'x' WHERE state <> 'draft'`,
    `DELETE FROM versions WHERE state <> 'draft'`,
  ]) {
    await expect(run(sql)).rejects.toThrow();
  }
});

test('what does not exist is not found, whatever is asked of it', async () => {
  const paths = ['', '/samples', '/content', '/file', '/provenance', '/cells?sheet=EDC&row=1'];
  for (const rest of paths) {
    await modeller.get(`/api/v1/datasets/nowhere/versions/1${rest}`).expect(404);
    await modeller.get(`${base.replace(/1$/, '99')}${rest}`).expect(404);
    const odd = await modeller.get(`${base.replace(/1$/, 'one')}${rest}`);
    expect([400, 404, 422]).toContain(odd.status);
    expect(odd.type).toBe('application/problem+json');
  }
  for (const method of ['put', 'patch', 'delete'] as const) {
    const refused = await (method === 'delete' ? steward.delete(base) : steward[method](base, {}));
    expect([404, 405]).toContain(refused.status);
  }
});
