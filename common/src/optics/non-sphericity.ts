import { requireWithin, type Caution } from '../physical/domain-error';

/** First correction for the shape of dust: how much more a dust particle takes from the light than a sphere of its volume. */
export const NON_SPHERICITY = {
  name: 'Non-sphericity of dust',
  /** factor on extinction per mass */
  factor: { low: 1.2, central: 1.3, high: 1.4 },
  source:
    'Kok et al. (2017), Nat. Geosci. 10, 274–278; Huang et al. (2023), Atmos. Chem. Phys. 23, 2557–2577',
  evidence: 'from memory',
} as const;

/**
 * Optics of dust spheres with extinction raised for shape; ω and g stay, which is the usual first correction.
 *
 * Off unless asked for; the caution names it in every result.
 *
 * @param factor 1 to 2; central 1.3, published range about 1.2 to 1.4 (from memory)
 *
 * Limits: dust in the shortwave, particles above about 1 µm. Small ones need less, and other species none.
 */
export function withNonSphericity<T extends { massExtinctionM2PerG: number }>(
  optics: T,
  factor: number = NON_SPHERICITY.factor.central,
): { optics: T; cautions: Caution[] } {
  requireWithin('factor', factor, '', 1, 2);
  return {
    optics: { ...optics, massExtinctionM2PerG: optics.massExtinctionM2PerG * factor },
    cautions: [
      {
        code: 'non-sphericity-applied',
        message: `${NON_SPHERICITY.name}: extinction per mass raised ${factor} times (${NON_SPHERICITY.factor.low} to ${NON_SPHERICITY.factor.high}; ${NON_SPHERICITY.source}, ${NON_SPHERICITY.evidence}); albedo and asymmetry unchanged.`,
      },
    ],
  };
}
