import type { Caution } from '../physical/domain-error';
import type { RefractiveIndex } from './mie';
import { mixedIndex, type MixingRule } from './mixed-index';
import { refractiveIndexAt, refractiveIndexTable } from './refractive-index';

/** A mineral of a particle, by its share of the volume. */
export interface MineralPart {
  /** id of a refractive-index table, e.g. `hematite` */
  readonly material: string;
  readonly volumeFraction: number;
}

/**
 * Refractive index of particles made of several tabulated minerals, at a wavelength.
 *
 * @param parts the first is the host (for Maxwell Garnett); fractions add up to 1
 * @returns the index, and a caution for each mineral whose table does not reach the wavelength
 *
 * Limits: one ray of each crystal (ordinary); every particle of the same make-up. The clays' tables start at 2.5 µm.
 * Source: that of each table; rules as `mixedIndex`.
 */
export function mineralMixtureIndex(
  parts: readonly MineralPart[],
  wavelengthUm: number,
  rule: MixingRule,
): { refractiveIndex: RefractiveIndex; cautions: Caution[] } {
  const found = parts.map(({ material, volumeFraction }) => ({
    volumeFraction,
    ...refractiveIndexAt(refractiveIndexTable(material), wavelengthUm),
  }));
  return {
    refractiveIndex: mixedIndex(rule, found),
    cautions: found.flatMap(({ volumeFraction, cautions }) => (volumeFraction > 0 ? cautions : [])),
  };
}
