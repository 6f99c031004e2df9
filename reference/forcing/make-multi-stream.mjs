/**
 * Makes multi_stream.json, the table of multi-stream layers, and multi_stream_errors.csv, its distance from the direct
 * computation at points drawn between the table's. Run at the root: node reference/forcing/make-multi-stream.mjs
 */
import { writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { createServer } from 'vite';

const here = path.dirname(fileURLToPath(import.meta.url));
const common = path.join(here, '..', '..', 'common');
const vite = await createServer({
  configFile: false,
  root: path.join(here, '..', '..'),
  appType: 'custom',
  server: { middlewareMode: true, hmr: false, watch: null, ws: false },
  logLevel: 'error',
});
const load = (name) => vite.ssrLoadModule(path.join(common, name));
const { buildMultiStreamTable } = await load('src/forcing/build-multi-stream-table.ts');
const { tabulatedMultiStream } = await load('src/forcing/multi-stream-table.ts');
const { measureTable } = await load('test/measure-multi-stream-table.ts');

const table = buildMultiStreamTable();
const rounded = (values) => values.map((value) => Number(value.toPrecision(8)));
const kept = {
  ...table,
  reflectance: rounded(table.reflectance),
  absorptance: rounded(table.absorptance),
};
writeFileSync(path.join(here, 'multi_stream.json'), `${JSON.stringify(kept)}\n`);

const source = 'computed: table against direct adding–doubling';
const rows = measureTable(tabulatedMultiStream(kept), 100).map((row) =>
  [
    row.light,
    row.opticalDepthFrom,
    row.opticalDepthTo,
    row.points,
    row.medianPercent.toPrecision(2),
    row.p99Percent.toPrecision(2),
    row.maxPercent.toPrecision(2),
    row.maxError.toPrecision(2),
    source,
  ].join(','),
);
const header =
  'light,tau_from,tau_to,points,median_error_percent,p99_error_percent,max_error_percent,max_abs_error_reflected,source';
writeFileSync(path.join(here, 'multi_stream_errors.csv'), `${[header, ...rows].join('\n')}\n`);
await vite.close();
