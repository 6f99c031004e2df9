import { DomainError, requireWithin, type Caution } from '../physical/domain-error';
import { massFractionBelow } from './lognormal-mode';
import { requireModes, type OpticalMode } from './mode-optics';

/**
 * Load of dust with a diameter of 5 µm or more: 17 Tg (12 to 24), four times the mean of models (4.25 Tg by that ratio).
 * Central value read in the abstract; bounds and the reading as a factor on a size distribution are from memory and our
 * own arithmetic.
 */
export const COARSE_DUST = {
  name: 'Coarse-dust addition',
  aboveDiameterUm: 5,
  /** factor on the mass above 5 µm */
  factor: { low: 2.8, central: 4, high: 5.6 },
  source: 'Adebiyi & Kok (2020), Sci. Adv. 6, eaaz9507 (volume and page from memory)',
  evidence: 'central value seen, bounds from memory',
} as const;

/**
 * Dust modes with the load above 5 µm diameter raised, which size distributions made after models miss. Each mode that
 * reaches beyond 5 µm becomes two: the part below as it was, the part above with more particles.
 *
 * Off unless asked for; the caution names it in every result.
 *
 * @param factor on the mass above 5 µm, 1 to 10; central 4, published range 2.8 to 5.6
 * @returns modes whose number fractions add up to the old total again
 *
 * Limits: for distributions that lack coarse dust; one that has it already would get it twice. The shape above 5 µm stays.
 */
export function addCoarseDust(
  modes: readonly OpticalMode[],
  factor: number = COARSE_DUST.factor.central,
): { modes: OpticalMode[]; cautions: Caution[] } {
  requireModes(modes);
  requireWithin('factor', factor, '', 1, 10);
  const cut = COARSE_DUST.aboveDiameterUm;
  if (modes.every((mode) => massFractionBelow(mode, cut) > 1 - 1e-6)) {
    throw new DomainError('nothing-to-raise', {
      field: 'modes',
      value: modes.length,
      allowed: `such that some mass lies above ${cut} µm diameter`,
      remedy: 'Widen the size limits first: the addition raises what is there.',
    });
  }
  const total = modes.reduce((sum, mode) => sum + mode.numberFraction, 0);
  const split = modes.flatMap((mode) => splitMode(mode, cut / 2, factor));
  const scaled = total / split.reduce((sum, mode) => sum + mode.numberFraction, 0);
  return {
    modes: split.map((mode) => ({ ...mode, numberFraction: mode.numberFraction * scaled })),
    cautions: [
      {
        code: 'coarse-dust-added',
        message: `${COARSE_DUST.name}: mass above ${cut} µm diameter raised ${factor} times (${COARSE_DUST.factor.low} to ${COARSE_DUST.factor.high}; ${COARSE_DUST.source}).`,
      },
    ],
  };
}

function splitMode(mode: OpticalMode, radiusUm: number, factor: number): OpticalMode[] {
  const below = massFractionBelow(mode, 2 * radiusUm);
  // A sliver of the mode on one side is no mode of its own.
  if (below > 1 - 1e-6) return [mode];
  const above = { ...mode, numberFraction: mode.numberFraction * factor };
  if (below < 1e-6) return [above];
  return [
    { ...mode, maxRadiusUm: radiusUm },
    { ...above, minRadiusUm: radiusUm },
  ];
}
