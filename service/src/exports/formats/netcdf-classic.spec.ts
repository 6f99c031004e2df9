import { NetCDFReader } from 'netcdfjs';
import { type NcDataset, writeNetcdfClassic } from './netcdf-classic';

const grid: NcDataset = {
  dimensions: { lat: 2, lon: 3, region: 2, name_length: 5 },
  attributes: {
    Conventions: 'CF-1.11',
    title: 'Invented field – µ',
    version: { type: 'int' as const, values: [3] },
  },
  variables: [
    {
      name: 'lat',
      type: 'double' as const,
      dimensions: ['lat'],
      attributes: { units: 'degrees_north' },
      data: [-45, 45],
    },
    { name: 'lon', type: 'float' as const, dimensions: ['lon'], attributes: {}, data: [-120, 0, 120] },
    {
      name: 'od',
      type: 'double' as const,
      dimensions: ['lat', 'lon'],
      attributes: { _FillValue: { type: 'double' as const, values: [-999] }, units: '1' },
      data: [0.1, 0.25, -999, 1e-300, Math.PI, 7],
    },
    {
      name: 'region_name',
      type: 'char' as const,
      dimensions: ['region', 'name_length'],
      attributes: {},
      data: ['SAH', 'NEAF'],
    },
  ],
};

describe('the classic NetCDF writer', () => {
  const reader = new NetCDFReader(writeNetcdfClassic(grid));

  it('is read back by another package with dimensions, attributes and every double bit for bit', () => {
    expect(reader.version).toBe('64-bit offset format');
    expect(reader.dimensions.map((d: { name: string; size: number }) => [d.name, d.size])).toEqual(
      Object.entries(grid.dimensions),
    );
    expect(reader.getAttribute('Conventions')).toBe('CF-1.11');
    expect(reader.getDataVariable('od')).toEqual([0.1, 0.25, -999, 1e-300, Math.PI, 7]);
    expect(reader.getDataVariable('lat')).toEqual([-45, 45]);
    expect(reader.getDataVariable('lon')).toEqual([-120, 0, 120]);
  });

  it('gives the same bytes twice', () => {
    expect(writeNetcdfClassic(grid).equals(writeNetcdfClassic(grid))).toBe(true);
  });

  it('refuses data that do not fill their shape', () => {
    const short = { ...grid, variables: [{ ...grid.variables[0]!, data: [1] }] };
    expect(() => writeNetcdfClassic(short)).toThrow('lat has 1 values for a shape of 2');
  });
});
