import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { cpSync, existsSync, mkdtempSync, rmSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';

export const root = path.resolve(import.meta.dirname, '../..');

/** Of the demo only; at least 15 characters, as every password. */
const password = 'walks over invented ice';
const READY_WITHIN_MS = 120_000;
const STOPPED_WITHIN_MS = 15_000;

export type Product = {
  url: string;
  password: string;
  /** Ends the product as a service manager would; the data folder may be looked at before it goes. */
  stop: (look?: (dataDir: string) => void) => Promise<void>;
};

/**
 * The built product as a person starts it: its own port, its own data folder, the demo on.
 * @param seededDir a data folder to begin with a copy of, which saves the seeding
 */
export async function startProduct(seededDir?: string): Promise<Product> {
  requireBuilt('service/dist/main.js', 'ui/dist/index.html');
  const dataDir = mkdtempSync(path.join(tmpdir(), 'siltlight-walk-'));
  if (seededDir) cpSync(seededDir, dataDir, { recursive: true });
  const port = await freePort();
  const { PATH, HOME } = process.env;
  const server = spawn(process.execPath, ['service/dist/main.js'], {
    cwd: root,
    env: {
      PATH,
      HOME,
      PORT: String(port),
      SILTLIGHT_DATA_DIR: dataDir,
      SILTLIGHT_DEMO: 'on',
      SILTLIGHT_DEMO_PASSWORD: password,
    },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let said = '';
  for (const stream of [server.stdout, server.stderr]) {
    stream.setEncoding('utf8').on('data', (text: string) => (said = (said + text).slice(-8000)));
  }
  const url = `http://127.0.0.1:${port}`;
  await untilReady(url, server, () => said);
  return {
    url,
    password,
    stop: async (look) => {
      const code = await stop(server);
      look?.(dataDir);
      rmSync(dataDir, { recursive: true, force: true });
      if (code !== 0) throw new Error(`The product stopped with ${code} instead of 0.\n${said}`);
    },
  };
}

function requireBuilt(...files: string[]): void {
  const missing = files.filter((file) => !existsSync(path.join(root, file)));
  if (missing.length > 0) throw new Error(`${missing.join(' and ')} missing. Run: npm run build`);
}

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, '127.0.0.1');
  await once(probe, 'listening');
  const { port } = probe.address() as AddressInfo;
  probe.close();
  await once(probe, 'close');
  return port;
}

async function untilReady(url: string, server: ChildProcess, said: () => string): Promise<void> {
  const until = Date.now() + READY_WITHIN_MS;
  while (Date.now() < until) {
    if (server.exitCode !== null) throw new Error(`The product ended with ${server.exitCode}.\n${said()}`);
    if (await isReady(url)) return;
    await new Promise((resolve) => setTimeout(resolve, 150));
  }
  server.kill('SIGKILL');
  throw new Error(`The product was not ready within ${READY_WITHIN_MS / 1000} s.\n${said()}`);
}

/** A refused connection only says that it does not listen yet. */
const isReady = (url: string): Promise<boolean> =>
  fetch(`${url}/api/health/ready`).then(
    (answer) => answer.ok,
    () => false,
  );

async function stop(server: ChildProcess): Promise<number | null> {
  const ended = once(server, 'exit');
  const late = setTimeout(() => server.kill('SIGKILL'), STOPPED_WITHIN_MS);
  server.kill('SIGTERM');
  if (server.exitCode === null) await ended;
  clearTimeout(late);
  return server.exitCode;
}
