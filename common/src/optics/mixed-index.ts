import { DomainError, requireWithin } from '../physical/domain-error';
import { add, divide, multiply, scale, squareRoot, subtract, type Complex } from './complex';
import { requireIndex, type RefractiveIndex } from './mie';

export const MIXING_RULES = ['volume-average', 'maxwell-garnett', 'bruggeman'] as const;
export type MixingRule = (typeof MIXING_RULES)[number];

export interface MixtureComponent {
  /** share of the volume; all of them add up to 1 */
  readonly volumeFraction: number;
  readonly refractiveIndex: RefractiveIndex;
}

export const MAX_COMPONENTS = 20;
/** How far volume fractions may miss 1: what rounding to six digits leaves. */
const SUM_TOLERANCE = 1e-5;

/**
 * Refractive index of an internal mixture, with ε = m²:
 *
 * - `volume-average`: m = Σ f m
 * - `maxwell-garnett`: ε = ε₀(1 + 2S)/(1 − S), S = Σ f (ε_i − ε₀)/(ε_i + 2ε₀), component 0 the host
 * - `bruggeman`: Σ f (ε_i − ε)/(ε_i + 2ε) = 0, the root with Im ε ≤ 0 and Re m > 0 (for m = n − ik)
 *
 * @param components 1 to 20 by volume, the first is the host; fractions add up to 1
 * @throws DomainError naming the field, or where no physical root exists
 *
 * Limits: inclusions far smaller than the wavelength. With a trace of an absorber the volume average gives 1.4 to 1.7
 * times the k of Maxwell Garnett: state the rule beside every result.
 * Source: Maxwell Garnett (1904), Phil. Trans. R. Soc. A 203, 385–420; Bruggeman (1935), Ann. Phys. 416, 636–664 (from
 * memory). Checked against: checks/optics/mixing_rules.csv.
 */
export function mixedIndex(rule: MixingRule, components: readonly MixtureComponent[]): RefractiveIndex {
  requireComponents(components);
  const present = components.filter((component, i) => i === 0 || component.volumeFraction > 0);
  const indices = present.map(({ refractiveIndex: { real, imaginary } }) => ({ re: real, im: -imaginary }));
  const total = present.reduce((sum, component) => sum + component.volumeFraction, 0);
  const fractions = present.map((component) => component.volumeFraction / total);
  if (rule === 'volume-average') return asIndex(weightedSum(fractions, indices));
  const permittivities = indices.map((m) => multiply(m, m));
  const permittivity =
    rule === 'maxwell-garnett'
      ? maxwellGarnett(fractions, permittivities)
      : bruggeman(fractions, permittivities);
  return asIndex(physicalRoot(permittivity, rule));
}

/** f_i = (q_i/ρ_i) / Σ (q_j/ρ_j): shares by volume from shares by mass q and densities ρ. */
export function volumeFractions(
  massFractions: readonly number[],
  densitiesGCm3: readonly number[],
): number[] {
  const volumes = massFractions.map((share, i) => {
    requireWithin(`massFractions[${i}]`, share, '', 0, 1);
    return share / requireWithin(`densitiesGCm3[${i}]`, densitiesGCm3[i]!, 'g cm⁻³', 0.1, 20);
  });
  const total = volumes.reduce((sum, volume) => sum + volume, 0);
  if (total === 0) {
    throw new DomainError('outside-range', {
      field: 'massFractions',
      value: 0,
      allowed: 'above 0 in at least one',
    });
  }
  return volumes.map((volume) => volume / total);
}

function maxwellGarnett(fractions: number[], permittivities: Complex[]): Complex {
  const host = permittivities[0]!;
  const terms = permittivities.map((e) => divide(subtract(e, host), add(e, scale(host, 2))));
  const sum = weightedSum(fractions, terms);
  return multiply(host, divide(add(ONE, scale(sum, 2)), subtract(ONE, sum)));
}

function bruggeman(fractions: number[], permittivities: Complex[]): Complex {
  if (permittivities.length === 1) return permittivities[0]!;
  if (permittivities.length === 2) return bruggemanOfTwo(fractions, permittivities);
  return bruggemanByContinuation(fractions, permittivities);
}

function bruggemanOfTwo([f1, f2]: number[], [e1, e2]: Complex[]): Complex {
  const h = add(scale(e1!, 3 * f1! - 1), scale(e2!, 3 * f2! - 1));
  const root = squareRoot(add(multiply(h, h), scale(multiply(e1!, e2!), 8)));
  const candidates = [scale(add(h, root), 0.25), scale(subtract(h, root), 0.25)];
  return candidates.find(isPhysical) ?? candidates[0]!;
}

/** Follows the root from the pure host to the wanted fractions by Newton steps, so that no other root is taken. */
function bruggemanByContinuation(fractions: number[], permittivities: Complex[]): Complex {
  const steps = 64;
  let e = permittivities[0]!;
  for (let step = 1; step <= steps; step += 1) {
    const share = step / steps;
    const now = fractions.map((f, i) => share * f + (i === 0 ? 1 - share : 0));
    for (let iteration = 0; iteration < 12; iteration += 1) e = bruggemanNewton(now, permittivities, e);
  }
  return e;
}

/** One step on F = Σ f (ε_i − ε)/(ε_i + 2ε), with F′ = −3 Σ f ε_i/(ε_i + 2ε)². */
function bruggemanNewton(fractions: number[], permittivities: Complex[], e: Complex): Complex {
  let value: Complex = ZERO;
  let slope: Complex = ZERO;
  permittivities.forEach((ei, i) => {
    const below = add(ei, scale(e, 2));
    value = add(value, scale(divide(subtract(ei, e), below), fractions[i]!));
    slope = add(slope, scale(divide(ei, multiply(below, below)), -3 * fractions[i]!));
  });
  return subtract(e, divide(value, slope));
}

const ZERO: Complex = { re: 0, im: 0 };
const ONE: Complex = { re: 1, im: 0 };

/** Im ε ≤ 0 but for rounding, and not the negative real axis, where m would have no real part. */
function isPhysical(e: Complex): boolean {
  return e.im <= 1e-12 * Math.hypot(e.re, e.im) && (e.re > 0 || e.im < 0);
}

function physicalRoot(permittivity: Complex, rule: MixingRule): Complex {
  const finite = Number.isFinite(permittivity.re) && Number.isFinite(permittivity.im);
  if (!finite || !isPhysical(permittivity)) {
    throw new DomainError('no-physical-root', {
      field: 'components',
      value: rule,
      allowed: 'a mixture with a permittivity of no gain and a real part of its index above 0',
      remedy: 'Use another mixing rule: this one has no physical solution for these indices and fractions.',
    });
  }
  return squareRoot(permittivity);
}

function weightedSum(weights: readonly number[], values: readonly Complex[]): Complex {
  return values.reduce<Complex>((sum, value, i) => add(sum, scale(value, weights[i]!)), ZERO);
}

const asIndex = (m: Complex): RefractiveIndex => ({ real: m.re, imaginary: Math.max(0, -m.im) });

function requireComponents(components: readonly MixtureComponent[]): void {
  if (!Array.isArray(components) || components.length < 1 || components.length > MAX_COMPONENTS) {
    throw new DomainError('outside-range', {
      field: 'components',
      value: Array.isArray(components) ? components.length : components,
      allowed: `a list of 1 to ${MAX_COMPONENTS} components`,
    });
  }
  let sum = 0;
  components.forEach((component: MixtureComponent, i) => {
    sum += requireWithin(`components[${i}].volumeFraction`, component.volumeFraction, '', 0, 1);
    requireIndex(component.refractiveIndex, `components[${i}].refractiveIndex.`);
  });
  if (Math.abs(sum - 1) > SUM_TOLERANCE) {
    throw new DomainError('contradictory-input', {
      field: 'components',
      value: Number(sum.toPrecision(8)),
      allowed: 'such that the volume fractions add up to 1',
      remedy: 'Give fractions of the volume, the host included.',
    });
  }
}
