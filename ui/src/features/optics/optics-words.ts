import type { SpeciesName } from '@siltlight/common/wire/optics';
import { REFRACTIVE_INDICES } from '@siltlight/common/tables/refractive-indices';

export const speciesWords: Record<SpeciesName, string> = {
  dust: 'Dust',
  sulfate: 'Sulfate',
  'sea-salt': 'Sea salt',
  'black-carbon': 'Black carbon',
  'organic-carbon': 'Organic carbon',
  'volcanic-ash': 'Volcanic ash',
  'volcanic-sulfate': 'Volcanic sulfate',
  other: 'Other',
};

export const basisWords = {
  particles: 'computed from particles',
  measured: 'measured values',
  bulk: 'bulk values at 0.55 µm',
} as const;

export const ruleWords = {
  'volume-average': 'Volume mean of the index',
  'maxwell-garnett': 'Maxwell Garnett, the first is the host',
  bruggeman: 'Bruggeman',
} as const;

export const materials = REFRACTIVE_INDICES.map(({ id, title, source, wavelengthsUm }) => ({
  id,
  title,
  source,
  reach:
    wavelengthsUm.length === 1
      ? `${wavelengthsUm[0]} µm only`
      : `${wavelengthsUm[0]} to ${wavelengthsUm.at(-1)} µm`,
}));
