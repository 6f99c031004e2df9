import { DomainError, requireWithin } from '../physical/domain-error';
import { normalQuantile } from './normal-quantile';
import { incompleteBeta, inverseIncompleteBeta, normalCdf } from './special-functions';

/** Cut a distribution to what is possible; the rest is scaled up to one. */
export interface Truncation {
  min?: number;
  max?: number;
}

export type Distribution =
  | { kind: 'constant'; value: number }
  | ({ kind: 'normal'; mean: number; sd: number } & Truncation)
  | ({ kind: 'lognormal'; median: number; geometricSd: number } & Truncation)
  | { kind: 'uniform'; low: number; high: number }
  | { kind: 'triangular'; low: number; mode: number; high: number }
  | ({ kind: 'beta'; low: number; high: number; alpha: number; beta: number } & Truncation);

/**
 * Value that a parameter does not exceed with the given probability (inverse distribution function).
 *
 * @param probability [1], strictly between 0 and 1
 * @throws DomainError for a probability outside, or a distribution that is not possible
 */
export function distributionQuantile(distribution: Distribution, probability: number): number {
  requireDistribution(distribution);
  requireWithin('probability', probability, '', Number.MIN_VALUE, 1 - Number.EPSILON / 2);
  const { min, max } = distribution as Truncation;
  const below = min === undefined ? 0 : cumulative(distribution, min);
  const upTo = max === undefined ? 1 : cumulative(distribution, max);
  const value = rawQuantile(distribution, below + probability * (upTo - below));
  // rounding at the ends must not leave the stated limits
  return Math.min(max ?? Infinity, Math.max(min ?? -Infinity, value));
}

function rawQuantile(d: Distribution, p: number): number {
  switch (d.kind) {
    case 'constant':
      return d.value;
    case 'normal':
      return d.sd === 0 ? d.mean : d.mean + d.sd * normalQuantile(p);
    case 'lognormal':
      return d.geometricSd === 1
        ? d.median
        : d.median * Math.exp(Math.log(d.geometricSd) * normalQuantile(p));
    case 'uniform':
      return d.low + p * (d.high - d.low);
    case 'triangular':
      return triangularQuantile(d, p);
    case 'beta':
      return d.low + (d.high - d.low) * inverseIncompleteBeta(p, d.alpha, d.beta);
  }
}

function triangularQuantile(
  { low, mode, high }: { low: number; mode: number; high: number },
  p: number,
): number {
  const width = high - low;
  if (width === 0) return low;
  const atMode = (mode - low) / width;
  return p < atMode
    ? low + Math.sqrt(p * width * (mode - low))
    : high - Math.sqrt((1 - p) * width * (high - mode));
}

/** Distribution function before truncation. */
function cumulative(d: Distribution, x: number): number {
  switch (d.kind) {
    case 'normal':
      return d.sd === 0 ? Number(x >= d.mean) : normalCdf((x - d.mean) / d.sd);
    case 'lognormal':
      if (x <= 0) return 0;
      return d.geometricSd === 1
        ? Number(x >= d.median)
        : normalCdf(Math.log(x / d.median) / Math.log(d.geometricSd));
    case 'beta':
      return incompleteBeta((x - d.low) / (d.high - d.low), d.alpha, d.beta);
    default:
      return 1; // kinds without truncation never come here
  }
}

/** @throws DomainError naming the wrong property */
export function requireDistribution(d: Distribution): void {
  const finite = (field: string, value: number, min = -Number.MAX_VALUE, max = Number.MAX_VALUE) =>
    requireWithin(`${d.kind}.${field}`, value, '', min, max);
  switch (d.kind) {
    case 'constant':
      finite('value', d.value);
      return;
    case 'normal':
      finite('mean', d.mean);
      finite('sd', d.sd, 0);
      break;
    case 'lognormal':
      finite('median', d.median, Number.MIN_VALUE);
      finite('geometricSd', d.geometricSd, 1);
      break;
    case 'uniform':
      finite('low', d.low);
      finite('high', d.high, d.low);
      return;
    case 'triangular':
      finite('low', d.low);
      finite('high', d.high, d.low);
      finite('mode', d.mode, d.low, d.high);
      return;
    case 'beta':
      finite('low', d.low);
      finite('high', d.high, d.low + Number.MIN_VALUE);
      finite('alpha', d.alpha, 1e-3, 1e6);
      finite('beta', d.beta, 1e-3, 1e6);
  }
  requireSomethingLeft(d);
}

function requireSomethingLeft(d: Distribution & Truncation): void {
  const below = d.min === undefined ? 0 : cumulative(d, d.min);
  const upTo = d.max === undefined ? 1 : cumulative(d, d.max);
  const fixed = (d.kind === 'normal' && d.sd === 0) || (d.kind === 'lognormal' && d.geometricSd === 1);
  if (upTo - below > 1e-12 || (fixed && upTo === 1 && isAtLeast(d))) return;
  throw new DomainError('empty-truncation', {
    field: `${d.kind}.min, max`,
    value: `${d.min ?? '−∞'} to ${d.max ?? '∞'}`,
    allowed: 'limits that leave some of the distribution',
  });
}

function isAtLeast(d: Distribution & Truncation): boolean {
  const centre = d.kind === 'normal' ? d.mean : d.kind === 'lognormal' ? d.median : 0;
  return centre >= (d.min ?? -Infinity);
}
