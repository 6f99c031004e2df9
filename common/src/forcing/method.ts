import type { NumberField } from '../physical/check-fields';
import type { Caution } from '../physical/domain-error';

/** What every method answers. Positive downward: positive warms. */
export interface ForcingResult {
  shortwaveWm2: number;
  /** 0 with the caution `longwave-left-out` where it was not asked for */
  longwaveWm2: number;
  netWm2: number;
  /** single-scattering albedo at which the shortwave effect changes sign; null where the method has none */
  criticalSingleScatteringAlbedo: number | null;
  cautions: Caution[];
}

/** A numeric input of a method, as forms and documents show it. */
export interface MethodInput extends NumberField {
  readonly title: string;
  /** false where another input stands for it or it may be left out */
  readonly required: boolean;
}

/** A way to compute forcing at the top of the atmosphere. */
export interface ForcingMethod<Input> {
  readonly id: string;
  readonly title: string;
  /** in TeX */
  readonly formula: string;
  readonly source: string;
  readonly inputs: readonly MethodInput[];
  /** names of inputs that are not plain numbers */
  readonly otherInputs: readonly string[];
  /** @throws DomainError naming the input that is missing, out of range or not used */
  readonly evaluate: (input: Input) => ForcingResult;
}

/** Adds up the terms of a result. */
export function result(
  shortwaveWm2: number,
  longwave: { longwaveWm2: number; cautions: Caution[] },
  criticalSingleScatteringAlbedo: number | null,
  cautions: Caution[],
): ForcingResult {
  return {
    shortwaveWm2,
    longwaveWm2: longwave.longwaveWm2,
    netWm2: shortwaveWm2 + longwave.longwaveWm2,
    criticalSingleScatteringAlbedo,
    cautions: [...cautions, ...longwave.cautions],
  };
}
