import * as fs from 'node:fs';
import * as os from 'node:os';
import * as path from 'node:path';
import { readSettings, SettingsError } from './read-settings';

const dataDir = fs.mkdtempSync(path.join(os.tmpdir(), 'siltlight-settings-'));
afterAll(() => fs.rmSync(dataDir, { recursive: true }));
const given = (variables: Record<string, string>) =>
  readSettings({ SILTLIGHT_DATA_DIR: dataDir, ...variables });

test('without any variable it is the demo on port 3000, with a secret of its own that it keeps', () => {
  const settings = given({});
  expect(settings).toMatchObject({
    port: 3000,
    demo: true,
    publicUrl: 'http://127.0.0.1:3000',
    smtp: undefined,
  });
  expect(Buffer.byteLength(settings.secret)).toBeGreaterThanOrEqual(32);
  expect(given({}).secret).toBe(settings.secret);
});

test('production is not the demo, and does not start without a secret', () => {
  expect(() => given({ NODE_ENV: 'production' })).toThrow(/SILTLIGHT_SECRET is not set.*openssl rand/);
  expect(given({ NODE_ENV: 'production', SILTLIGHT_SECRET: 's'.repeat(32) })).toMatchObject({ demo: false });
  expect(given({ NODE_ENV: 'production', SILTLIGHT_DEMO: 'on' }).demo).toBe(true);
  expect(() => given({ SILTLIGHT_DEMO: '0' })).toThrow(SettingsError);
});

test.each([
  ['PORT', 'many', '"many"'],
  ['PORT', '70000', '"70000"'],
  ['SILTLIGHT_DEMO', 'maybe', '"maybe"'],
  ['SILTLIGHT_PUBLIC_URL', 'ftp://example.org', '"ftp://example.org"'],
  ['SILTLIGHT_SMTP_PORT', '-1', '"-1"'],
])('%s=%s is refused with the variable, its value and a remedy', (variable, value, shown) => {
  expect(() => given({ [variable]: value })).toThrow(
    new RegExp(`^${variable} is ${shown}, which cannot be used\\. \\w+`),
  );
});

test('a short secret or password is refused without being shown', () => {
  expect(() => given({ SILTLIGHT_SECRET: 'tiny-secret' })).toThrow(/SILTLIGHT_SECRET is a text of 11 bytes/);
  expect(() => given({ SILTLIGHT_DEMO_PASSWORD: 'tiny-password' })).toThrow(/a text of 13 bytes/);
});
