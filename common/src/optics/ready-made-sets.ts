import { parameterRow, type BulkSet, type OpticalSet } from './optical-set';
import { READY_MADE_DUST } from './ready-made-dust';

const HESS = 'size: Hess, Koepke & Schult (1998), Bull. Am. Meteorol. Soc. 79, 831–844';
const SIZE_FROM_MEMORY = 'index table read, size parameters from memory';

function bulk(
  set: Omit<
    BulkSet,
    'kind' | 'massExtinctionM2PerG' | 'singleScatteringAlbedo' | 'asymmetry' | 'source' | 'evidence'
  >,
  scope: string,
): BulkSet {
  const extinction = parameterRow(`mee-${scope}`);
  return {
    ...set,
    kind: 'bulk',
    source: extinction.source,
    evidence: extinction.evidence,
    massExtinctionM2PerG: extinction,
    singleScatteringAlbedo: parameterRow(`omega0-${scope}`),
    asymmetry: parameterRow(`g-${scope}`),
  };
}

/**
 * Optical sets to start from. Particle sets are computed from size, index and density; a test recomputes each and holds
 * MEE, ω and g at 0.55 µm against the intervals of the parameter table.
 */
export const READY_MADE_SETS: readonly OpticalSet[] = [
  ...READY_MADE_DUST,
  {
    id: 'sulfate',
    title: 'Sulfate (ammonium sulfate) at 70 % humidity',
    species: 'sulfate',
    kind: 'particles',
    source: `${HESS}, sulfate mode (0.0695 µm, σ 2.03); index: Global Aerosol Climatology Project; κ 0.53: Petters & Kreidenweis (2007)`,
    evidence: SIZE_FROM_MEMORY,
    note: 'Extinction per gram of dry ammonium sulfate; per gram of SO₄ it is 1.375 times as much. Humidity 70 %: round assumption.',
    material: 'ammonium-sulfate',
    densityGCm3: parameterRow('rho-sulfate-as-so4').central,
    kappa: 0.53,
    relativeHumidity: 0.7,
    modes: [
      {
        medianRadiusUm: 0.0695,
        geometricStdDev: 2.03,
        minRadiusUm: 0.005,
        maxRadiusUm: 20,
        numberFraction: 1,
      },
    ],
    heldAgainst: {
      massExtinction: 'mee-sulfate-as-so4',
      singleScatteringAlbedo: 'omega0-sulfate-as-so4',
      asymmetry: 'g-sulfate-as-so4',
      massRatio: 132.14 / 96.06, // (NH₄)₂SO₄ over SO₄, molar masses
    },
    outside: [],
  },
  {
    id: 'sea-salt',
    title: 'Sea salt at 80 % humidity',
    species: 'sea-salt',
    kind: 'particles',
    source: `${HESS}, sea-salt modes (0.209 and 1.75 µm, σ 2.03, 20 to 0.0032 particles) and index`,
    evidence: SIZE_FROM_MEMORY,
    note: 'Extinction per gram of dry salt. Humidity 80 %: round assumption.',
    material: 'sea-salt',
    densityGCm3: parameterRow('rho-sea-salt').central,
    kappa: parameterRow('kappa-sea-salt').central,
    relativeHumidity: 0.8,
    modes: [
      {
        medianRadiusUm: 0.209,
        geometricStdDev: 2.03,
        minRadiusUm: 0.005,
        maxRadiusUm: 20,
        numberFraction: 20 / 20.0032,
      },
      {
        medianRadiusUm: 1.75,
        geometricStdDev: 2.03,
        minRadiusUm: 0.005,
        maxRadiusUm: 60,
        numberFraction: 0.0032 / 20.0032,
      },
    ],
    heldAgainst: {
      massExtinction: 'mee-sea-salt',
      singleScatteringAlbedo: 'omega0-sea-salt',
      asymmetry: 'g-sea-salt',
    },
    outside: [],
  },
  {
    id: 'black-carbon',
    title: 'Black carbon, fresh',
    species: 'black-carbon',
    kind: 'particles',
    source:
      'size: round assumption, 0.04 µm, σ 1.8; index: Bond & Bergstrom (2006), Aerosol Sci. Technol. 40, 27–67',
    evidence: 'index read, size assumed',
    note: 'Compact spheres, uncoated. A coat raises absorption about 1.5 times (from memory).',
    material: 'black-carbon-bond-2006',
    densityGCm3: parameterRow('rho-black-carbon').central,
    kappa: 0,
    relativeHumidity: 0,
    modes: [
      { medianRadiusUm: 0.04, geometricStdDev: 1.8, minRadiusUm: 0.001, maxRadiusUm: 2, numberFraction: 1 },
    ],
    heldAgainst: {
      massExtinction: 'mee-black-carbon',
      singleScatteringAlbedo: 'omega0-black-carbon',
      asymmetry: 'g-black-carbon',
    },
    outside: [],
  },
  bulk(
    {
      id: 'organic-carbon',
      title: 'Organic aerosol',
      species: 'organic-carbon',
      note: 'Bulk values of the parameter table: no open index table is at hand.',
    },
    'organic-aerosol',
  ),
  bulk(
    {
      id: 'volcanic-sulfate',
      title: 'Volcanic sulfate in the stratosphere',
      species: 'volcanic-sulfate',
      note: 'Bulk values of the parameter table: no open index table of sulfuric acid is at hand. Size grows with the eruption.',
    },
    'stratospheric-volcanic-sulfate-75-h2so4',
  ),
  {
    id: 'volcanic-ash',
    title: 'Volcanic ash, fine part',
    species: 'volcanic-ash',
    kind: 'bulk',
    source: 'airborne measurements in the ash of 2010, Johnson et al. (2012), J. Geophys. Res. 117, D00U24',
    evidence: 'from memory',
    note: 'Bulk values with rounded bounds: the parameter table has no row for ash.',
    massExtinctionM2PerG: { low: 0.4, central: 0.7, high: 1.1 },
    singleScatteringAlbedo: { low: 0.9, central: 0.95, high: 0.98 },
    asymmetry: { low: 0.65, central: 0.72, high: 0.78 },
  },
];
