/**
 * Writes common/src/tables/*.ts from the tables of this folder, so that a number has one home.
 * Run `npm run generate -w reference` after changing a table; a test of `common` fails when they differ.
 */
import { readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import prettier from 'prettier';
import * as make from './make-tables.mjs';
import { refractiveIndices } from './refractive-indices.mjs';

const here = import.meta.dirname;
const tables = path.join(here, '..', 'common', 'src', 'tables');

/** Table name, its maker, and the line on its origin that heads the file. */
const TABLES = [
  ['berger1978', make.berger1978, 'orbit/berger1978_*.csv. Berger (1978), J. Atmos. Sci. 35, 2362-2367.'],
  [
    'ar6-regions',
    make.ar6Regions,
    'regions/ar6_reference_regions_v4_vertices.csv, reshaped. Iturbide et al. (2020), Earth Syst. Sci. Data 12, 2959-2970, CC BY 4.0.',
  ],
  ['pmip-slices', make.pmipSlices, 'gases/pmip_time_slices.csv. The source of each row is in the row.'],
  ['parameters', make.parameters, 'parameters/parameters.csv. The source of each row is in the row.'],
  [
    'published-estimates',
    make.publishedEstimates,
    'estimates/published-estimates.csv. The source of each row is in the row.',
  ],
  [
    'zonal-backdrop',
    make.zonalBackdrop,
    'light/zonal_albedo_cloud_10deg.csv. Hersbach et al. (2023), contains modified Copernicus Climate Change Service information; Seland et al. (2020), Geosci. Model Dev. 13, 6165-6200; zonal tables by Gunning et al. (2025), Geosci. Model Dev. 18, 2479.',
  ],
  [
    'dust-optical-depth',
    make.dustOpticalDepth,
    'optics/dust_optical_depth.csv. Gkikas et al. (2022), Atmos. Chem. Phys. 22, 3553.',
  ],
  [
    'refractive-indices',
    refractiveIndices,
    'optics/refractive-index/*, read by refractive-indices.mjs. Source and licence of each table are in the table.',
  ],
  [
    'conventional-slices',
    make.conventionalSlices,
    'slices/conventional-slices.csv. The source of each row is in the row.',
  ],
  [
    'land-fraction-2deg',
    make.landFraction,
    'the 1:50 million land outline of Natural Earth (public domain), sampled at 0.25° by land-fraction.mjs.',
  ],
];

/** @returns {Promise<Record<string, string>>} text of each file of common/src/tables, by its name */
export async function generate() {
  const { prettier: style } = JSON.parse(readFileSync(path.join(here, '..', 'package.json'), 'utf8'));
  const files = {};
  for (const [name, maker, origin] of TABLES) {
    const text = `// Made by reference/generate.mjs: do not edit.\n// From ${origin}\n\n${maker()}`;
    files[`${name}.ts`] = await prettier.format(text, { ...style, parser: 'typescript' });
  }
  return files;
}

if (process.argv[1] && fileURLToPath(import.meta.url) === path.resolve(process.argv[1])) {
  for (const [name, text] of Object.entries(await generate())) writeFileSync(path.join(tables, name), text);
}
