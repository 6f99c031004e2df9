import { readChoice, readNumber } from '../physical/check-fields';
import { DomainError, type Caution } from '../physical/domain-error';
import { declare, INPUTS, readInputs } from './inputs';
import { BY_EFFICIENCY, longwaveTerm, type LongwaveInput, type LongwaveTerm } from './longwave';
import { result, type ForcingMethod, type ForcingResult } from './method';

export interface EfficiencyInput {
  opticalDepth: number;
  shortwaveEfficiencyWm2: number;
  /** this or `longwave` */
  longwaveEfficiencyWm2?: number;
  longwave?: LongwaveInput;
  /** sky the efficiencies belong to; `all` when absent */
  efficiencySky?: 'all' | 'clear';
  /** with a clear sky only */
  cloudFraction?: number;
  highCloudFraction?: number;
}

/**
 * Forcing as efficiency times optical depth: ΔF = E τ, for the sky the efficiency belongs to. A clear-sky efficiency
 * is multiplied by the clear part: 1 − A_c for shortwave, 1 − A_h (high cloud) for longwave.
 *
 * Limits: an efficiency belongs to its place, season, sky, surface, size mix and optical-depth product.
 */
function evaluate(input: EfficiencyInput): ForcingResult {
  const sky = readChoice(input, 'efficiencySky', ['all', 'clear'] as const, 'all');
  const byEfficiency = usesLongwaveEfficiency(input);
  const skyFields =
    sky === 'all' ? [] : byEfficiency ? ['cloudFraction', 'highCloudFraction'] : ['cloudFraction'];
  const others = ['longwaveEfficiencyWm2', 'longwave', 'efficiencySky', ...skyFields];
  const { opticalDepth, shortwaveEfficiencyWm2 } = readInputs(
    input,
    ['opticalDepth', 'shortwaveEfficiencyWm2'],
    others,
  );
  const clear = sky === 'all' ? 1 : 1 - readNumber(input, INPUTS.cloudFraction);
  const longwave = longwavePart(input, opticalDepth);
  if (sky === 'clear' && byEfficiency)
    longwave.longwaveWm2 *= 1 - readNumber(input, INPUTS.highCloudFraction);
  return result(clear * shortwaveEfficiencyWm2 * opticalDepth, longwave, null, [TRANSFER]);
}

function usesLongwaveEfficiency({ longwaveEfficiencyWm2, longwave }: EfficiencyInput): boolean {
  if (longwaveEfficiencyWm2 !== undefined && longwave !== undefined) {
    throw new DomainError('contradictory-input', {
      field: 'longwaveEfficiencyWm2',
      value: longwaveEfficiencyWm2,
      allowed: 'left out when longwave is given: the block replaces it',
    });
  }
  return longwaveEfficiencyWm2 !== undefined || (typeof longwave === 'object' && 'efficiencyWm2' in longwave);
}

function longwavePart(input: EfficiencyInput, opticalDepth: number): LongwaveTerm {
  if (input.longwaveEfficiencyWm2 === undefined) return longwaveTerm(input, opticalDepth);
  return {
    longwaveWm2: readNumber(input, INPUTS.longwaveEfficiencyWm2) * opticalDepth,
    cautions: [BY_EFFICIENCY],
  };
}

const TRANSFER: Caution = {
  code: 'efficiency-belongs-to-its-place',
  message:
    'An efficiency belongs to its place, season, sky, surface, size mix and optical-depth product; elsewhere it is a guess (one region: −50 or −37 W m⁻² per unit τ by the product alone).',
};

export const efficiency: ForcingMethod<EfficiencyInput> = {
  id: 'efficiency',
  title: 'Efficiency times optical depth',
  formula: '\\Delta F = E_{SW}\\,\\tau + E_{LW}\\,\\tau',
  source:
    'Common practice; spread by optical-depth product: Song et al. (2018), Atmos. Chem. Phys. 18, 11303–11322',
  inputs: [
    ...declare(['opticalDepth', 'shortwaveEfficiencyWm2']),
    ...declare(['longwaveEfficiencyWm2', 'cloudFraction', 'highCloudFraction']).map((field) => ({
      ...field,
      required: false,
    })),
  ],
  otherInputs: ['longwave', 'efficiencySky'],
  evaluate,
};
