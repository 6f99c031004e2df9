import { medianRadiusFromMassMedianDiameter } from './lognormal-mode';
import { parameterRow, type BulkSet, type OpticalSet, type ParticleSet, type SetMode } from './optical-set';

const LOW_ABSORPTION = 'dust-composite';
const HIGH_ABSORPTION = 'dust-woodward-2001';
const ZENDER =
  'size: Zender, Bian & Newman (2003), J. Geophys. Res. 108, 4416 (mass median diameter 3.5 µm, σ 2.0)';
const HESS = 'size: Hess, Koepke & Schult (1998), Bull. Am. Meteorol. Soc. 79, 831–844';
const SIZE_FROM_MEMORY = 'index table read, size parameters from memory';
const COARSE_ALONE =
  'The row is for whole dust; the coarse part alone scatters further ahead, and no interval by size is at hand.';

const DUST = {
  kind: 'particles',
  species: 'dust',
  densityGCm3: parameterRow('rho-dust-clay-rich-fine').central,
  kappa: 0,
  relativeHumidity: 0,
  outside: [],
} as const;

const DUST_ROWS = {
  massExtinction: 'mee-dust-model-median-with-mostly-10-um',
  singleScatteringAlbedo: 'omega0-dust-19-soils-laboratory',
  asymmetry: 'g-dust',
};

/** One mode by its median diameter by mass, between two diameters [µm]. */
function byMass(massMedianDiameterUm: number, sigma: number, fromUm: number, toUm: number): SetMode[] {
  return [
    {
      medianRadiusUm: medianRadiusFromMassMedianDiameter(massMedianDiameterUm, sigma),
      geometricStdDev: sigma,
      minRadiusUm: fromUm / 2,
      maxRadiusUm: toUm / 2,
      numberFraction: 1,
    },
  ];
}

/** The three mineral modes of desert aerosol, up to a diameter [µm]: 269.5, 30.5 and 0.142 particles of each. */
function desertModes(toUm: number): SetMode[] {
  const modes = [
    [0.07, 1.95, 269.5],
    [0.39, 2, 30.5],
    [1.9, 2.15, 0.142],
  ] as const;
  return modes.map(([medianRadiusUm, geometricStdDev, count]) => ({
    medianRadiusUm,
    geometricStdDev,
    minRadiusUm: 0.005,
    maxRadiusUm: toUm / 2,
    numberFraction: count / 300.142,
  }));
}

const indexSource = (material: string) =>
  material === LOW_ABSORPTION
    ? 'index: composite of mineral species (Balkanski et al. 2007; Di Biagio et al. 2017)'
    : 'index: Woodward (2001), J. Geophys. Res. 106, 18155–18166';

function zenderDust(id: string, title: string, material: string): ParticleSet {
  return {
    ...DUST,
    id,
    title,
    source: `${ZENDER}; ${indexSource(material)}`,
    evidence: SIZE_FROM_MEMORY,
    note: 'Diameters 0.1 to 10 µm.',
    material,
    modes: byMass(3.5, 2, 0.1, 10),
    heldAgainst: DUST_ROWS,
  };
}

function desertDust(
  set: Pick<ParticleSet, 'id' | 'title' | 'note' | 'heldAgainst'>,
  toUm: number,
): ParticleSet {
  return {
    ...DUST,
    ...set,
    source: `${HESS}, desert; ${indexSource(LOW_ABSORPTION)}`,
    evidence: SIZE_FROM_MEMORY,
    material: LOW_ABSORPTION,
    modes: desertModes(toUm),
  };
}

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
  zenderDust('dust-pm10-low-absorption', 'Dust below 10 µm, low absorption', LOW_ABSORPTION),
  zenderDust('dust-pm10-high-absorption', 'Dust below 10 µm, high absorption', HIGH_ABSORPTION),
  desertDust(
    {
      id: 'dust-pm20-desert',
      title: 'Desert dust below 20 µm',
      note: 'Three mineral modes, diameters to 20 µm.',
      heldAgainst: { ...DUST_ROWS, massExtinction: 'mee-dust-pm20-mix-present' },
    },
    20,
  ),
  desertDust(
    {
      id: 'dust-fine',
      title: 'Fine dust below 2.5 µm',
      note: 'The three mineral modes cut at 2.5 µm diameter.',
      heldAgainst: { ...DUST_ROWS, massExtinction: 'mee-dust-diameter-2-5-um' },
    },
    2.5,
  ),
  {
    ...zenderDust('dust-coarse', 'Coarse dust, 2.5 to 10 µm', LOW_ABSORPTION),
    note: 'Diameters 2.5 to 10 µm.',
    modes: byMass(3.5, 2, 2.5, 10),
    heldAgainst: { ...DUST_ROWS, massExtinction: 'mee-dust-diameter-2-5-10-um' },
    outside: [{ quantity: 'asymmetry', reason: COARSE_ALONE }],
  },
  {
    ...DUST,
    id: 'dust-transported',
    title: 'Transported mineral dust',
    source: `${HESS}, transported mineral; ${indexSource(LOW_ABSORPTION)}`,
    evidence: 'size parameters and index table read',
    note: 'Radii 0.02 to 5 µm.',
    material: LOW_ABSORPTION,
    modes: [
      { medianRadiusUm: 0.5, geometricStdDev: 2.2, minRadiusUm: 0.02, maxRadiusUm: 5, numberFraction: 1 },
    ],
    heldAgainst: DUST_ROWS,
  },
  {
    ...DUST,
    id: 'dust-glacial-loess-like',
    title: 'Glacial, loess-like dust',
    source: `size: round assumption, mass median diameter 5 µm, σ 2.0, diameters 0.1 to 20 µm; ${indexSource(LOW_ABSORPTION)}`,
    evidence: 'assumption: between the 1.5 to 2.5 µm of ice cores and the 20 to 30 µm of loess (from memory)',
    note: 'For dust on its way near outwash plains. Loess itself is coarser, dust in ice cores finer.',
    densityGCm3: parameterRow('rho-dust-quartz-feldspar-silt').central,
    material: LOW_ABSORPTION,
    modes: byMass(5, 2, 0.1, 20),
    heldAgainst: DUST_ROWS,
  },
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
