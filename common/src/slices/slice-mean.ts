import { DomainError, type Caution, requireWithin } from '../physical/domain-error';
import { type AgeWindow, chanceInside, expectedOverlapKa } from './expected-overlap';
import { type FluxSample, type SampleInterval, sampleIntervals } from './sample-interval';

export interface SliceMean {
  meanFluxGM2Yr: number;
  /** null: one sample without an error of its own */
  standardErrorGM2Yr: number | null;
  /** share of the window that the samples' intervals cover, 0 to 1 */
  coverage: number;
  sampleCount: number;
  /** the samples behind the mean; weights add up to one */
  samples: { id: string; weight: number }[];
  cautions: Caution[];
}

export interface NoSliceMean {
  reason: 'no-sample-in-window';
}

/** A blurred interval that touches a window by less than this share of itself is not evidence of it (product choice). */
const LEAST_CHANCE = 0.05;

/**
 * Mean flux of one record in a time slice: the weighted arithmetic mean (mass is conserved in time), each sample
 * weighted by the part of its age interval, blurred by its age error, that lies in the window.
 *
 * The standard error is the larger of what the samples' own errors and what their scatter give; scatter counts
 * with the effective number of samples (Σw)²/Σw².
 *
 * @param samples one site, one quantity, one size fraction; any order
 * @param window evidence window of the slice [ka BP]
 * @returns the mean, or the reason why there is none. A sample without bounds whose age lies outside the window by
 *   more than its error does not count on its own: a gap in a record is not evidence.
 * @throws DomainError when quantities or size fractions are mixed, or a sample is impossible
 *
 * Checked against: reference/checks/general/time_slice_mean_flux.csv.
 */
export function sliceMean(samples: readonly FluxSample[], window: AgeWindow): SliceMean | NoSliceMean {
  requireWithin('window.youngKaBp', window.youngKaBp, 'ka BP', -1, 5e6);
  requireWithin('window.oldKaBp', window.oldKaBp, 'ka BP', window.youngKaBp + 1e-9, 5e6);
  requireOneKind(samples, 'quantity', (sample) => sample.quantity);
  requireOneKind(samples, 'sizeCutoff', (sample) => sample.sizeCutoff ?? 'not stated');
  const weighted = sampleIntervals(samples)
    .map((interval) => ({ interval, weight: weightOf(interval, window) }))
    .filter(({ weight }) => weight > 0);
  if (!weighted.some(({ interval }) => isEvidence(interval, window)))
    return { reason: 'no-sample-in-window' };
  return average(weighted, window);
}

interface Weighted {
  interval: SampleInterval;
  weight: number;
}

function average(weighted: Weighted[], window: AgeWindow): SliceMean {
  const total = weighted.reduce((sum, { weight }) => sum + weight, 0);
  const shares = weighted.map(({ weight }) => weight / total);
  const fluxes = weighted.map(({ interval }) => interval.sample.fluxGM2Yr);
  const mean = fluxes.reduce((sum, flux, i) => sum + shares[i]! * flux, 0);
  const coverage = coveredShare(
    weighted.map(({ interval }) => interval),
    window,
  );
  return {
    meanFluxGM2Yr: mean,
    standardErrorGM2Yr: standardError(weighted, shares, mean),
    coverage,
    sampleCount: weighted.length,
    samples: weighted.map(({ interval }, i) => ({ id: interval.sample.id, weight: shares[i]! })),
    cautions: cautionsOf(weighted, coverage),
  };
}

function weightOf(interval: SampleInterval, window: AgeWindow): number {
  const sigma = interval.sample.ageSigmaKa ?? 0;
  const length = interval.oldKaBp - interval.youngKaBp;
  if (length === 0) {
    // A point has no length: it stands for the whole window, as far as it may lie in it.
    const chance = chanceInside(interval.youngKaBp, window, sigma);
    return chance < LEAST_CHANCE ? 0 : (chance * (window.oldKaBp - window.youngKaBp)) / interval.sharedBy;
  }
  const overlap = expectedOverlapKa(interval, window, sigma);
  const onlyByBlur = expectedOverlapKa(interval, window, 0) === 0;
  const possible = Math.min(length, window.oldKaBp - window.youngKaBp);
  return onlyByBlur && overlap < LEAST_CHANCE * possible ? 0 : overlap / interval.sharedBy;
}

function isEvidence({ sample, given }: SampleInterval, window: AgeWindow): boolean {
  const sigma = sample.ageSigmaKa ?? 0;
  return given || (sample.ageKaBp >= window.youngKaBp - sigma && sample.ageKaBp <= window.oldKaBp + sigma);
}

function standardError(weighted: Weighted[], shares: number[], mean: number): number | null {
  const samples = weighted.map(({ interval }) => interval.sample);
  const known = samples.every((sample) => typeof sample.fluxSigmaGM2Yr === 'number');
  const own = Math.sqrt(samples.reduce((sum, s, i) => sum + (shares[i]! * (s.fluxSigmaGM2Yr ?? 0)) ** 2, 0));
  const effectiveCount = 1 / shares.reduce((sum, share) => sum + share * share, 0);
  if (effectiveCount <= 1 + 1e-9) return known ? own : null;
  const scatter = samples.reduce((sum, s, i) => sum + shares[i]! * (s.fluxGM2Yr - mean) ** 2, 0);
  return Math.max(own, Math.sqrt(scatter / (effectiveCount - 1)));
}

/** Share of the window under the union of the intervals, age errors left aside. */
function coveredShare(intervals: SampleInterval[], window: AgeWindow): number {
  const inOrder = [...intervals].sort((a, b) => a.youngKaBp - b.youngKaBp);
  let reached = window.youngKaBp;
  let covered = 0;
  for (const { youngKaBp, oldKaBp } of inOrder) {
    const end = Math.min(oldKaBp, window.oldKaBp);
    covered += Math.max(0, end - Math.max(youngKaBp, reached));
    reached = Math.max(reached, end);
  }
  return covered / (window.oldKaBp - window.youngKaBp);
}

function cautionsOf(weighted: Weighted[], coverage: number): Caution[] {
  const cautions: Caution[] = [];
  if (weighted.some(({ interval }) => interval.oldKaBp === interval.youngKaBp)) {
    cautions.push({
      code: 'point-sample',
      message:
        'The only sample has no age bounds and no neighbour: it stands for the window, which it does not cover.',
    });
  } else if (coverage < 0.5) {
    cautions.push({
      code: 'low-coverage',
      message: `The samples cover ${Math.round(coverage * 100)} % of the window.`,
    });
  }
  return cautions;
}

function requireOneKind(
  samples: readonly FluxSample[],
  field: string,
  kindOf: (sample: FluxSample) => string,
): void {
  const kinds = [...new Set(samples.map(kindOf))];
  if (kinds.length <= 1) return;
  throw new DomainError('mixed-samples', {
    field,
    value: kinds.join(', '),
    allowed: 'one and the same for every sample of a mean',
    remedy: 'Average each kind on its own, or convert one by a stated factor first.',
  });
}
