import { DomainError, requireWithin, type Caution } from '../physical/domain-error';

/** One kind of particle in a column. */
export interface Species {
  name: string;
  /** τ at the wavelength of the others */
  opticalDepth: number;
  singleScatteringAlbedo: number;
  asymmetry: number;
}

export interface SpeciesMixture {
  opticalDepth: number;
  singleScatteringAlbedo: number;
  asymmetry: number;
  cautions: Caution[];
}

/**
 * Several kinds of particle in one layer, each by itself (external mixture):
 *
 *   τ = Σ τ_i,  ω = Σ ω_i τ_i / τ,  g = Σ g_i ω_i τ_i / Σ ω_i τ_i
 *
 * Where nothing scatters, g is that of τ-weighted means, and where there is nothing, of the plain means: neither is
 * then of any effect.
 *
 * @throws DomainError for an empty list, a name that comes twice, or a value out of range
 *
 * Limits: one layer for all; particles that stick together (coated soot, sulfate on dust) break it.
 * Source: common practice; the weights follow from adding extinction and scattering.
 */
export function mixSpecies(species: readonly Species[]): SpeciesMixture {
  checkSpecies(species);
  const extinction = species.map(({ opticalDepth }) => opticalDepth);
  const scattering = species.map(
    ({ opticalDepth, singleScatteringAlbedo }) => opticalDepth * singleScatteringAlbedo,
  );
  return {
    opticalDepth: total(extinction),
    singleScatteringAlbedo: weighted(
      species.map((one) => one.singleScatteringAlbedo),
      extinction,
    ),
    asymmetry: weighted(
      species.map((one) => one.asymmetry),
      total(scattering) > 0 ? scattering : extinction,
    ),
    cautions: species.filter(({ opticalDepth }) => opticalDepth > 0).length > 1 ? [EXTERNAL] : [],
  };
}

const total = (values: readonly number[]) => values.reduce((sum, value) => sum + value, 0);

function weighted(values: readonly number[], weights: readonly number[]): number {
  const sum = total(weights);
  if (sum === 0) return total(values) / values.length;
  // Held to the range of the values, which rounding of the weights may leave by a bit.
  const mean = values.reduce((mean, value, i) => mean + value * (weights[i]! / sum), 0);
  return Math.min(Math.max(mean, Math.min(...values)), Math.max(...values));
}

function checkSpecies(species: readonly Species[]): void {
  if (species.length === 0) {
    throw new DomainError('missing', {
      field: 'species',
      value: '[]',
      allowed: 'a list of at least one species',
    });
  }
  const names = new Set<string>();
  species.forEach((one, i) => {
    const field = `species[${i}]`;
    if (names.has(one.name)) {
      throw new DomainError('repeated', { field: `${field}.name`, value: one.name, allowed: 'given once' });
    }
    names.add(one.name);
    requireWithin(`${field}.opticalDepth`, one.opticalDepth, '', 0, 10);
    requireWithin(`${field}.singleScatteringAlbedo`, one.singleScatteringAlbedo, '', 0, 1);
    requireWithin(`${field}.asymmetry`, one.asymmetry, '', -0.98, 0.98);
  });
}

const EXTERNAL: Caution = {
  code: 'species-mixed-externally',
  message:
    'Species are added as if each floated by itself: mixed particles (coated soot, sulfate on dust) break additivity by 10 % or more.',
};
