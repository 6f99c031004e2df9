// What start, test and dev share: install and build only when something changed since the last time.
import { createHash } from 'node:crypto';
import { spawn, spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, readdirSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';

export const root = path.resolve(import.meta.dirname, '..');
const stampFolder = path.join(root, 'node_modules', '.siltlight');

export function requireNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) {
    console.error(
      `Siltlight needs Node.js 20.19 or newer; this is ${process.versions.node}. Install Node.js 20 and start again.`,
    );
    process.exit(1);
  }
}

/** Runs a command at the root and ends this process with its code when it fails. */
export function run(command, args, options = {}) {
  const done = spawnSync(command, args, { cwd: root, stdio: 'inherit', ...options });
  if (done.error) throw done.error;
  if (done.status !== 0) {
    console.error(`\n${[command, ...args].join(' ')} ended with code ${done.status ?? done.signal}.`);
    process.exit(done.status || 1);
  }
}

/** Runs npm scripts side by side (each takes one core), shows each one's output whole, and ends when one fails. */
export async function together(scripts) {
  const codes = await Promise.all(
    scripts.map(async (script) => {
      const child = spawn('npm', ['run', script], { cwd: root, stdio: ['ignore', 'pipe', 'pipe'] });
      let said = '';
      for (const stream of [child.stdout, child.stderr])
        stream.setEncoding('utf8').on('data', (text) => (said += text));
      const code = await new Promise((resolve, reject) => child.once('error', reject).once('close', resolve));
      process.stdout.write(said);
      return code;
    }),
  );
  const failed = scripts.filter((_, index) => codes[index] !== 0);
  if (failed.length > 0) {
    console.error(`\nFailed: ${failed.join(', ')}.`);
    process.exit(1);
  }
}

function* filesUnder(folder) {
  for (const entry of readdirSync(folder, { withFileTypes: true })) {
    if (['node_modules', 'dist', 'data', 'output'].includes(entry.name)) continue;
    const full = path.join(folder, entry.name);
    if (entry.isDirectory()) yield* filesUnder(full);
    else yield full;
  }
}

function digest(files) {
  const hash = createHash('sha256');
  hash.update(process.version);
  for (const file of files) hash.update(path.relative(root, file)).update(readFileSync(file));
  return hash.digest('hex');
}

function unlessStamped(name, files, outputs, work) {
  const stamp = path.join(stampFolder, name);
  const wanted = digest(files);
  const upToDate =
    existsSync(stamp) &&
    readFileSync(stamp, 'utf8') === wanted &&
    outputs.every((file) => existsSync(path.join(root, file)));
  if (upToDate) return false;
  work();
  mkdirSync(stampFolder, { recursive: true });
  writeFileSync(stamp, wanted);
  return true;
}

export function install() {
  const manifests = [
    'package.json',
    'package-lock.json',
    ...['common', 'reference', 'service', 'ui'].map((w) => `${w}/package.json`),
  ];
  const env = { ...process.env };
  // Where no prebuilt database driver can be had it is compiled: with the headers beside this Node, if they are there.
  const prefix = path.resolve(process.execPath, '..', '..');
  if (!env.npm_config_nodedir && existsSync(path.join(prefix, 'include', 'node', 'node.h')))
    env.npm_config_nodedir = prefix;
  unlessStamped(
    'install',
    manifests.map((file) => path.join(root, file)),
    ['node_modules/sqlite3/package.json'],
    () => {
      console.log(
        'Installing packages (a first time takes some minutes: the database driver may have to be compiled) …',
      );
      run('npm', ['ci', '--no-audit', '--no-fund'], { env });
    },
  );
}

export function build() {
  const folders = ['common/src', 'reference', 'service/src', 'ui/src']
    .map((f) => path.join(root, f))
    .filter(existsSync);
  const settings = [
    '.ci/tsconfig.base.json',
    'package-lock.json',
    'common/tsconfig.build.json',
    'service/tsconfig.json',
    'ui/vite.config.ts',
    'ui/index.html',
    'ui/tsconfig.json',
  ].map((f) => path.join(root, f));
  const files = [...folders.flatMap((folder) => [...filesUnder(folder)]), ...settings]
    .filter((file) => statSync(file).isFile())
    .sort();
  unlessStamped('build', files, ['common/dist', 'service/dist/main.js', 'ui/dist/index.html'], () => {
    console.log('Building …');
    run('npm', ['run', 'build']);
  });
}
