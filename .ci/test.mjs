// npm test: installs what it needs, then lint, type check, unit, API, client and browser tests.
// Every test file on disk must have run; each runner's closing line is printed at the end.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, readdirSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { build, install, requireNode, root, together } from './steps.mjs';

requireNode();
install();
build();
await together(['lint', 'typecheck']);

const reports = mkdtempSync(path.join(os.tmpdir(), 'siltlight-tests-'));
const runners = [
  {
    name: 'common',
    folder: 'common',
    tool: 'vitest',
    args: [],
    pattern: /\.test\.ts$/,
    under: ['common/src', 'common/test'],
  },
  {
    name: 'service',
    folder: 'service',
    tool: 'jest',
    args: [],
    pattern: /\.(spec|e2e-spec)\.ts$/,
    under: ['service/src', 'service/test'],
  },
  {
    name: 'ui',
    folder: 'ui',
    tool: 'vitest',
    args: [],
    pattern: /\.test\.tsx?$/,
    under: ['ui/src', 'ui/test'],
  },
  {
    name: 'browser',
    folder: 'ui',
    tool: 'vitest',
    args: ['--config', 'e2e/vitest.config.ts'],
    pattern: /\.walk\.ts$/,
    under: ['ui/e2e'],
  },
];

function testFilesOnDisk({ under, pattern }) {
  const found = [];
  const walk = (folder) => {
    for (const entry of readdirSync(folder, { withFileTypes: true })) {
      const full = path.join(folder, entry.name);
      if (entry.isDirectory()) {
        if (entry.name !== 'node_modules' && entry.name !== 'output') walk(full);
      } else if (pattern.test(entry.name)) found.push(full);
    }
  };
  under
    .map((folder) => path.join(root, folder))
    .filter(existsSync)
    .forEach(walk);
  return found;
}

const closing = runners.map((runner) => {
  const report = path.join(reports, `${runner.name}.json`);
  const command =
    runner.tool === 'jest'
      ? ['npx', ['jest', '--json', `--outputFile=${report}`, ...runner.args]]
      : [
          'npx',
          [
            'vitest',
            'run',
            '--reporter=default',
            '--reporter=json',
            `--outputFile.json=${report}`,
            ...runner.args,
          ],
        ];
  console.log(`\n— ${runner.name} —`);
  const done = spawnSync(command[0], command[1], {
    cwd: path.join(root, runner.folder),
    stdio: runner.tool === 'jest' ? ['ignore', 'ignore', 'inherit'] : ['ignore', 'inherit', 'inherit'],
    env: { ...process.env, NODE_ENV: 'test' },
  });
  const result = existsSync(report) ? JSON.parse(readFileSync(report, 'utf8')) : null;
  const ran = new Set((result?.testResults ?? []).map((file) => path.resolve(file.name)));
  const missed = testFilesOnDisk(runner).filter((file) => !ran.has(file));
  const passed = result?.numPassedTests ?? 0;
  const failed =
    (result?.numFailedTests ?? 0) +
    (result?.testResults ?? []).filter((f) => f.status === 'failed' && f.assertionResults.length === 0)
      .length;
  const skipped = (result?.numPendingTests ?? 0) + (result?.numTodoTests ?? 0);
  return { ...runner, passed, failed, skipped, missed, code: done.status ?? 1 };
});
rmSync(reports, { recursive: true, force: true });

console.log('');
let good = true;
for (const { name, passed, failed, skipped, missed, code } of closing) {
  console.log(`${name}: ${passed} passed, ${failed} failed, ${skipped} skipped`);
  for (const file of missed) console.log(`  not run: ${path.relative(root, file)}`);
  if (code !== 0 || failed > 0 || passed === 0 || skipped > 0 || missed.length > 0) good = false;
}
const sum = (key) => closing.reduce((total, runner) => total + runner[key], 0);
console.log(`${sum('passed')} passed, ${sum('failed')} failed, ${sum('skipped')} skipped`);
process.exit(good ? 0 : 1);
