import { requireWithin } from '../physical/domain-error';
import type { Distribution, Truncation } from './distributions';
import { normalQuantile } from './normal-quantile';

/** What the bounds of a published range mean. An expert's plausible range is read as 5 to 95 %: a product choice. */
export type BoundsMeaning = 'one-sigma' | '5-95';

export type BoundedKind = 'constant' | 'normal' | 'lognormal' | 'uniform' | 'triangular' | 'beta';

export interface BoundedParameter {
  kind: BoundedKind;
  low: number;
  central: number;
  high: number;
  /** normal and lognormal only; the others end at their bounds */
  bounds?: BoundsMeaning;
  truncation?: Truncation;
}

/**
 * Distribution from a low, central and high value as parameter lists print them.
 *
 * normal: mean = central, sd from the mean half-width; lognormal: median = central, geometric sd from √(high/low);
 * triangular: the three as they are; beta: low to high with mode = central and concentration 4 (the PERT choice,
 * Malcolm et al. 1959, Oper. Res. 7, 646–669, from memory).
 *
 * @throws DomainError when low ≤ central ≤ high does not hold
 */
export function distributionFromBounds(parameter: BoundedParameter): Distribution {
  const { kind, low, central, high, truncation } = parameter;
  requireWithin('low', low, '', -Number.MAX_VALUE, Number.MAX_VALUE);
  requireWithin('high', high, '', low, Number.MAX_VALUE);
  requireWithin('central', central, '', low, high);
  if (low === high) return { kind: 'constant', value: central };
  const z = parameter.bounds === 'one-sigma' ? 1 : normalQuantile(0.95);
  switch (kind) {
    case 'constant':
      return { kind, value: central };
    case 'normal':
      return { kind, mean: central, sd: (high - low) / (2 * z), ...truncation };
    case 'lognormal':
      requireWithin('low', low, '', Number.MIN_VALUE, high);
      return { kind, median: central, geometricSd: Math.exp(Math.log(high / low) / (2 * z)), ...truncation };
    case 'uniform':
      return { kind, low, high };
    case 'triangular':
      return { kind, low, mode: central, high };
    case 'beta': {
      const share = (central - low) / (high - low);
      return { kind, low, high, alpha: 1 + 4 * share, beta: 1 + 4 * (1 - share), ...truncation };
    }
  }
}
