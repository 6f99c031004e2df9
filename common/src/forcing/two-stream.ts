import { readChoice } from '../physical/check-fields';
import type { Caution } from '../physical/domain-error';
import {
  evaluateLayer,
  LAYER_INPUTS,
  LAYER_OTHER_INPUTS,
  type LayerMethodInput,
  type LayerState,
} from './layer-method';
import type { ForcingMethod, ForcingResult } from './method';
import type { SunAngles } from './sun-angles';
import { CLOSURE_IDS, type ClosureId } from './two-stream-closures';
import { twoStreamScheme } from './two-stream-scheme';

export interface TwoStreamInput extends LayerMethodInput {
  /** `delta-eddington` when absent; the others are there to compare */
  closure?: ClosureId;
}

/** Delta-Eddington, or another published closure by name, over a Lambertian surface. */
function evaluate(input: TwoStreamInput): ForcingResult {
  const closure = readChoice(input, 'closure', CLOSURE_IDS, 'delta-eddington');
  return evaluateLayer(input, twoStreamScheme(closure), ['closure'], (state, sun) =>
    closure === 'delta-eddington' ? ownCautions(state, sun) : [OTHER_CLOSURE],
  );
}

/** Thresholds and errors as measured: checks/optics/error_summary.csv, FORMULAS.md §7. */
function ownCautions({ opticalDepth, surfaceAlbedo }: LayerState, sun: SunAngles): Caution[] {
  const found: Caution[] = [];
  if (opticalDepth <= 0.3 && surfaceAlbedo < 0.3) {
    found.push({
      code: 'two-stream-thin',
      message: `Optical depth ${opticalDepth} over dark ground: delta-Eddington understates the cooling by 15 to 22 % at 0.01, 9 to 13 % at 0.1 and 4 to 8 % at 0.3, and does not meet the thin layer as it vanishes.`,
    });
  }
  const lowSun = sun.cosines.length === 1 && sun.cosines[0]! <= 0.25;
  if (lowSun && opticalDepth <= 0.3) {
    found.push({
      code: 'two-stream-low-sun',
      message:
        'A thin layer under a sun below 15°: delta-Eddington is off by 15 to 23 % of the sum of its terms at the median, up to 56 %.',
    });
  }
  return found;
}

const OTHER_CLOSURE: Caution = {
  code: 'closure-to-compare',
  message:
    'This closure is offered to compare. Without delta scaling it may reflect less than nothing; hemispheric mean was recommended for the infrared only.',
};

export const twoStream: ForcingMethod<TwoStreamInput> = {
  id: 'two-stream',
  title: 'Two-stream (delta-Eddington)',
  formula:
    "\\Delta F = -T^2 (1-A_c)\\left\\langle F\\left[R + \\frac{R_s T_\\ell \\bar T_\\ell}{1-R_s\\bar R} - R_s\\right]\\right\\rangle,\\quad R, T_\\ell(\\tau', \\omega', g';\\mu_0),\\; \\tau' = (1-\\omega g^2)\\tau,\\; \\omega' = \\frac{\\omega(1-g^2)}{1-\\omega g^2},\\; g' = \\frac{g}{1+g}",
  source: twoStreamScheme('delta-eddington').source,
  inputs: LAYER_INPUTS,
  otherInputs: [...LAYER_OTHER_INPUTS, 'closure'],
  evaluate,
};
