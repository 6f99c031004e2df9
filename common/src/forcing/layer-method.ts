import type { Caution } from '../physical/domain-error';
import { upscatterMean } from '../optics/upscatter';
import { aboveCloudForcing, ABOVE_CLOUD_FIELDS, type AboveCloudInput } from './above-cloud';
import { criticalSingleScatteringAlbedo } from './critical-albedo';
import { criticalOfBracket } from './first-order-layer';
import { declare, readInputs } from './inputs';
import { layerForcing } from './layer-forcing';
import type { LayerScheme, SolvedLayer } from './layer-scheme';
import { longwaveTerm, type LongwaveInput } from './longwave';
import { result, type ForcingMethod, type ForcingResult, type MethodInput } from './method';
import { firstOrderMeans, readSunAngles, SUN_FIELDS, type SunAngles, type SunInput } from './sun-angles';
import { surfaceCautions } from './thin-layer-cautions';

export interface LayerMethodInput extends SunInput, AboveCloudInput {
  transmittance: number;
  cloudFraction: number;
  surfaceAlbedo: number;
  opticalDepth: number;
  singleScatteringAlbedo: number;
  asymmetry: number;
  longwave?: LongwaveInput;
}

const NAMES = [
  'transmittance',
  'cloudFraction',
  'surfaceAlbedo',
  'opticalDepth',
  'singleScatteringAlbedo',
  'asymmetry',
] as const;

export type LayerState = Record<(typeof NAMES)[number], number>;

/** Declared inputs of every method that solves a layer: the sun in one of three ways, each of them optional. */
export const LAYER_INPUTS: readonly MethodInput[] = [
  ...declare(NAMES),
  ...declare([
    'cosSolarZenith',
    'insolationWm2',
    'latitudeDeg',
    'solarLongitudeDeg',
    'solarConstantWm2',
    'daylightFraction',
    ...ABOVE_CLOUD_FIELDS,
  ]).map((field) => ({ ...field, required: false })),
];

export const LAYER_OTHER_INPUTS: readonly string[] = ['ageKaBp', 'orbit', 'longwave'];

/**
 * Forcing by a layer scheme: layer over Lambertian surface minus the bare surface, in the clear part of the sky, seen
 * through the air above: ΔF = −T² (1−A_c) ⟨F ΔA⟩, and on demand above cloud. The critical single-scattering albedo answered is that of first order
 * in τ, for the same sun angles; that of a thick layer lies elsewhere.
 *
 * @param others names of inputs the scheme's choice has used
 * @param ownCautions what the scheme must say of itself
 * @throws DomainError naming the input at fault
 */
export function evaluateLayer(
  input: LayerMethodInput,
  scheme: LayerScheme,
  others: readonly string[],
  ownCautions: (state: LayerState, sun: SunAngles) => Caution[],
): ForcingResult {
  const given = readInputs(input, NAMES, [...SUN_FIELDS, ...ABOVE_CLOUD_FIELDS, 'longwave', ...others]);
  const { sun, cautions } = readSunAngles(input);
  const longwave = longwaveTerm(input, given.opticalDepth);
  const lit = sun.hemisphericWm2 > 0 || sun.fluxesWm2.some((flux) => flux > 0);
  if (!lit) return result(0, longwave, null, cautions);
  const critical = criticalOf(given, sun);
  if (given.opticalDepth === 0) return result(0, longwave, critical, cautions);
  const solve = scheme.prepare(given.asymmetry, sun.cosines);
  const cloudy = aboveCloudForcing(input, given, sun, solve);
  const solved = solve(given.opticalDepth, given.singleScatteringAlbedo);
  const clearWm2 = (1 - given.cloudFraction) * layerForcing(sun, solved, given.surfaceAlbedo);
  const shortwaveWm2 = given.transmittance ** 2 * (clearWm2 + cloudy.shortwaveWm2);
  return result(shortwaveWm2, longwave, critical, [
    ...cautions,
    ...ownCautions(given, sun),
    ...surfaceCautions({ ...given, upscatterFraction: upscatterMean(given.asymmetry) }),
    ...negativeReflectance(solved),
    ...cloudy.cautions,
  ]);
}

function criticalOf({ surfaceAlbedo, asymmetry }: LayerState, sun: SunAngles): number | null {
  const mean = upscatterMean(asymmetry);
  if (sun.cosines.length === 0) return criticalSingleScatteringAlbedo(mean, surfaceAlbedo);
  const { upscatter, meanMu } = firstOrderMeans(sun, asymmetry);
  return criticalOfBracket(surfaceAlbedo, upscatter, mean, meanMu);
}

const ROUNDING = 1e-10;

/** A closure may reflect less than nothing; the value is answered as it is. */
export function negativeReflectance({ reflectances, diffuse }: SolvedLayer): Caution[] {
  const lowest = Math.min(diffuse.reflectance, ...reflectances);
  if (lowest > -ROUNDING) return [];
  return [
    {
      code: 'negative-reflectance',
      message: `The formula makes the layer reflect ${lowest.toPrecision(2)} of the light at some sun angle, which is impossible: it was not made for so thin a layer under so high a sun. Use slanted-layer or multi-stream.`,
    },
  ];
}

/** Fills in what every layer method shares. */
export function layerMethod(
  own: Pick<ForcingMethod<LayerMethodInput>, 'id' | 'title' | 'formula' | 'source'>,
  scheme: LayerScheme,
  ownCautions: (state: LayerState, sun: SunAngles) => Caution[],
): ForcingMethod<LayerMethodInput> {
  return {
    ...own,
    inputs: LAYER_INPUTS,
    otherInputs: LAYER_OTHER_INPUTS,
    evaluate: (input) => evaluateLayer(input, scheme, [], ownCautions),
  };
}
