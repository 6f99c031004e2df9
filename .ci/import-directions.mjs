// Who may import whom, and no circular imports. Reads import statements as text; run at the root.
import { existsSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';

const root = path.resolve(import.meta.dirname, '..');
const isSource = (name) => /\.(ts|tsx)$/.test(name) && !/\.d\.ts$/.test(name);
const isTest = (file) =>
  /\.(test|spec|e2e-spec|walk)\.tsx?$|\.test-support\.tsx?$|[\\/](test|e2e)[\\/]/.test(file);

function sources(folder) {
  if (!existsSync(folder)) return [];
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const full = path.join(folder, entry.name);
    if (entry.isDirectory())
      return ['node_modules', 'dist', 'output'].includes(entry.name) ? [] : sources(full);
    return isSource(entry.name) ? [full] : [];
  });
}

const importPattern =
  /(?:^|\n)\s*(?:import|export)\s+(type\s+)?(?:[^'";]*?\sfrom\s+)?['"]([^'"]+)['"]|import\(\s*['"]([^'"]+)['"]\s*\)/g;

function importsOf(file) {
  const text = readFileSync(file, 'utf8');
  return [...text.matchAll(importPattern)].map((m) => ({
    spec: m[2] ?? m[3],
    typeOnly: Boolean(m[1]),
    lazy: Boolean(m[3]),
  }));
}

function resolve(file, spec) {
  let base;
  if (spec.startsWith('.')) base = path.resolve(path.dirname(file), spec.split('?')[0]);
  else if (spec.startsWith('@siltlight/common/'))
    base = path.join(root, 'common/src', spec.slice('@siltlight/common/'.length));
  else if (spec.startsWith('@siltlight/reference/'))
    base = path.join(root, 'reference', spec.slice('@siltlight/reference/'.length));
  else return null;
  return (
    [base, `${base}.ts`, `${base}.tsx`, path.join(base, 'index.ts')].find(
      (f) => existsSync(f) && isSource(f),
    ) ?? null
  );
}

// common: a room imports only rooms listed before it. wire is schemas and types, open to all outside.
const commonRooms = [
  'physical',
  'tables',
  'units',
  'statistics',
  'sphere',
  'dataset',
  'sheet',
  'vetting',
  'slices',
  'fields',
  'optics',
  'orbit',
  'forcing',
  'ensemble',
  'estimate',
  'wire',
];
// service: a feature uses those before it in the story; the first group serves anyone.
const serviceRooms = [
  'config',
  'http',
  'database',
  'migrations',
  'files',
  'ledger',
  'auth',
  'users',
  'notifications',
  'jobs',
  'versions',
  'workers',
  'health',
  'datasets',
  'submissions',
  'review',
  'regions',
  'slices',
  'fields',
  'optics',
  'backdrops',
  'estimates',
  'calculators',
  'exports',
  'desk',
  'demo',
];
const serviceFoundation = new Set(serviceRooms.slice(0, serviceRooms.indexOf('health') + 1));

const faults = [];
const graph = new Map();
const roomOf = (file, base) => path.relative(path.join(root, base), file).split(path.sep)[0];

for (const file of ['common/src', 'service/src', 'ui/src', 'reference'].flatMap((folder) =>
  sources(path.join(root, folder)),
)) {
  const name = path.relative(root, file);
  const edges = [];
  for (const { spec, typeOnly, lazy } of importsOf(file)) {
    const target = resolve(file, spec);
    if (!target) {
      if (name.startsWith('common/') && !isTest(name) && !spec.startsWith('.') && spec !== 'zod')
        faults.push(`${name}: common imports only itself and zod, not ${spec}`);
      continue;
    }
    if (!typeOnly && !lazy) edges.push(target);
    if (isTest(name)) continue;
    const to = path.relative(root, target);
    const from = name.split(path.sep)[0];
    const toWorkspace = to.split(path.sep)[0];
    if (from === 'common' && toWorkspace !== 'common') faults.push(`${name}: common may not import ${to}`);
    if (from === 'ui' && !['ui', 'common'].includes(toWorkspace))
      faults.push(`${name}: ui may not import ${to}`);
    if (from === 'service' && toWorkspace === 'ui') faults.push(`${name}: service may not import ${to}`);
    if (from === 'common' && toWorkspace === 'common') {
      const [a, b] = [roomOf(file, 'common/src'), roomOf(target, 'common/src')];
      if (!commonRooms.includes(a)) faults.push(`${name}: the room ${a} is not in the order of rooms`);
      else if (commonRooms.indexOf(b) > commonRooms.indexOf(a))
        faults.push(`${name}: room ${a} may not import the later room ${b}`);
    }
    if (from === 'service' && toWorkspace === 'service') {
      const [a, b] = [roomOf(file, 'service/src'), roomOf(target, 'service/src')];
      const aPos = serviceRooms.indexOf(a);
      if (!isSource(a) && aPos < 0) faults.push(`${name}: the room ${a} is not in the story's order`);
      if (aPos >= 0 && !serviceFoundation.has(b) && serviceRooms.indexOf(b) > aPos)
        faults.push(`${name}: ${a} may not import the later feature ${b}`);
    }
    if (from === 'ui' && toWorkspace === 'ui') {
      const [a, b] = [roomOf(file, 'ui/src'), roomOf(target, 'ui/src')];
      if (a === 'shared' && b !== 'shared') faults.push(`${name}: shared may not import ${to}`);
      if (a === 'features' && !['features', 'shared'].includes(b))
        faults.push(`${name}: a feature may not import ${to}`);
      if (a === 'features' && b === 'features') {
        const feature = (f) => path.relative(path.join(root, 'ui/src/features'), f).split(path.sep)[0];
        if (feature(file) !== feature(target))
          faults.push(`${name}: features never import each other (${to})`);
      }
    }
  }
  graph.set(file, edges);
}

// Cycles, by depth-first walk over value imports (a type import leaves nothing at run time).
const state = new Map();
const trail = [];
function visit(file) {
  state.set(file, 'open');
  trail.push(file);
  for (const next of graph.get(file) ?? []) {
    if (state.get(next) === 'open') {
      faults.push(
        `circular import: ${[...trail.slice(trail.indexOf(next)), next].map((f) => path.relative(root, f)).join(' → ')}`,
      );
    } else if (!state.has(next)) visit(next);
  }
  trail.pop();
  state.set(file, 'done');
}
for (const file of graph.keys()) if (!state.has(file)) visit(file);

for (const fault of new Set(faults)) console.error(fault);
console.log(`import directions: ${graph.size} files, ${new Set(faults).size} faults`);
process.exit(faults.length > 0 ? 1 : 0);
