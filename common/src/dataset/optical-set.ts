import type { DatasetKind, FieldDeclaration } from './field';
import { pointOpticalDepth } from './point-optical-depth';

const SHARED = [
  'wavelengthNm',
  'singleScatteringAlbedo',
  'asymmetry',
  'aerosolSpecies',
  'angstromExponent',
  'humidityState',
];

const shared = (): FieldDeclaration[] =>
  pointOpticalDepth.fields.filter(({ field }) => SHARED.includes(field));

/** Single-scattering properties of an aerosol by wavelength: what forcing methods need beside optical depth. */
export const opticalSet: DatasetKind = {
  id: 'optical-set',
  title: 'Optical properties',
  valueField: 'singleScatteringAlbedo',
  sigmaField: 'singleScatteringAlbedoSigma',
  sigmas: { asymmetry: 'asymmetrySigma', massExtinctionM2G: 'massExtinctionSigmaM2G' },
  usableWith: [['asymmetry'], ['massExtinctionM2G']],
  fields: [
    ...shared().map((field) =>
      field.field === 'wavelengthNm'
        ? { ...field, min: 1, max: 1e7, headings: [...field.headings, 'wl', 'wvl'], help: 'Wavelength of the properties.' }
        : field,
    ),
    {
      field: 'massExtinctionM2G',
      title: 'Mass extinction efficiency',
      quantity: 'massExtinction',
      canonicalUnit: 'm2 g-1',
      required: false,
      headings: ['mass extinction efficiency', 'mee', 'mass extinction', 'mass extinction coefficient', 'mec', 'specific extinction', 'massenextinktion', 'extinction massique'],
      min: 0,
      max: 50,
      help: 'Optical depth per load.',
    },
    ...(
      [
        ['singleScatteringAlbedoSigma', 'single-scattering albedo', ['ssa error', 'ssa sigma', 'ssa uncertainty'], '1', 'dimensionless'],
        ['asymmetrySigma', 'asymmetry parameter', ['asymmetry error', 'g error', 'asymmetry uncertainty'], '1', 'dimensionless'],
        ['massExtinctionSigmaM2G', 'mass extinction efficiency', ['mee error', 'mee sigma', 'mee uncertainty'], 'm2 g-1', 'massExtinction'],
      ] as const
    ).map(([field, of, headings, canonicalUnit, quantity]) => ({
      field,
      title: `Standard error of the ${of}`,
      quantity,
      canonicalUnit,
      required: false,
      headings: [...headings],
      min: 0,
      max: 50,
      help: 'One standard error.',
    })),
    {
      field: 'effectiveRadiusUm',
      title: 'Effective radius',
      quantity: 'grainSize',
      canonicalUnit: 'µm',
      required: false,
      headings: ['effective radius', 'reff', 'r eff', 'effektiver radius', 'rayon effectif', 'radio efectivo'],
      min: 0.001,
      max: 100,
      help: 'Radius, not diameter.',
    },
  ],
}; // prettier-ignore
