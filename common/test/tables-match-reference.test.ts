import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import {
  landFraction2Deg,
  LAND_FRACTION_COLUMNS,
  LAND_FRACTION_ROWS,
} from '../src/tables/land-fraction-2deg';
import { CONVENTIONAL_SLICES } from '../src/tables/conventional-slices';
import { PARAMETERS } from '../src/tables/parameters';
import { PMIP_SLICES } from '../src/tables/pmip-slices';

const folder = path.join(__dirname, '..', 'src', 'tables');

test('the tables of common are what reference/generate.mjs writes', async () => {
  const { generate } = await import('../../reference/generate.mjs');
  const wanted = await generate();
  const found = readdirSync(folder).filter((name) => !name.endsWith('.test.ts'));
  expect(found.sort()).toEqual(Object.keys(wanted).sort());
  for (const [name, text] of Object.entries(wanted)) {
    expect(readFileSync(path.join(folder, name), 'utf8'), `${name}: run npm run generate -w reference`).toBe(
      text,
    );
  }
});

// Land without ice shelves is 28.75 % to 29.2 % of the sphere, by the outline used (common practice, no source).
test('the coarse land mask covers about 29 % of the sphere and knows known places', () => {
  const land = landFraction2Deg();
  let covered = 0;
  for (let j = 0; j < LAND_FRACTION_ROWS; j += 1) {
    const south = (-90 + 2 * j) * (Math.PI / 180);
    const weight = (Math.sin(south + Math.PI / 90) - Math.sin(south)) / 2 / LAND_FRACTION_COLUMNS;
    for (let i = 0; i < LAND_FRACTION_COLUMNS; i += 1)
      covered += weight * land[j * LAND_FRACTION_COLUMNS + i]!;
  }
  expect(covered).toBeGreaterThan(0.284);
  expect(covered).toBeLessThan(0.295);
  const at = (lon: number, lat: number) =>
    land[Math.floor((lat + 90) / 2) * LAND_FRACTION_COLUMNS + Math.floor((lon + 180) / 2)];
  expect(at(5, 23), 'Sahara').toBe(1);
  expect(at(123, -75), 'Dome C').toBe(1);
  expect(at(0, -89.5), 'South Pole').toBe(1);
  expect(at(179, 67), 'Chukotka, east of the dateline cut').toBeGreaterThan(0.5);
  expect(at(-150, 0), 'Pacific').toBe(0);
  expect(at(0, 89.5), 'North Pole').toBe(0);
});

test('every slice has a window in order and a reference and a protocol row that exist', () => {
  const slugs = new Set(CONVENTIONAL_SLICES.map((slice) => slice.slug));
  for (const slice of CONVENTIONAL_SLICES) {
    expect(slice.windowOldKaBp, slice.slug).toBeGreaterThan(slice.windowYoungKaBp);
    if (slice.referenceSlug !== null) expect(slugs).toContain(slice.referenceSlug);
    if (slice.pmipSlice === null) continue;
    const protocol = PMIP_SLICES.find((row) => row.name === slice.pmipSlice);
    expect(protocol, slice.slug).toMatchObject({
      ageKaBp: slice.orbitalAgeKaBp,
      co2Ppm: slice.co2Ppm,
      ch4Ppb: slice.ch4Ppb,
      n2oPpb: slice.n2oPpb,
    });
  }
});

test('every parameter has its own id and bounds in order', () => {
  expect(new Set(PARAMETERS.map((parameter) => parameter.id)).size).toBe(PARAMETERS.length);
  for (const { id, low, central, high } of PARAMETERS) {
    expect(low, id).toBeLessThanOrEqual(central);
    expect(central, id).toBeLessThanOrEqual(high);
  }
});
