import { readNumber, refuseUnused } from '../physical/check-fields';
import { SOLAR_CONSTANT_WM2 } from '../physical/constants';
import { MIN_COS_ZENITH } from './layer-scheme';
import type { MethodInput } from './method';

/** Inputs that several methods share, each declared once: title, unit and range. */
export const INPUTS = {
  opticalDepth: input('opticalDepth', 'Optical depth at 550 nm', '', 0, 10),
  singleScatteringAlbedo: input('singleScatteringAlbedo', 'Single-scattering albedo', '', 0, 1),
  upscatterFraction: input('upscatterFraction', 'Upscatter fraction, hemispheric mean', '', 0, 1),
  asymmetry: input('asymmetry', 'Asymmetry parameter', '', -0.98, 0.98),
  surfaceAlbedo: input('surfaceAlbedo', 'Surface albedo', '', 0, 1),
  transmittance: input('transmittance', 'One-way transmittance above the layer', '', 0, 1),
  cloudFraction: input('cloudFraction', 'Cloud fraction', '', 0, 1),
  cloudAlbedo: input('cloudAlbedo', 'Albedo of cloud tops', '', 0, 1),
  fractionAboveCloud: input('fractionAboveCloud', 'Share of the layer above cloud', '', 0, 1),
  highCloudFraction: input('highCloudFraction', 'High cloud fraction', '', 0, 1),
  cosSolarZenith: input('cosSolarZenith', 'Cosine of the solar zenith angle', '', MIN_COS_ZENITH, 1),
  insolationWm2: input('insolationWm2', 'Mean insolation at the top of the atmosphere', 'W m⁻²', 0, 10_000),
  albedoChange: input('albedoChange', 'Change of albedo', '', -1, 1),
  shortwaveEfficiencyWm2: input(
    'shortwaveEfficiencyWm2',
    'Shortwave efficiency',
    'W m⁻² per unit τ',
    -1000,
    1000,
  ),
  longwaveEfficiencyWm2: input(
    'longwaveEfficiencyWm2',
    'Longwave efficiency',
    'W m⁻² per unit τ',
    -1000,
    1000,
  ),
  latitudeDeg: input('latitudeDeg', 'Latitude', '°', -90, 90),
  solarLongitudeDeg: input('solarLongitudeDeg', 'Solar longitude', '°', 0, 360),
  solarConstantWm2: input('solarConstantWm2', 'Solar constant', 'W m⁻²', 0, 10_000, SOLAR_CONSTANT_WM2),
  daylightFraction: input('daylightFraction', 'Daylight fraction', '', 0, 1, 0.5),
} as const;

type InputName = keyof typeof INPUTS;

function input(
  field: string,
  title: string,
  unit: string,
  min: number,
  max: number,
  fallback?: number,
): MethodInput {
  const common = { field, title, unit, min, max, required: fallback === undefined };
  return fallback === undefined ? common : { ...common, default: fallback };
}

/** The declared inputs of a method, in order. */
export function declare(names: readonly InputName[]): MethodInput[] {
  return names.map((name) => INPUTS[name]);
}

/**
 * Reads the numbers a method needs and refuses everything it does not use.
 *
 * @param others names of inputs that are read elsewhere
 * @throws DomainError naming the input
 */
export function readInputs<Name extends InputName>(
  given: object,
  names: readonly Name[],
  others: readonly string[],
): Record<Name, number> {
  refuseUnused(given, [...names, ...others]);
  const entries = names.map((name) => [name, readNumber(given, INPUTS[name])] as const);
  return Object.fromEntries(entries) as Record<Name, number>;
}
