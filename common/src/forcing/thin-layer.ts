import type { Caution } from '../physical/domain-error';
import { criticalSingleScatteringAlbedo } from './critical-albedo';
import { declare, readInputs } from './inputs';
import { longwaveTerm, type LongwaveInput } from './longwave';
import { result, type ForcingMethod, type ForcingResult } from './method';
import { thinLayerCautions } from './thin-layer-cautions';

export interface ThinLayerInput {
  /** 1361 when absent */
  solarConstantWm2?: number;
  /** 0.5 when absent: the global and annual mean */
  daylightFraction?: number;
  transmittance: number;
  cloudFraction: number;
  surfaceAlbedo: number;
  opticalDepth: number;
  singleScatteringAlbedo: number;
  upscatterFraction: number;
  longwave?: LongwaveInput;
}

const NAMES = [
  'solarConstantWm2',
  'daylightFraction',
  'transmittance',
  'cloudFraction',
  'surfaceAlbedo',
  'opticalDepth',
  'singleScatteringAlbedo',
  'upscatterFraction',
] as const;

/**
 * Shortwave forcing of a thin layer, half-day form, in the global and annual mean [W m⁻²]:
 *
 *   ΔF = −D S₀ T² (1−A_c) τ [ω β̄ (1−R_s)² − 2(1−ω) R_s]
 *
 * the form of Haywood & Shine written without division by ω and β̄, which may be 0.
 *
 * @param lightWm2 D S₀ T² (1−A_c)
 *
 * Limits: first order in τ. Over dark ground it overstates the cooling by 4 to 6 % at τ 0.01, 15 to 20 % at 0.05,
 * 23 to 33 % at 0.1, 48 to 71 % at 0.3. Used per cell it is wrong even as τ → 0, by a factor 0.5 to 2 and in sign
 * over bright ground at high latitude, because both terms depend on the sun's height: use the daily form there.
 * Source: Haywood & Shine (1995), Geophys. Res. Lett. 22, 603–606, after Charlson et al. (1992) and Chylek & Wong
 * (1995), Geophys. Res. Lett. 22, 929–931.
 * Checked against: checks/optics/forcing_thin_layer.csv, forcing_worked_examples.csv.
 */
export function thinLayerForcing(
  lightWm2: number,
  surfaceAlbedo: number,
  opticalDepth: number,
  singleScatteringAlbedo: number,
  upscatterFraction: number,
): number {
  const reflected = singleScatteringAlbedo * upscatterFraction * (1 - surfaceAlbedo) ** 2;
  const absorbed = 2 * (1 - singleScatteringAlbedo) * surfaceAlbedo;
  return -lightWm2 * opticalDepth * (reflected - absorbed);
}

function evaluate(input: ThinLayerInput): ForcingResult {
  const given = readInputs(input, NAMES, ['longwave']);
  const { surfaceAlbedo, opticalDepth, singleScatteringAlbedo, upscatterFraction } = given;
  const light =
    given.daylightFraction * given.solarConstantWm2 * given.transmittance ** 2 * (1 - given.cloudFraction);
  const cautions = thinLayerCautions({ ...given, cosSolarZenith: null });
  if (given.daylightFraction !== 0.5 && opticalDepth > 0) cautions.push(LOCAL_USE);
  return result(
    thinLayerForcing(light, surfaceAlbedo, opticalDepth, singleScatteringAlbedo, upscatterFraction),
    longwaveTerm(input, opticalDepth),
    criticalSingleScatteringAlbedo(upscatterFraction, surfaceAlbedo),
    cautions,
  );
}

const LOCAL_USE: Caution = {
  code: 'half-day-form-local',
  message:
    'A daylight fraction other than 0.5 uses the global-mean form for one place or season: it is off by a factor 0.5 to 2 even for the thinnest layer, and in sign over bright ground at high latitude. Use thin-layer-daily.',
};

export const thinLayer: ForcingMethod<ThinLayerInput> = {
  id: 'thin-layer',
  title: 'Thin layer, half-day form',
  formula:
    '\\Delta F = -D\\,S_0\\,T^2\\,(1-A_c)\\,\\tau\\left[\\omega\\bar\\beta(1-R_s)^2 - 2(1-\\omega)R_s\\right]',
  source:
    'Haywood & Shine (1995), Geophys. Res. Lett. 22, 603–606, after Charlson et al. (1992) and Chylek & Wong (1995)',
  inputs: declare(NAMES),
  otherInputs: ['longwave'],
  evaluate,
};
