import type { EstimateDetail } from '@siltlight/common/wire/estimates';
import { NetCDFReader } from 'netcdfjs';
import { detailOf, ESTIMATES, exported } from './support/estimating';
import { signedInAs } from './support/sign-in';
import { testApp, type TestApp } from './support/test-app';

let service: TestApp;
let published: EstimateDetail;
let reader: NetCDFReader;
beforeAll(async () => {
  service = await testApp({ seeded: true });
  const modeller = await signedInAs(service, 'modeller');
  const { items } = (await modeller.get(`${ESTIMATES}?slice=lgm&state=published`).expect(200)).body;
  published = await detailOf(modeller, items[0].id as string);
  reader = new NetCDFReader((await exported(modeller, published.id, 'slice-fields-netcdf')).bytes);
});
afterAll(() => service.close());

interface Variable {
  name: string;
  dimensions: number[];
  attributes: { name: string; value: string | number }[];
}
const variable = (name: string): Variable =>
  (reader.variables as Variable[]).find((candidate) => candidate.name === name)!;
const attribute = (name: string, of: string) =>
  variable(name).attributes.find((candidate) => candidate.name === of)?.value;
const dimensionsOf = (name: string) =>
  variable(name).dimensions.map((index) => (reader.dimensions as { name: string }[])[index]!.name);
const numbers = (name: string) => [reader.getDataVariable(name)].flat(2) as number[];

test('the file names its conventions, its run and everything that the run rests on', () => {
  const global = (name: string) => String(reader.getAttribute(name));
  expect(global('Conventions')).toBe('CF-1.11');
  expect(global('title')).toBe(published.title);
  expect(global('source')).toContain(`run ${published.runNumber}, method thin-layer-daily`);
  expect(global('provenance_estimate_sha256')).toBe(published.checksum);
  for (const name of ['history', 'references', 'license']) expect(global(name).length).toBeGreaterThan(20);
  expect(global('provenance_dataset_versions')).toMatch(/version 1 sha256 [0-9a-f]{64}/);
  expect(global('citations')).toContain('Siltlight Holdings');
  expect(global('comment')).toContain('Signed off by a second person');
  expect(global('comment')).toContain('invented demo data: not for use');
  expect(global('comment')).toContain('Positive values mean energy gained by the Earth');
});

// CF-1.11: chapters 3 (units, standard names), 4 (coordinates), 7.1 (bounds); names after the CF standard name table.
test.each([
  ['lat', 'latitude', 'degrees_north', 'Y'],
  ['lon', 'longitude', 'degrees_east', 'X'],
])('%s is a coordinate with bounds that tile it without a gap', (name, standardName, units, axis) => {
  expect(attribute(name, 'standard_name')).toBe(standardName);
  expect(attribute(name, 'units')).toBe(units);
  expect(attribute(name, 'axis')).toBe(axis);
  const boundsName = String(attribute(name, 'bounds'));
  expect(dimensionsOf(boundsName)).toEqual([name, 'bounds']);
  const [centres, bounds] = [numbers(name), numbers(boundsName)];
  centres.forEach((centre, index) => {
    const [low, high] = [bounds[2 * index]!, bounds[2 * index + 1]!];
    expect((low + high) / 2).toBeCloseTo(centre, 10);
    if (index > 0) expect(low).toBe(bounds[2 * index - 1]);
  });
  const whole = name === 'lat' ? [-90, 90] : [-180, 180];
  expect([bounds[0], bounds.at(-1)]).toEqual(whole);
});

test.each([
  ['dust_optical_depth_slice', 'atmosphere_optical_thickness_due_to_dust_ambient_aerosol_particles', '1'],
  ['dust_optical_depth_reference', 'atmosphere_optical_thickness_due_to_dust_ambient_aerosol_particles', '1'],
  ['net_forcing', 'toa_instantaneous_radiative_forcing', 'W m-2'],
])('%s has standard name, units, cell methods and measures', (name, standardName, units) => {
  expect(dimensionsOf(name)).toEqual(['lat', 'lon']);
  expect(attribute(name, 'standard_name')).toBe(standardName);
  expect(attribute(name, 'units')).toBe(units);
  expect(attribute(name, 'cell_methods')).toBe('area: mean');
  expect(attribute(name, 'cell_measures')).toBe('area: cell_area');
  for (const coordinate of String(attribute(name, 'coordinates')).split(' ')) {
    expect(variable(coordinate)).toBeDefined();
  }
  expect(numbers(name).every(Number.isFinite)).toBe(true);
});

const areaMean = (name: string): number => {
  const [values, areas] = [numbers(name), numbers('cell_area')];
  const total = areas.reduce((sum, area) => sum + area, 0);
  return values.reduce((sum, value, index) => sum + value * areas[index]!, 0) / total;
};

test('area means by cell_area give back the global means of the estimate, to 1e-9', () => {
  const { global } = published.result!;
  expect(Math.abs(areaMean('net_forcing') / global.forcing.netWm2.value - 1)).toBeLessThan(1e-9);
  // The API's mean runs over the regions, which leave out 1.6e-5 of the sphere.
  expect(Math.abs(areaMean('dust_optical_depth_slice') / global.opticalDepthSlice - 1)).toBeLessThan(5e-5);
  expect(Math.abs(areaMean('dust_optical_depth_reference') / global.opticalDepthReference - 1)).toBeLessThan(
    5e-5,
  );
});

test('cell areas add up to the sphere of 6371007.181 m radius', () => {
  const total = numbers('cell_area').reduce((sum, area) => sum + area, 0);
  expect(Math.abs(total / (4 * Math.PI * 6371007.181 ** 2) - 1)).toBeLessThan(1e-12);
  expect(attribute('cell_area', 'units')).toBe('m2');
});

test('the age of the slice and its evidence window stand apart', () => {
  expect(numbers('slice_age')).toEqual([21]);
  expect(numbers(String(attribute('slice_age', 'bounds')))).toEqual([19, 23]);
  expect(attribute('slice_age', 'long_name')).toContain('before 1950 CE');
  expect(numbers('radiation_wavelength')).toEqual([5.5e-7]);
});

test('the regional table in the file has the numbers of the API, bit for bit', () => {
  const { regions } = published.result!;
  const net = regions.map(({ forcing }) => forcing.netWm2);
  expect(numbers('region_net_forcing')).toEqual(net.map(({ value }) => value));
  expect(numbers('region_net_forcing_p05')).toEqual(net.map(({ low }) => low));
  expect(numbers('region_net_forcing_p95')).toEqual(net.map(({ high }) => high));
  const codes = [reader.getDataVariable('region_code')].flat(2).join('');
  for (const { code } of regions) expect(codes).toContain(code);
});
