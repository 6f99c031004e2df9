import { DomainError, requireWithin } from '../physical/domain-error';
import { type EstimateInputs, VARIED_INPUTS, type VariedInput } from './estimate-inputs';

/** Values that may differ from member to member. */
export type MemberValues = Record<VariedInput, number>;

/** What physics allows; a distribution must be cut so that it stays inside. */
const ALLOWED: Record<VariedInput, { unit: string; min: number; max: number }> = {
  singleScatteringAlbedo: { unit: '', min: 0, max: 1 },
  // beyond it the Legendre series kept by the daily form is too short
  asymmetry: { unit: '', min: -0.9, max: 0.9 },
  transmittance: { unit: '', min: 0, max: 1 },
  opticalDepthFactor: { unit: '', min: 0, max: 100 },
  surfaceAlbedoFactor: { unit: '', min: 0, max: 1.15 },
  cloudFractionFactor: { unit: '', min: 0, max: 1.1 },
  shortwaveEfficiencyWm2: { unit: 'W m⁻²', min: -200, max: 200 },
  longwaveEfficiencyWm2: { unit: 'W m⁻²', min: -100, max: 100 },
};

/** The central case: every input at its stated value. */
export function centralValues(inputs: EstimateInputs): MemberValues {
  const values = {
    singleScatteringAlbedo: inputs.optics.singleScatteringAlbedo,
    asymmetry: inputs.optics.asymmetry,
    transmittance: inputs.transmittance,
    opticalDepthFactor: 1,
    surfaceAlbedoFactor: 1,
    cloudFractionFactor: 1,
    shortwaveEfficiencyWm2: inputs.shortwaveEfficiency?.efficiencyWm2 ?? 0,
    longwaveEfficiencyWm2: inputs.longwave?.efficiencyWm2 ?? 0,
  };
  for (const name of VARIED_INPUTS) requireValue(name, values[name]);
  return values;
}

/** @throws DomainError naming the input */
export function requireValue(name: VariedInput, value: number): void {
  const { unit, min, max } = ALLOWED[name];
  requireWithin(name, value, unit, min, max);
}

/** @throws DomainError for an unknown or repeated parameter, or one that the run does not use */
export function requireParameters(inputs: EstimateInputs): void {
  const names = inputs.ensemble.parameters.map((parameter) => parameter.name);
  names.forEach((name, i) => {
    if (!VARIED_INPUTS.includes(name)) {
      throw new DomainError('unknown-parameter', {
        field: 'ensemble.parameters',
        value: name,
        allowed: VARIED_INPUTS,
      });
    }
    if (names.indexOf(name) !== i) {
      throw new DomainError('parameter-twice', {
        field: 'ensemble.parameters',
        value: name,
        allowed: 'each once',
      });
    }
    const unused =
      (name === 'shortwaveEfficiencyWm2' && inputs.method !== 'efficiency') ||
      (name === 'longwaveEfficiencyWm2' && inputs.longwave === null);
    if (unused) {
      throw new DomainError('parameter-unused', {
        field: 'ensemble.parameters',
        value: name,
        allowed: 'inputs that this method uses',
        remedy: 'Leave it out, or choose the method that needs it.',
      });
    }
  });
}
