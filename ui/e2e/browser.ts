import { execFileSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { brotliDecompressSync } from 'node:zlib';
import { chromium, type Browser } from 'playwright-core';

/** No sandbox inside containers, and nothing that talks to the outside by itself. */
const quiet = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-domain-reliability',
  '--disable-sync',
  '--disable-dev-shm-usage',
  '--font-render-hinting=none',
];

const names = ['chromium', 'chromium-browser', 'google-chrome'];

/** An installed Chromium where there is one, else the one that comes with the packages. */
export async function launchBrowser(): Promise<Browser> {
  const installed = process.env.CHROMIUM_PATH ?? onPath();
  return installed ? chromium.launch({ executablePath: installed, args: quiet }) : launchBundled();
}

function onPath(): string | undefined {
  const folders = (process.env.PATH ?? '').split(path.delimiter);
  return folders.flatMap((folder) => names.map((name) => path.join(folder, name))).find(existsSync);
}

/** The bundled one needs libraries that a bare system lacks; it brings them, packed, and they are tried second. */
async function launchBundled(): Promise<Browser> {
  const { default: bundled } = await import('@sparticuz/chromium');
  bundled.setGraphicsMode = false;
  const executablePath = await bundled.executablePath();
  const env = {
    ...process.env,
    FONTCONFIG_PATH: process.env.FONTCONFIG_PATH ?? path.join(tmpdir(), 'fonts'),
  };
  try {
    return await chromium.launch({ executablePath, args: quiet, env });
  } catch (first) {
    try {
      return await chromium.launch({
        executablePath,
        args: quiet,
        env: { ...env, LD_LIBRARY_PATH: unpack() },
      });
    } catch (second) {
      throw new AggregateError([first, second], 'The bundled browser does not start. Install chromium.', {
        cause: second,
      });
    }
  }
}

function unpack(): string {
  const main = createRequire(import.meta.url).resolve('@sparticuz/chromium');
  const packed = path.resolve(path.dirname(main), '../../bin/al2023.tar.br');
  const folder = path.join(tmpdir(), 'siltlight-browser-libraries');
  mkdirSync(folder, { recursive: true });
  execFileSync('tar', ['-xf', '-', '-C', folder], { input: brotliDecompressSync(readFileSync(packed)) });
  return path.join(folder, 'lib');
}
