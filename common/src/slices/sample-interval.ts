import { DomainError, requireWithin } from '../physical/domain-error';

/** What averaging needs of a sample, in canonical units. */
export interface FluxSample {
  id: string;
  /** ka before 1950 CE; negative = later */
  ageKaBp: number;
  ageYoungKaBp?: number | null;
  ageOldKaBp?: number | null;
  /** one standard deviation of the age [ka] */
  ageSigmaKa?: number | null;
  fluxGM2Yr: number;
  /** one standard error [g m⁻² yr⁻¹] */
  fluxSigmaGM2Yr?: number | null;
  /** dust, nssCa, Fe …: a proxy is never called dust */
  quantity: string;
  sizeCutoff?: string | null;
}

export interface SampleInterval {
  sample: FluxSample;
  youngKaBp: number;
  oldKaBp: number;
  /** samples of one age that share this interval */
  sharedBy: number;
  /** false: no bounds were given, the interval reaches half-way to the neighbours */
  given: boolean;
}

/**
 * Age interval that each sample of one record stands for: its given bounds, else half-way to its neighbours; the
 * first and the last reach as far outwards as inwards. A lone sample without bounds is a point in time.
 *
 * @throws DomainError for an age that is not a number, bounds in the wrong order, or a negative error
 */
export function sampleIntervals(samples: readonly FluxSample[]): SampleInterval[] {
  samples.forEach(requireSample);
  const ages = [...new Set(samples.map((sample) => sample.ageKaBp))].sort((a, b) => a - b);
  return samples.map((sample) => {
    if (hasBounds(sample)) {
      return {
        sample,
        youngKaBp: sample.ageYoungKaBp!,
        oldKaBp: sample.ageOldKaBp!,
        sharedBy: 1,
        given: true,
      };
    }
    const at = ages.indexOf(sample.ageKaBp);
    const toYounger = at > 0 ? (sample.ageKaBp - ages[at - 1]!) / 2 : null;
    const toOlder = at < ages.length - 1 ? (ages[at + 1]! - sample.ageKaBp) / 2 : null;
    return {
      sample,
      youngKaBp: sample.ageKaBp - (toYounger ?? toOlder ?? 0),
      oldKaBp: sample.ageKaBp + (toOlder ?? toYounger ?? 0),
      sharedBy: samples.filter((other) => other.ageKaBp === sample.ageKaBp && !hasBounds(other)).length,
      given: false,
    };
  });
}

function hasBounds(sample: FluxSample): boolean {
  return typeof sample.ageYoungKaBp === 'number' && typeof sample.ageOldKaBp === 'number';
}

function requireSample(sample: FluxSample): void {
  const field = (name: string) => `sample ${sample.id}: ${name}`;
  requireWithin(field('ageKaBp'), sample.ageKaBp, 'ka BP', -1, 5e6);
  requireWithin(field('fluxGM2Yr'), sample.fluxGM2Yr, 'g m⁻² yr⁻¹', 0, 1e9);
  requireWithin(field('fluxSigmaGM2Yr'), sample.fluxSigmaGM2Yr ?? 0, 'g m⁻² yr⁻¹', 0, 1e9);
  requireWithin(field('ageSigmaKa'), sample.ageSigmaKa ?? 0, 'ka', 0, 1e6);
  if (hasBounds(sample) && sample.ageYoungKaBp! > sample.ageOldKaBp!) {
    throw new DomainError('bounds-reversed', {
      field: field('ageYoungKaBp'),
      value: sample.ageYoungKaBp,
      unit: 'ka BP',
      allowed: `an age not above the old bound, ${sample.ageOldKaBp} ka BP`,
      remedy: 'Exchange the two bounds, or correct the one that is wrong.',
    });
  }
}
