import { DomainError, requireWithin } from '../physical/domain-error';

export interface StudyEstimate {
  estimate: number;
  /** sampling variance of this estimate alone, > 0 */
  variance: number;
}

export interface RandomEffects {
  mean: number;
  standardError: number;
  /** τ², variance between the true values of the studies; 0 with one study */
  betweenVariance: number;
  /** Cochran's Q about the fixed-effect mean */
  q: number;
  /** share of the scatter that the sampling variances do not explain, 0 to 1 */
  iSquared: number;
  /** share of each study in the mean; they add up to one */
  weights: number[];
}

/**
 * Mean of estimates that scatter more than their own errors say (random-effects model).
 *
 *   w = 1/v,  Q = Σ w (y − ȳ)²,  τ² = max(0, (Q − (n − 1)) / (Σw − Σw²/Σw)),  w* = 1/(v + τ²)
 *
 * @param studies y with sampling variance v > 0; at least one
 * @param betweenVariance use this τ² instead of estimating it (few studies borrow it from a larger set)
 * @throws DomainError when there is no study or a variance is not positive
 *
 * Limits: τ² from fewer than about five studies is itself poorly known, and the standard error leaves that
 * out; the interval is then too narrow.
 * Source: DerSimonian & Laird (1986), Control. Clin. Trials 7, 177–188 (from memory).
 */
export function randomEffects(studies: StudyEstimate[], betweenVariance?: number): RandomEffects {
  requireStudies(studies);
  const fixed = weightedMean(studies, 0);
  const q = studies.reduce((sum, s) => sum + (s.estimate - fixed.mean) ** 2 / s.variance, 0);
  const freedom = studies.length - 1;
  const squares = studies.reduce((sum, s) => sum + 1 / s.variance ** 2, 0);
  const spread = fixed.weight - squares / fixed.weight;
  const estimated = freedom > 0 ? Math.max(0, (q - freedom) / spread) : 0;
  const between = betweenVariance ?? estimated;
  const mixed = weightedMean(studies, between);
  return {
    mean: mixed.mean,
    standardError: 1 / Math.sqrt(mixed.weight),
    betweenVariance: between,
    q,
    iSquared: q > 0 ? Math.max(0, (q - freedom) / q) : 0,
    weights: studies.map((s) => 1 / (s.variance + between) / mixed.weight),
  };
}

function weightedMean(studies: StudyEstimate[], between: number): { mean: number; weight: number } {
  const weight = studies.reduce((sum, s) => sum + 1 / (s.variance + between), 0);
  const mean = studies.reduce((sum, s) => sum + s.estimate / (s.variance + between), 0) / weight;
  return { mean, weight };
}

function requireStudies(studies: StudyEstimate[]): void {
  if (studies.length === 0) {
    throw new DomainError('no-studies', {
      field: 'studies',
      value: 'none',
      allowed: 'at least one estimate',
    });
  }
  for (const study of studies) {
    requireWithin('estimate', study.estimate, '', -Number.MAX_VALUE, Number.MAX_VALUE);
    requireWithin('variance', study.variance, '', 1e-150, 1e150);
  }
}
