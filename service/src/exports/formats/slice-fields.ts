import { sliceField, type SliceField } from '@siltlight/common/estimate/slice-field';
import { cellAreaKm2 } from '@siltlight/common/sphere/cell-area';
import { type ExportSubject, NOTES_ON_USE, standing } from '../export-subject';
import { type NcDataset, type NcVariable, writeNetcdfClassic } from './netcdf-classic';

const NAME_LENGTH = 40;
const CODE_LENGTH = 8;

/** Fields of a slice as CF-1.11 NetCDF: optical depths and net forcing on the working grid, and the regional table. */
export function sliceFieldsNetcdf(subject: ExportSubject): Buffer {
  return writeNetcdfClassic(sliceFieldsDataset(subject, sliceField(subject.content.inputs)));
}

function sliceFieldsDataset(subject: ExportSubject, field: SliceField): NcDataset {
  const { regions } = subject.content.result;
  return {
    dimensions: {
      lat: field.latitudesDeg.length,
      lon: field.longitudesDeg.length,
      bounds: 2,
      region: regions.length,
      code_length: CODE_LENGTH,
      name_length: NAME_LENGTH,
    },
    attributes: globalAttributes(subject),
    variables: [...coordinates(field), ...scalars(subject), ...gridded(subject, field), ...regional(subject)],
  };
}

function globalAttributes(subject: ExportSubject): NcDataset['attributes'] {
  const { content, runNumber, checksum, datasets } = subject;
  const { pins, request, codeVersion } = content;
  return {
    Conventions: 'CF-1.11',
    title: content.title,
    source: `Siltlight ${codeVersion}, run ${runNumber}, method ${request.method}, ${request.members} members, seed ${request.seed}`,
    history: `computed by Siltlight ${codeVersion} from the pinned versions named in provenance_ attributes`,
    references:
      'Regions: Iturbide et al. (2020), Earth Syst. Sci. Data 12, 2959-2970, CC BY 4.0. Base field: Gkikas et al. (2022), Atmos. Chem. Phys. 22, 3553; Kok et al. (2023), Nat. Rev. Earth Environ. 4, 71.',
    comment: [standing(subject), ...NOTES_ON_USE].join(' '),
    provenance_estimate_sha256: checksum,
    provenance_field_sha256: pins.field.checksum,
    provenance_optical_set: `${pins.opticalSet.title}; sha256 ${pins.opticalSet.checksum}`,
    provenance_backdrop: `${pins.backdrop.title}; sha256 ${pins.backdrop.checksum}`,
    provenance_dataset_versions: datasets
      .map(({ slug, number, checksum: sha256 }) => `${slug} version ${number} sha256 ${sha256}`)
      .join('; '),
    citations: datasets.map(({ citation }) => citation).join(' | '),
    license: datasets.map(({ slug, licence }) => `${slug}: ${licence ?? 'not stated'}`).join('; '),
  };
}

function coordinates({ latitudesDeg, longitudesDeg, stepDeg }: SliceField): NcVariable[] {
  const bounds = (centres: Float64Array) =>
    Array.from(centres).flatMap((at) => [at - stepDeg / 2, at + stepDeg / 2]);
  const axis = (
    name: string,
    axisName: string,
    standardName: string,
    units: string,
    data: Float64Array,
  ): NcVariable[] => [
    {
      name,
      type: 'double',
      dimensions: [name],
      attributes: {
        standard_name: standardName,
        long_name: standardName,
        units,
        axis: axisName,
        bounds: `${name}_bounds`,
      },
      data,
    },
    {
      name: `${name}_bounds`,
      type: 'double',
      dimensions: [name, 'bounds'],
      attributes: {},
      data: bounds(data),
    },
  ];
  const area = Array.from(latitudesDeg).flatMap((latitude) => {
    const km2 = cellAreaKm2({
      westDeg: 0,
      eastDeg: stepDeg,
      southDeg: latitude - stepDeg / 2,
      northDeg: latitude + stepDeg / 2,
    });
    return Array.from({ length: longitudesDeg.length }, () => km2 * 1e6);
  });
  return [
    ...axis('lat', 'Y', 'latitude', 'degrees_north', latitudesDeg),
    ...axis('lon', 'X', 'longitude', 'degrees_east', longitudesDeg),
    {
      name: 'cell_area',
      type: 'double',
      dimensions: ['lat', 'lon'],
      attributes: { standard_name: 'cell_area', long_name: 'area of the grid cell', units: 'm2' },
      data: area,
    },
  ];
}

/** Ages have no standard name on land: a plain scalar coordinate with its datum in words, and the window as bounds. */
function scalars({ slice }: ExportSubject): NcVariable[] {
  return [
    {
      name: 'slice_age',
      type: 'double',
      dimensions: [],
      attributes: {
        long_name: 'age of orbit and gases of the slice, thousands of years before 1950 CE',
        units: '1000 years',
        bounds: 'slice_age_bounds',
        comment: 'the bounds are the evidence window, apart from the age',
      },
      data: [slice.orbitalAgeKa],
    },
    {
      name: 'slice_age_bounds',
      type: 'double',
      dimensions: ['bounds'],
      attributes: {},
      data: [slice.windowYoungKa, slice.windowOldKa],
    },
    {
      name: 'radiation_wavelength',
      type: 'double',
      dimensions: [],
      attributes: {
        standard_name: 'radiation_wavelength',
        long_name: 'wavelength of the optical depths',
        units: 'm',
      },
      data: [5.5e-7],
    },
  ];
}

function gridded({ content }: ExportSubject, field: SliceField): NcVariable[] {
  const { sliceName, referenceName } = content.result.label;
  const depth = (name: string, of: string, data: Float64Array): NcVariable => ({
    name,
    type: 'double',
    dimensions: ['lat', 'lon'],
    attributes: {
      standard_name: 'atmosphere_optical_thickness_due_to_dust_ambient_aerosol_particles',
      long_name: `dust optical depth at 550 nm, ${of}`,
      units: '1',
      coordinates: 'radiation_wavelength slice_age',
      cell_methods: 'area: mean',
      cell_measures: 'area: cell_area',
    },
    data,
  });
  return [
    depth('dust_optical_depth_slice', sliceName, field.opticalDepthSlice),
    depth('dust_optical_depth_reference', referenceName, field.opticalDepthReference),
    {
      name: 'net_forcing',
      type: 'double',
      dimensions: ['lat', 'lon'],
      attributes: {
        standard_name: 'toa_instantaneous_radiative_forcing',
        long_name: `net instantaneous forcing of dust, all sky, ${sliceName} minus ${referenceName}, central inputs`,
        units: 'W m-2',
        coordinates: 'slice_age',
        cell_methods: 'area: mean',
        cell_measures: 'area: cell_area',
        comment: 'annual mean; positive downward',
      },
      data: field.netForcingWm2,
    },
  ];
}

function regional({ content }: ExportSubject): NcVariable[] {
  const { regions } = content.result;
  const texts = (name: string, longName: string, length: string, data: string[]): NcVariable => ({
    name,
    type: 'char',
    dimensions: ['region', length],
    attributes: { long_name: longName },
    data,
  });
  const values = (name: string, longName: string, data: number[]): NcVariable => ({
    name,
    type: 'double',
    dimensions: ['region'],
    attributes: { long_name: longName, units: 'W m-2', coordinates: 'region_code region_name' },
    data,
  });
  const net = regions.map((region) => region.forcing.netWm2);
  return [
    texts(
      'region_code',
      'code of the AR6 reference region',
      'code_length',
      regions.map(({ code }) => code),
    ),
    texts(
      'region_name',
      'name of the AR6 reference region',
      'name_length',
      regions.map(({ name }) => name.slice(0, NAME_LENGTH)),
    ),
    values(
      'region_net_forcing',
      'net forcing, all sky, slice minus reference, central inputs',
      net.map(({ value }) => value),
    ),
    values(
      'region_net_forcing_p05',
      '5th percentile of the net forcing over the varied inputs',
      net.map(({ low, value }) => low ?? value),
    ),
    values(
      'region_net_forcing_p95',
      '95th percentile of the net forcing over the varied inputs',
      net.map(({ high, value }) => high ?? value),
    ),
  ];
}
