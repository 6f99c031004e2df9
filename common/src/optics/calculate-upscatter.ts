import { readChoice, readNumber, refuseUnused } from '../physical/check-fields';
import { DomainError, type Caution } from '../physical/domain-error';
import { MAX_ASYMMETRY, upscatterAt, upscatterMean, upscatterMeanLinear } from './upscatter';

export interface UpscatterRequest {
  asymmetry: number;
  /** absent: hemispheric mean */
  cosSolarZenith?: number;
  /** `henyey-greenstein` when absent */
  approximation?: 'henyey-greenstein' | 'linear';
}

export interface UpscatterAnswer {
  upscatterFraction: number;
  cautions: Caution[];
  method: { name: string; source: string };
}

const HENYEY_GREENSTEIN = {
  name: 'Exact for the Henyey–Greenstein phase function',
  source:
    'Wiscombe & Grams (1976), J. Atmos. Sci. 33, 2440–2451; closed form of the mean by the arithmetic–geometric mean',
};
const LINEAR = {
  name: 'Linear approximation (1 − 7g/8)/2',
  source: 'Wiscombe & Grams (1976), J. Atmos. Sci. 33, 2440–2451',
};

/**
 * Upscatter fraction at a sun angle or as the mean over the hemisphere.
 *
 * @throws DomainError when a number leaves its range, or the linear approximation is asked for one sun angle:
 * it stands for the mean alone
 */
export function calculateUpscatter(request: UpscatterRequest): UpscatterAnswer {
  refuseUnused(request, ['asymmetry', 'cosSolarZenith', 'approximation']);
  const approximation = readChoice(
    request,
    'approximation',
    ['henyey-greenstein', 'linear'] as const,
    'henyey-greenstein',
  );
  const asymmetry = readNumber(request, {
    field: 'asymmetry',
    unit: '',
    min: -MAX_ASYMMETRY,
    max: MAX_ASYMMETRY,
  });
  const mu = request.cosSolarZenith;
  if (approximation === 'linear') {
    if (mu !== undefined) {
      throw new DomainError('unused-input', {
        field: 'cosSolarZenith',
        value: mu,
        allowed: 'left out with the linear approximation, which stands for the hemispheric mean',
        remedy: 'Use henyey-greenstein for one sun angle.',
      });
    }
    return {
      upscatterFraction: upscatterMeanLinear(asymmetry),
      cautions: linearCautions(asymmetry),
      method: LINEAR,
    };
  }
  const upscatterFraction = mu === undefined ? upscatterMean(asymmetry) : upscatterAt(asymmetry, mu);
  return { upscatterFraction, cautions: [], method: HENYEY_GREENSTEIN };
}

function linearCautions(asymmetry: number): Caution[] {
  const exact = upscatterMean(asymmetry);
  const percent = (100 * (upscatterMeanLinear(asymmetry) - exact)) / exact;
  if (Math.abs(percent) < 1) return [];
  return [
    {
      code: 'linear-upscatter',
      message: `The linear approximation is ${Math.abs(percent).toFixed(1)} % too ${percent < 0 ? 'low' : 'high'} against the exact Henyey–Greenstein mean.`,
    },
  ];
}
