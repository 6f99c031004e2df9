import { createHash, randomBytes } from 'node:crypto';
import * as fs from 'node:fs/promises';
import * as path from 'node:path';
import { buffer } from 'node:stream/consumers';
import { FileStore } from '../src/files/file-store.service';
import { FileSweep } from '../src/files/file-sweep.service';
import { StoredFileRow } from '../src/files/models/stored-file-row';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
let store: FileStore;
beforeAll(async () => {
  service = await testApp();
  store = service.app.get(FileStore);
});
afterAll(() => service.close());

const label = { fileName: 'Dôme C (final).xlsx', mediaType: 'application/octet-stream' };
const TWO_HOURS_MS = 2 * 60 * 60 * 1000;

test('bytes come back as they went in, under their SHA-256, with the name they came with', async () => {
  const bytes = randomBytes(100_000);
  const { sha256 } = await store.put(bytes, label);
  expect(sha256).toBe(createHash('sha256').update(bytes).digest('hex'));
  expect((await buffer(await store.stream(sha256))).equals(bytes)).toBe(true);
  expect(
    (await buffer(await store.stream(sha256, { start: 10, end: 19 }))).equals(bytes.subarray(10, 20)),
  ).toBe(true);
  expect(await store.describe(sha256)).toMatchObject({ ...label, bytes: 100_000 });
});

test('a file is taken over from the temporary folder; the same bytes twice are kept once', async () => {
  const upload = path.join(service.settings.temporaryDir, 'upload');
  await fs.writeFile(upload, 'the same');
  const [first, second] = [await store.put(upload, label), await store.put(Buffer.from('the same'), label)];
  expect(second).toEqual(first);
  expect(await fs.readdir(service.settings.temporaryDir)).toEqual([]);
  expect(await StoredFileRow.count({ where: { sha256: first.sha256 } })).toBe(1);
});

test.each(['../../siltlight.sqlite', 'A'.repeat(64), '', `${'a'.repeat(63)}/`])(
  '%j is no name of a file',
  async (name) => {
    expect(() => store.path(name)).toThrow(expect.objectContaining({ status: 404 }));
    await expect(store.stream(name)).rejects.toMatchObject({ status: 404 });
  },
);

test('an unknown file is not found', async () => {
  await expect(store.stream('0'.repeat(64))).rejects.toMatchObject({ status: 404 });
  await expect(store.describe('0'.repeat(64))).rejects.toMatchObject({ status: 404 });
});

test('the sweep removes abandoned files, keeps young and known ones, and tells of rows without a file', async () => {
  const { sha256: kept } = await store.put(Buffer.from('kept'), label);
  const { sha256: lost } = await store.put(Buffer.from('lost'), label);
  await fs.rm(store.path(lost));
  const stray = store.path('f'.repeat(64));
  await fs.mkdir(path.dirname(stray), { recursive: true });
  await fs.writeFile(stray, 'without a row');
  const aborted = path.join(service.settings.temporaryDir, 'aborted-upload');
  await fs.writeFile(aborted, 'half');
  const sweep = service.app.get(FileSweep);
  expect(await sweep.sweep()).toEqual({ temporaryRemoved: 0, withoutRowRemoved: 0, withoutFile: [lost] });
  const later = await sweep.sweep(Date.now() + TWO_HOURS_MS);
  expect(later).toEqual({ temporaryRemoved: 1, withoutRowRemoved: 1, withoutFile: [lost] });
  expect((await buffer(await store.stream(kept))).toString()).toBe('kept');
});
